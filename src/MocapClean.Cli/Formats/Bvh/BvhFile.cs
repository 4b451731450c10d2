using System.Collections.Immutable;
using System.Text;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Formats.Bvh;

/// <summary>A take delivered as BVH.</summary>
internal sealed class BvhFile : ITakeFile
{
    private readonly TakeSource source;
    private readonly BvhMotion motion;
    private readonly ImmutableArray<string> names;
    private readonly ImmutableArray<BvhTrack> tracks;

    /// <summary>Makes the take of what was read.</summary>
    public BvhFile(TakeSource source, BvhHierarchy hierarchy, BvhMotion motion, OrientationSpace space)
    {
        this.source = source;
        this.motion = motion;
        names = hierarchy.Columns;
        tracks = [.. hierarchy.Joints.Where(BvhTrack.Suits).Select(j => BvhTrack.Read(j, motion))];
        var take = new Take
        {
            Name = source.Name,
            Clock = Clock.FromFrameTime(motion.Frames, motion.FrameTime, motion.FrameTimeRounding),
            Tracks = [.. tracks.Select(t => t.ToJointTrack())],
            Space = space,
            Skeleton = BvhSkeleton.Of(hierarchy),
            Findings = [.. tracks.SelectMany((t, j) => t.Findings(j, names))],
            Notes = [.. Surplus(motion), .. hierarchy.Joints.Where(j => j.Rotations.Length == 2).Select(j =>
                $"joint '{j.Name}' has two rotation channels: it is carried, not cleaned, and the take counts as one without bone vectors")],
        };
        Take = take with { TextRounding = BvhRounding.Of(source.Bytes, motion, AngleColumns(), take.TextRounding) };
    }

    /// <inheritdoc/>
    public Take Take { get; }

    /// <summary>A carried channel by its name, such as <c>Hips Xposition</c>.</summary>
    public IReadOnlyList<string>? Column(string name)
    {
        var column = names.IndexOf(name);
        return column < 0 || AngleColumns().Contains(column) ? null : [.. Enumerable.Range(0, motion.Frames).Select(n => Text(n, column))];
    }

    /// <inheritdoc/>
    public void Write(Take cleaned, Stream output)
    {
        if (cleaned.Tracks.Length != tracks.Length || cleaned.Tracks.Any(t => t.Length != motion.Frames))
        {
            throw new ArgumentException("the cleaned take has other joints or frames than the delivered one", nameof(cleaned));
        }

        BvhWriter.Write(source.Bytes, motion, [.. tracks.Select((t, j) => new BvhTrackWriter(t, cleaned.Tracks[j], Rebranches(cleaned, j)))], output);
    }

    /// <summary>Nobody has decided to leave the leaps as delivered.</summary>
    private static bool Rebranches(Take cleaned, int joint) =>
        cleaned.Findings.Any(f => f.Joint == joint && f is { Kind: FaultKind.SignFlip, Action: FaultAction.Flipped, Note.Length: > 0 });

    private HashSet<int> AngleColumns() => [.. tracks.SelectMany(t => t.Columns)];

    private static IEnumerable<string> Surplus(BvhMotion motion)
    {
        if (motion.Surplus > 0)
        {
            yield return $"{motion.Surplus} {(motion.Surplus == 1 ? "line" : "lines")} of values more than 'Frames:' says: carried, not cleaned";
        }
    }

    private string Text(int frame, int column)
    {
        var fields = new BvhFields(motion.Line(source.Bytes, frame));
        for (var n = 0; n <= column; n++)
        {
            fields.MoveNext();
        }

        return Encoding.UTF8.GetString(fields.Field);
    }
}
