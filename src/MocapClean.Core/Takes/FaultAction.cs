namespace MocapClean.Core.Takes;

/// <summary>What was done about a finding. A closed list; <see cref="FaultNames"/> has the spelling.</summary>
public enum FaultAction
{
    /// <summary>Kept as delivered, untouched; a person must look.</summary>
    Flagged,

    /// <summary>Missing before and after.</summary>
    Left,

    /// <summary>The sign was changed; the orientation is the same.</summary>
    Flipped,

    /// <summary>Replaced by an estimate.</summary>
    Filled,

    /// <summary>Turned back by a rotation.</summary>
    TurnedBack,

    /// <summary>Brought back to length 1; the orientation is the same.</summary>
    Renormalised,

    /// <summary>Moved by smoothing.</summary>
    Smoothed,

    /// <summary>Passed the smoothing stage unchanged, with the reason in the note.</summary>
    Unsmoothed,

    /// <summary>Said, and nothing done: it does no harm to the curves.</summary>
    Noted,
}
