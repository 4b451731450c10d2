using System.Collections.Immutable;

namespace MocapClean.Cli.Formats.Bvh;

/// <summary>Copies a file with some values replaced; every other byte is the one delivered.</summary>
internal static class BvhWriter
{
    /// <summary>Writes the whole file.</summary>
    /// <param name="bytes">The file as delivered.</param>
    /// <param name="motion">Its values.</param>
    /// <param name="tracks">What gives the new texts; used up.</param>
    /// <param name="output">Receives the file.</param>
    public static void Write(byte[] bytes, BvhMotion motion, ImmutableArray<BvhTrackWriter> tracks, Stream output)
    {
        var line = new BvhLine(bytes, motion);
        var copied = 0;
        for (var n = 0; n < motion.Frames; n++)
        {
            line.GoTo(n);
            foreach (var track in tracks)
            {
                track.Put(n, line);
            }

            copied = line.Write(copied, output);
        }

        output.Write(bytes, copied, bytes.Length - copied);
    }
}
