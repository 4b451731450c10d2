namespace MocapClean.Core.Diff;

/// <summary>A suggestion about a take, from good to bad; the call is the director's, and for stunts the coordinator's and performer's.</summary>
public enum Verdict
{
    /// <summary>Nothing was mended and nothing is flagged.</summary>
    Accept,

    /// <summary>Something was filled or turned back.</summary>
    AcceptWithMends,

    /// <summary>Something is flagged, not enough to shoot again.</summary>
    LookFirst,

    /// <summary>Too much is bad.</summary>
    Reshoot,
}
