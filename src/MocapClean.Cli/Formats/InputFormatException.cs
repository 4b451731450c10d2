namespace MocapClean.Cli.Formats;

/// <summary>A take that cannot be processed: one clear line naming file, place, what was found and what was expected.</summary>
public sealed class InputFormatException : Exception
{
    /// <summary>For a place within a file.</summary>
    /// <param name="file">Name of the take, as the user knows it.</param>
    /// <param name="where">Such as <c>row 12 (line 14), column 'hand_r.qw'</c>; empty for the whole file.</param>
    /// <param name="found">What stands there.</param>
    /// <param name="expected">What should.</param>
    public InputFormatException(string file, string where, string found, string expected)
        : base($"{file}{(where.Length > 0 ? ", " + where : "")}: found {found}, expected {expected}")
    {
    }
}
