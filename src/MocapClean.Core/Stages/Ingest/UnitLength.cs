using System.Collections.Immutable;
using System.Runtime.InteropServices;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages.Ingest;

/// <summary>Projects a delivered track to the unit sphere and says where its length was wrong.</summary>
internal static class UnitLength
{
    /// <summary>
    /// The track with unit samples, with the missing ones marked, and one off-unit row a run of frames whose length is off by more than
    /// <paramref name="tolerance"/> (a fraction of 1).
    /// </summary>
    public static (JointTrack Track, ImmutableArray<Finding> Findings) Project(JointTrack track, int joint, double tolerance)
    {
        var raw = track.Delivered.AsSpan();
        var unit = new Quat[raw.Length];
        var states = new SampleState[raw.Length];
        var off = ImmutableArray.CreateBuilder<int>();
        for (var n = 0; n < raw.Length; n++)
        {
            if (!raw[n].IsOrientation)
            {
                (unit[n], states[n]) = (Quat.Missing, SampleState.Missing);
                continue;
            }

            unit[n] = raw[n].Normalised();
            if (Math.Abs(raw[n].Norm - 1) > tolerance)
            {
                off.Add(n);
            }
        }

        var samples = ImmutableCollectionsMarshal.AsImmutableArray(unit);
        var projected = track with
        {
            Delivered = samples,
            Samples = samples,
            States = ImmutableCollectionsMarshal.AsImmutableArray(states),
            Renormalised = off.ToImmutable(),
        };
        return (projected, Rows(raw, off, joint));
    }

    private static ImmutableArray<Finding> Rows(ReadOnlySpan<Quat> raw, ImmutableArray<int>.Builder off, int joint)
    {
        var rows = ImmutableArray.CreateBuilder<Finding>();
        for (var i = 0; i < off.Count;)
        {
            var (first, worst) = (i, raw[off[i]].Norm);
            for (i++; i < off.Count && off[i] == off[i - 1] + 1; i++)
            {
                var norm = raw[off[i]].Norm;
                worst = Math.Abs(norm - 1) > Math.Abs(worst - 1) ? norm : worst;
            }

            rows.Add(new Finding
            {
                Joint = joint,
                First = off[first],
                Last = off[i - 1],
                Kind = FaultKind.OffUnit,
                Action = FaultAction.Renormalised,
                Note = $"length {worst:0.###} where 1 belongs",
            });
        }

        return rows.ToImmutable();
    }
}
