using MocapClean.Core.Orientation;
using MocapClean.Core.Stages.Outliers;
using MocapClean.Core.Takes;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Outliers;

public sealed class SlowUpdateTests
{
    private static Quat[] Held(Quat[] slow, int every, int shift) =>
        [.. Enumerable.Range(0, (slow.Length - 1) * every).Select(n => slow[(n + ((every - shift) % every)) / every])];

    [Theory]
    [InlineData(2, 0)]
    [InlineData(4, 0)]
    [InlineData(4, 3)]
    public void A_joint_with_a_new_value_every_few_frames_is_noted_once_and_has_no_freezes(int every, int shift)
    {
        var take = Search.Run(60 * every, Held(Motion.Sample(Motion.Swing, 60, 10), every, shift));
        Assert.Equal($"slow-update 0-{take.Length - 1}", Search.Rows(take));
        Assert.Equal(FaultAction.Noted, take.Findings[0].Action);
        Assert.Equal(every, take.Tracks[0].UpdateEvery);
    }

    [Fact]
    public void Its_faults_are_judged_at_its_own_rate_and_told_in_frames_of_the_take()
    {
        var slow = Motion.Sample(Motion.Swing, 60, 10);
        slow[200] *= Motion.Turn(1, 0, 0, 20);
        for (var n = 400; n < slow.Length; n++)
        {
            slow[n] = Motion.Turn(0, 1, 0, 30) * slow[n];
        }

        var take = Search.Run(240, Held(slow, 4, 0));
        Assert.Equal($"slow-update 0-{take.Length - 1}, spike 800-803, step 1600-1600", Search.Rows(take));
    }

    [Fact]
    public void A_joint_that_rests_now_and_then_keeps_up()
    {
        static Quat Restless(double t) => Motion.Swing(Math.Floor(t) + Math.Min(1, 2 * (t - Math.Floor(t))));
        var samples = Motion.Sample(Restless, 120, 10, noise: 0);
        var track = Motion.Take(120, samples).Tracks[0];
        Assert.Equal(1, UpdateRhythm.Of(track).Every);
    }
}
