using MocapClean.Cli.Formats;
using MocapClean.Cli.Formats.Csv;
using MocapClean.Core.Stages;
using MocapClean.Core.Stages.Ingest;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Batch;

/// <summary>Opens a take that no config describes: by the defaults, or as its columns suggest where those do not fit.</summary>
public static class TakeOpener
{
    /// <summary>For takes that do not tell their time, where nobody says otherwise.</summary>
    private const double AssumedRate = 120;

    /// <summary>The take of a file, with how it was read; the guess is null where the defaults fit.</summary>
    /// <exception cref="InputFormatException">The take cannot be processed.</exception>
    /// <exception cref="FileNotFoundException">There is no such file.</exception>
    public static (ITakeFile File, ReadSettings Read, CsvGuess? Guess) Open(string path)
    {
        if (!File.Exists(path))
        {
            throw new FileNotFoundException(Directory.Exists(path) ? $"{path}: is a folder; name a take" : $"{path}: no such file");
        }

        var name = path.Replace(Path.DirectorySeparatorChar, '/');
        var (source, _) = SourceFile.Read(new PlannedTake(name, path), Array.MaxLength);
        var format = FormatCatalog.For(name)
            ?? throw new InputFormatException(name, "", "an unknown kind of file", $"one of {FormatCatalog.Endings}");
        try
        {
            return (format.Read(source, new ReadSettings()), new ReadSettings(), null);
        }
        catch (InputFormatException) when (format is CsvFormat && CsvGuess.From(source) is { } guess)
        {
            var read = guess.ApplyTo(new ReadSettings()) with { Rate = guess.NeedsRate ? AssumedRate : null };
            return (format.Read(source, read), read, guess);
        }
    }

    /// <summary>The take of a file after ingest: unit samples, missing ones known.</summary>
    /// <exception cref="InputFormatException">The take cannot be processed.</exception>
    public static Take Ingest(string path)
    {
        var take = Open(path).File.Take;
        return new IngestStage().Run(take, StageContext.Uniform(take, new StageSettings()));
    }
}
