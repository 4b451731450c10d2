namespace MocapClean.Cli.Formats;

/// <summary>A file format for takes. A new one is one folder beside this file and one line in <see cref="FormatCatalog"/>.</summary>
public interface ITakeFormat
{
    /// <summary>Short name, such as <c>csv</c>.</summary>
    string Name { get; }

    /// <summary>File name endings with the dot, lower case, such as <c>.csv</c>.</summary>
    IReadOnlyList<string> Extensions { get; }

    /// <summary>Reads a take that lies in memory whole.</summary>
    /// <exception cref="InputFormatException">The take cannot be processed.</exception>
    ITakeFile Read(TakeSource source, ReadSettings settings);
}
