namespace MocapClean.Core.Takes;

/// <summary>What is known of one sample of one joint. Set by ingest, refined by each stage.</summary>
public enum SampleState : byte
{
    /// <summary>As delivered, up to sign and length, and believed.</summary>
    Good,

    /// <summary>Not there: empty, not finite or all zero. Its quaternion is NaN until something fills it.</summary>
    Missing,

    /// <summary>Found to be wrong and waiting for the fill stage.</summary>
    Rejected,

    /// <summary>Found to be wrong, kept as delivered and touched by nothing: a person must look.</summary>
    Flagged,

    /// <summary>Replaced by an estimate.</summary>
    Filled,

    /// <summary>Delivered motion turned back by a constant or blended rotation.</summary>
    TurnedBack,
}
