using MocapClean.Core.Orientation;

namespace MocapClean.Core.Stages.Outliers;

/// <summary>Turns the samples of an offset back; the motion inside stays as it was delivered.</summary>
internal static class OffsetMend
{
    /// <summary>Up to so many spreads a disagreement of the two ends is uncertainty of the edges, not a turn that drifted.</summary>
    private const double Uncertain = 3;

    /// <summary>The median length of a vector of normal noise, scaled as a robust spread, over its root mean square.</summary>
    private const double RmsOfSpread = 0.76;

    /// <summary>The rotation that undoes the offset at a place.</summary>
    /// <param name="story">The offset.</param>
    /// <param name="part">0 at its first edge, 1 at its second.</param>
    public static Quat Undo(OffsetStory story, double part)
    {
        var (a, b) = (story.In.Spread * story.In.Spread, story.Out.Spread * story.Out.Spread);
        var steady = story.Disagreement <= Uncertain * story.Spread;
        return Slerp.At(story.TurnIn, story.TurnOut, steady ? a / (a + b) : part).Conjugate;
    }

    /// <summary>A sample inside, turned back.</summary>
    public static Quat Apply(OffsetStory story, Quat undo, Quat sample) => (story.InRoom ? undo * sample : sample * undo).Normalised();

    /// <summary>Expected RMS error of the samples turned back, radians.</summary>
    public static double ExpectedError(OffsetStory story)
    {
        // The mean of two estimates weighted by their certainty; a blend is off by what the ends disagree about.
        var mean = story.In.Spread * story.Out.Spread / story.Spread;
        var blend = story.Disagreement <= Uncertain * story.Spread ? 0 : story.Disagreement / 2;
        return RmsOfSpread * Math.Sqrt((mean * mean) + (blend * blend));
    }
}
