using MocapClean.Core.Kernels;
using MocapClean.Core.Orientation;
using MocapClean.Core.Tests.Support;
using Xunit;

namespace MocapClean.Core.Tests.Kernels;

public sealed class JitterEstimateTests
{
    [Theory]
    [InlineData(0.05)]
    [InlineData(0.5)]
    public void Noise_put_on_a_slow_turn_is_found_within_a_tenth(double degrees)
    {
        var state = 12345u;
        double Normal()
        {
            // Twelve uniform numbers less six: variance 1 (the old way to a normal distribution).
            var sum = -6.0;
            for (var i = 0; i < 12; i++)
            {
                state = (state * 1664525) + 1013904223;
                sum += state / 4294967296.0;
            }

            return sum;
        }

        var track = Some.Track("a", [.. Some.Spin(6000, 0.2).Select(q =>
            q * RotationVector.Exp(Angle.FromDegrees(degrees) * new Vec3(Normal(), Normal(), Normal())))]);
        Assert.InRange(Angle.ToDegrees(JitterEstimate.OneAxis(track)), 0.9 * degrees, 1.1 * degrees);
    }

    [Fact]
    public void Three_samples_tell_nothing() => Assert.True(double.IsNaN(JitterEstimate.OneAxis(Some.Track("a", Some.Spin(3, 1)))));
}
