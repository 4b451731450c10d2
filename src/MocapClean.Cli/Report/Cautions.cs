namespace MocapClean.Cli.Report;

/// <summary>What every report says about its own limits.</summary>
public static class Cautions
{
    /// <summary>Whose call a verdict is.</summary>
    public const string Verdict =
        "Verdicts are suggestions: the call is the director's, and for a stunt the stunt coordinator's and the performer's. "
        + "Cleaned data is not a clinical or safety measurement.";
}
