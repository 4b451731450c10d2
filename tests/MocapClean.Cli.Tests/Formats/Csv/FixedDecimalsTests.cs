using System.Globalization;
using System.Text;
using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;
using MocapClean.Cli.Formats.Csv;
using Xunit;

namespace MocapClean.Cli.Tests.Formats.Csv;

public sealed class FixedDecimalsTests
{
    [Theory]
    [InlineData(0, "0.00000000000000")]
    [InlineData(1, "1.00000000000000")]
    [InlineData(-1, "-1.00000000000000")]
    [InlineData(0.1, "0.10000000000000")]
    [InlineData(-4e-15, "0.00000000000000")]
    [InlineData(-6e-15, "-0.00000000000001")]
    [InlineData(0.70710678118654752, "0.70710678118655")]
    [InlineData(0.01234567890123, "0.01234567890123")]
    [InlineData(-9.9876543210987, "-9.98765432109870")]
    public void Writes_fourteen_decimals(double value, string text) => Assert.Equal(text, Write(value, '.'));

    [Fact]
    public void Writes_a_decimal_comma() => Assert.Equal("-0,50000000000000", Write(-0.5, ','));

    [Theory]
    [InlineData(10)]
    [InlineData(-10)]
    [InlineData(double.NaN)]
    [InlineData(double.NegativeInfinity)]
    public void Refuses_what_no_component_can_be(double value) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => Write(value, '.'));

    [Property(MaxTest = 2000, Replay = "(123,457)")]
    public Property Agrees_with_the_framework(NormalFloat number)
    {
        var value = Math.Sin(number.Get);
        return (Write(value, '.') == value.ToString("F14", CultureInfo.InvariantCulture)).Label($"{value:R}");
    }

    [Fact]
    public void Agrees_with_the_framework_at_ties()
    {
        for (var odd = 1; odd < 32768; odd += 2)
        {
            var value = odd / 32768.0;
            Assert.Equal(value.ToString("F14", CultureInfo.InvariantCulture), Write(value, '.'));
        }
    }

    private static string Write(double value, char mark)
    {
        var bytes = new byte[FixedDecimals.Longest];
        return Encoding.ASCII.GetString(bytes, 0, FixedDecimals.Write(value, bytes, (byte)mark));
    }
}
