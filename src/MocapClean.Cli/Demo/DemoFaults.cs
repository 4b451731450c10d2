using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Demo;

/// <summary>Puts faults of every kind into a track, apart from each other, and keeps the truth.</summary>
internal sealed class DemoFaults(SeededNumbers numbers, List<DemoTruth> truth)
{
    /// <summary>Frames between two faults, and to the ends.</summary>
    private const int Apart = 45;

    /// <summary>Below this a pop is close to what honest motion does between two frames.</summary>
    private const double HardBelowDegrees = 3;

    /// <summary>Spoils a joint with the kinds in order, each somewhere in its own stretch of the track.</summary>
    public void Spoil(string joint, Quat[] track, IReadOnlyList<string> kinds)
    {
        var stretch = track.Length / Math.Max(1, kinds.Count);
        for (var i = 0; i < kinds.Count; i++)
        {
            var (from, to) = ((i * stretch) + Apart, ((i + 1) * stretch) - Apart);
            if (to - from > 4)
            {
                Put(joint, track, kinds[i], from, to);
            }
        }
    }

    private void Put(string joint, Quat[] track, string kind, int from, int to)
    {
        var count = Length(kind, to - from);
        var first = numbers.Whole(from, to - count);
        switch (kind)
        {
            case "sign-flip":
                Over(joint, track, kind, first, count, 0, q => -q);
                break;
            case "spike":
                Spike(joint, track, first, count, numbers.Uniform(0, 1) < 0.25 ? numbers.Uniform(0.5, 3) : numbers.Uniform(4, 120));
                break;
            case "step":
                Turned(joint, track, kind, first, track.Length - first, numbers.Uniform(8, 90));
                break;
            case "offset":
                Turned(joint, track, kind, first, count, numbers.Uniform(6, 60));
                break;
            case "gap" or "long-gap":
                Over(joint, track, "gap", first, count, 0, _ => Quat.Missing);
                break;
            case "zeros":
                Over(joint, track, "gap", first, count, 0, _ => default);
                break;
            case "freeze":
                Freeze(joint, track, first, count);
                break;
            case "off-unit":
                var scale = numbers.Uniform(0, 1) < 0.5 ? 0.9 : 1.15;
                Over(joint, track, kind, first, count, 0, q => scale * q);
                break;
            default:
                throw new ArgumentOutOfRangeException(nameof(kind), kind, "no such fault");
        }
    }

    /// <summary>How many frames a fault of a kind lasts, within the room there is.</summary>
    private int Length(string kind, int room)
    {
        var (least, most) = kind switch
        {
            "spike" => (1, 8),
            "step" => (1, 1),
            "offset" => (15, 150),
            "gap" => (1, 50),
            "long-gap" => (80, 140),
            "zeros" => (1, 20),
            "freeze" => (10, 40),
            "off-unit" => (10, 200),
            _ => (1, 120),
        };
        return numbers.Whole(Math.Min(least, room), Math.Min(most, room));
    }

    private void Over(string joint, Quat[] track, string kind, int first, int count, double degrees, Func<Quat, Quat> change)
    {
        for (var n = first; n < first + count; n++)
        {
            track[n] = change(track[n]);
        }

        truth.Add(new DemoTruth(joint, first, first + count - 1, kind, degrees, IsHard: false));
    }

    private void Spike(string joint, Quat[] track, int first, int count, double degrees)
    {
        var turn = RotationVector.Exp(Angle.FromDegrees(degrees) * numbers.Direction());
        for (var n = first; n < first + count; n++)
        {
            track[n] *= turn;
        }

        truth.Add(new DemoTruth(joint, first, first + count - 1, "spike", degrees, degrees < HardBelowDegrees));
    }

    private void Turned(string joint, Quat[] track, string kind, int first, int count, double degrees)
    {
        var turn = RotationVector.Exp(Angle.FromDegrees(degrees) * numbers.Direction());
        var inRoom = numbers.Uniform(0, 1) < 0.5;
        for (var n = first; n < first + count; n++)
        {
            track[n] = inRoom ? turn * track[n] : track[n] * turn;
        }

        // A step is known by its first turned frame.
        truth.Add(new DemoTruth(joint, first, kind == "step" ? first : first + count - 1, kind, degrees, IsHard: false));
    }

    private void Freeze(string joint, Quat[] track, int first, int count)
    {
        var went = Angle.ToDegrees(Angle.Between(track[first - 1], track[first + count - 1]));
        for (var n = first; n < first + count; n++)
        {
            track[n] = track[first - 1];
        }

        // A joint that hardly moved while frozen cannot be told from one at rest.
        truth.Add(new DemoTruth(joint, first, first + count - 1, "freeze", went, went < HardBelowDegrees));
    }
}
