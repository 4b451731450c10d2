namespace MocapClean.Core.Diff;

/// <summary>The spelling of verdicts in every file and page.</summary>
public static class VerdictNames
{
    /// <summary>The verdict as written, such as <c>look first</c>.</summary>
    public static string Text(this Verdict verdict) => verdict switch
    {
        Verdict.Accept => "accept",
        Verdict.AcceptWithMends => "accept with mends",
        Verdict.LookFirst => "look first",
        Verdict.Reshoot => "re-shoot",
        _ => throw new ArgumentOutOfRangeException(nameof(verdict)),
    };
}
