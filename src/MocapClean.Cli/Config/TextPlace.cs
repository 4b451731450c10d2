namespace MocapClean.Cli.Config;

/// <summary>A place in a text; both count from 1, and 0 stands for the file as a whole.</summary>
/// <param name="Line">Line.</param>
/// <param name="Column">Column.</param>
public readonly record struct TextPlace(int Line, int Column)
{
    /// <summary>The file as a whole.</summary>
    public static TextPlace Whole { get; }

    /// <inheritdoc/>
    public override string ToString() => $"{Line}:{Column}";
}
