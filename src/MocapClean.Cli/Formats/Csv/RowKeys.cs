using System.Text;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>
/// Numbers the joints and frames of a long table as they appear. Rows mostly go round the joints or down the frames, so the one that
/// followed last time is tried before any look-up.
/// </summary>
internal sealed class RowKeys
{
    private readonly List<string> joints = [];
    private readonly List<byte[]> jointTexts = [];
    private readonly Dictionary<string, int> jointIndex = new(StringComparer.Ordinal);
    private readonly List<double> frames = [];
    private readonly Dictionary<double, int> frameIndex = [];
    private int lastJoint = -1;
    private int lastFrame = -1;

    /// <summary>Names of the joints in the order of their first rows.</summary>
    public IReadOnlyList<string> Joints => joints;

    /// <summary>Index of the row's joint.</summary>
    /// <exception cref="InputFormatException">The cell is empty.</exception>
    public int Joint(CsvRows rows, int column)
    {
        var text = rows.Text(column);
        var next = lastJoint + 1 == joints.Count ? 0 : lastJoint + 1;
        if (lastJoint >= 0 && text.SequenceEqual(jointTexts[lastJoint]))
        {
            return lastJoint;
        }

        return lastJoint = lastJoint >= 0 && text.SequenceEqual(jointTexts[next]) ? next : FindJoint(rows, column, text);
    }

    /// <summary>Index of a frame by its number or time.</summary>
    public int Frame(double number)
    {
        if (lastFrame >= 0 && frames[lastFrame].Equals(number))
        {
            return lastFrame;
        }

        if (lastFrame + 1 < frames.Count && frames[lastFrame + 1].Equals(number))
        {
            return ++lastFrame;
        }

        if (!frameIndex.TryGetValue(number, out lastFrame))
        {
            lastFrame = frames.Count;
            frameIndex.Add(number, lastFrame);
            frames.Add(number);
        }

        return lastFrame;
    }

    /// <summary>Number or time of a frame by its index.</summary>
    public double Number(int frame) => frames[frame];

    /// <summary>The frames by rising number, and for each frame its place among them.</summary>
    public (int[] Order, int[] Rank) FrameOrder()
    {
        var order = Enumerable.Range(0, frames.Count).ToArray();
        Array.Sort(frames.ToArray(), order);
        var rank = new int[order.Length];
        for (var place = 0; place < order.Length; place++)
        {
            rank[order[place]] = place;
        }

        return (order, rank);
    }

    private int FindJoint(CsvRows rows, int column, ReadOnlySpan<byte> text)
    {
        var name = Encoding.UTF8.GetString(text).Trim();
        if (name.Length == 0)
        {
            throw rows.Unreadable(column, "the name of a joint");
        }

        if (!jointIndex.TryGetValue(name, out var joint))
        {
            joint = joints.Count;
            jointIndex.Add(name, joint);
            joints.Add(name);
            jointTexts.Add(text.ToArray());
        }

        return joint;
    }
}
