namespace MocapClean.Core.Takes;

/// <summary>The spelling of kinds and actions in every file and page.</summary>
public static class FaultNames
{
    /// <summary>The kind as written, such as <c>sign-flip</c>.</summary>
    public static string Text(this FaultKind kind) => kind switch
    {
        FaultKind.SignFlip => "sign-flip",
        FaultKind.Gap => "gap",
        FaultKind.Spike => "spike",
        FaultKind.Step => "step",
        FaultKind.Offset => "offset",
        FaultKind.Freeze => "freeze",
        FaultKind.OffUnit => "off-unit",
        FaultKind.LostFrames => "lost-frames",
        FaultKind.Clock => "clock",
        FaultKind.SlowUpdate => "slow-update",
        FaultKind.RestPose => "rest-pose",
        FaultKind.Smoothing => "smoothing",
        _ => throw new ArgumentOutOfRangeException(nameof(kind)),
    };

    /// <summary>The action as written, such as <c>turned-back</c>.</summary>
    public static string Text(this FaultAction action) => action switch
    {
        FaultAction.Flagged => "flagged",
        FaultAction.Left => "left",
        FaultAction.Flipped => "flipped",
        FaultAction.Filled => "filled",
        FaultAction.TurnedBack => "turned-back",
        FaultAction.Renormalised => "renormalised",
        FaultAction.Smoothed => "smoothed",
        FaultAction.Unsmoothed => "unsmoothed",
        FaultAction.Noted => "noted",
        _ => throw new ArgumentOutOfRangeException(nameof(action)),
    };
}
