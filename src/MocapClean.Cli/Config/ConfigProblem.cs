namespace MocapClean.Cli.Config;

/// <summary>One thing wrong with a config, or with what it asks for.</summary>
/// <param name="File">The file, as the user named it; empty where there is none.</param>
/// <param name="At">Where in it.</param>
/// <param name="Message">What is wrong, in one line.</param>
public sealed record ConfigProblem(string File, TextPlace At, string Message)
{
    /// <summary><c>path:line:column: message</c>, as editors and build tools read it.</summary>
    public override string ToString() =>
        (File.Length == 0 ? "" : At == TextPlace.Whole ? $"{File}: " : $"{File}:{At}: ") + Message;
}
