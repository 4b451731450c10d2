using System.Runtime.Intrinsics;
using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Reduce;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Reduce;

public sealed class CurveTests
{
    [Theory]
    [InlineData(5)]
    [InlineData(40)]
    [InlineData(90)]
    [InlineData(179)]
    public void Component_playback_strays_from_constant_speed_by_what_the_search_allows_for_and_no_more(double degrees)
    {
        var end = RotationVector.Exp(new(0, Angle.FromDegrees(degrees), 0));
        var largest = Enumerable.Range(0, 2001).Select(n => n / 2000.0).Max(t => Angle.Between(
            KeyPlayback.At(Playback.Slerp, Quat.Identity, end, t), KeyPlayback.At(Playback.ComponentLinear, Quat.Identity, end, t)));
        Assert.InRange(ChordCurve.Stray(Angle.FromDegrees(degrees)), largest, (1.0001 * largest) + 1e-9);
    }

    [Fact]
    public void Sine_and_cosine_are_those_of_the_library_up_to_a_right_angle()
    {
        for (var n = 0; n <= 1000; n++)
        {
            var angle = n * Math.PI / 2000;
            var (sine, cosine) = Sine.Of(Vector256.Create(angle));
            Assert.Equal(Math.Sin(angle), sine[n % 4], 1e-15);
            Assert.Equal(Math.Cos(angle), cosine[n % 4], 1e-15);
        }
    }

    [Fact]
    public void Necessary_balls_hold_every_velocity_that_plays_and_sufficient_ones_no_other()
    {
        var random = new Random(3);
        for (var trial = 0; trial < 20000; trial++)
        {
            var velocity = random.NextDouble() * 3 * Unit(random);
            var tolerance = random.NextDouble();
            var played = RotationVector.Exp(0.5 * velocity);
            // Some samples just inside the tolerance, some just outside.
            var miss = tolerance * (0.9 + (0.2 * random.NextDouble()));
            var sample = played * RotationVector.Exp(miss * Unit(random));
            using var stretch = new Stretch([Quat.Identity, sample], [0, 0.5]);
            FourBalls balls = default;
            new VelocityBalls(stretch, 0, tolerance, tolerance).Of(stretch.Four(1), stretch.Times(1), ref balls);
            var corridor = new Corridor();
            corridor.Open();
            corridor.Narrow(balls.Centre(0), balls.Outer[0], balls.Inner[0]);
            var reading = new Corridor.Reading(velocity.X, velocity.Y, velocity.Z);
            Assert.False(miss < tolerance && corridor.Refutes(reading));
            Assert.False(miss > tolerance && corridor.Accepts(reading));
        }
    }

    private static Vec3 Unit(Random random)
    {
        var v = Motions.Noise(random);
        return (1 / v.Norm) * v;
    }
}
