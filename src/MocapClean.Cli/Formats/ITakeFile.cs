using MocapClean.Core.Takes;

namespace MocapClean.Cli.Formats;

/// <summary>A delivered take and the way to write it back with some samples replaced.</summary>
public interface ITakeFile
{
    /// <summary>
    /// The take as delivered, for the ingest stage: samples with the length they have in the file, NaN where a number is empty or not
    /// finite, every state <see cref="SampleState.Good"/>, and no findings but those that only the format can see.
    /// </summary>
    Take Take { get; }

    /// <summary>The texts of a carried column, one a frame, or null where the file has no such column.</summary>
    IReadOnlyList<string>? Column(string name);

    /// <summary>
    /// Writes the file in its own format, columns and order. Bytes of samples that did not change, and of everything carried, are those
    /// delivered. A sample has changed when <see cref="JointTrack.Samples"/> differs in a bit from <see cref="JointTrack.Delivered"/>,
    /// or when its frame stands in <see cref="JointTrack.Renormalised"/>.
    /// </summary>
    /// <param name="cleaned">The take after the stages, same joints and frames.</param>
    /// <param name="output">Receives the whole file.</param>
    void Write(Take cleaned, Stream output);
}
