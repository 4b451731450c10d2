using System.Text;
using FsCheck;
using FsCheck.Fluent;
using FsCheck.Xunit;
using MocapClean.Cli.Formats;
using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Tests.Formats.Bvh;

public sealed class BvhPropertyTests
{
    private static readonly string[] Orders = ["XYZ", "XZY", "YXZ", "YZX", "ZXY", "ZYX"];

    /// <summary>A smooth walk of angles, printed with all its whole turns or wrapped to half a turn, of one joint in any order.</summary>
    public sealed record Walk(string Order, (double A, double B, double C)[] Angles)
    {
        public string Text(Func<double, double> print) => BvhTakes.WithChannels(
            string.Join(' ', Order.Select(a => $"{a}rotation")),
            [.. Angles.Select(t => $"{print(t.A):F6} {t.B:F6} {print(t.C):F6}")]);
    }

    public static class Walks
    {
        public static Arbitrary<Walk> Walk() =>
            (from order in Gen.Elements(Orders)
             from start in Gen.Choose(-170, 170).Three()
             from speed in Gen.Choose(-9, 9).Three()
             from length in Gen.Choose(1, 60)
             select new Walk(order, [.. Enumerable.Range(0, length).Select(n => (
                 start.Item1 + (speed.Item1 * n) + 0.5,
                 60 * Math.Sin((start.Item2 + (speed.Item2 * n)) * Math.PI / 180),
                 start.Item3 + (speed.Item3 * n) - 0.25))])).ToArbitrary();
    }

    [Property(MaxTest = 100, Replay = "(123,457)", Arbitrary = [typeof(Walks)])]
    public Property What_is_smooth_comes_back_to_the_byte(Walk walk)
    {
        var text = walk.Text(a => a);
        return (BvhTakes.Unchanged(text) == text).Label(text);
    }

    [Property(MaxTest = 100, Replay = "(123,457)", Arbitrary = [typeof(Walks)])]
    public Property What_was_wrapped_to_half_a_turn_is_smooth_again_up_to_whole_turns_of_it_all(Walk walk)
    {
        var file = BvhTakes.Read(walk.Text(a => Math.IEEERemainder(a, 360)));
        var rows = BvhTakes.Rows(BvhTakes.Written(file, file.Take)).Select(BvhTakes.Numbers).ToArray();
        // The first frame may be a pose put in front: a leap right behind it is left alone.
        var worst = rows.Zip(rows.Skip(1)).Skip(1).SelectMany(p => p.First.Zip(p.Second, (a, b) => Math.Abs(a - b))).DefaultIfEmpty().Max();
        return (worst < 20).Label($"a step of {worst} degrees");
    }

    [Property(MaxTest = 100, Replay = "(123,457)", Arbitrary = [typeof(Walks)])]
    public Property Writing_and_reading_keeps_every_changed_orientation(Walk walk, byte x, byte y, byte z)
    {
        var file = BvhTakes.Read(walk.Text(a => Math.IEEERemainder(a, 360)));
        var turn = RotationVector.Exp(new Vec3(x / 100.0, y / 100.0, z / 100.0));
        var cleaned = file.Take.With(0, n => n % 3 == 0 ? file.Take.Tracks[0].Samples[n] * turn : null);
        var again = BvhTakes.Read(BvhTakes.Written(file, cleaned)).Take.Tracks[0].Samples;
        var worst = cleaned.Tracks[0].Samples.Zip(again, Angle.Between).Max();
        return (Angle.ToDegrees(worst) < 1e-9).Label($"{Angle.ToDegrees(worst)} degrees");
    }

    /// <summary>A small take with a few bytes changed for others, most of them such as stand in one.</summary>
    public sealed record Damaged(byte[] Bytes);

    public static class Damages
    {
        private const string Letters = "{}\n\r\t .:-+0123456789eEnaifROTJCHMX\0\u00ff";

        private static readonly byte[] Good = Encoding.Latin1.GetBytes(
            BvhTakes.OneJoint + "\n" + BvhTakes.Motion("0 0 0 170 5 -3", "0 0 0 179 5 -3", "0 0 0 -175 5 -3"));

        public static Arbitrary<Damaged> Damaged() =>
            (from count in Gen.Choose(1, 4)
             from places in Gen.Choose(0, Good.Length - 1).ArrayOf(count)
             from letters in Gen.Elements(Letters.ToCharArray()).ArrayOf(count)
             select new Damaged(Damage(places, letters))).ToArbitrary();

        private static byte[] Damage(int[] places, char[] letters)
        {
            byte[] bytes = [.. Good];
            for (var k = 0; k < places.Length; k++)
            {
                bytes[places[k]] = (byte)letters[k];
            }

            return bytes;
        }
    }

    [Property(MaxTest = 3000, Replay = "(123,457)", Arbitrary = [typeof(Damages)])]
    public Property A_damaged_file_is_a_take_or_a_clear_line(Damaged damaged)
    {
        try
        {
            var file = BvhTakes.Read(damaged.Bytes);
            return (BvhTakes.Read(BvhTakes.Written(file, file.Take)).Take.Length == file.Take.Length).Label("rows");
        }
        catch (InputFormatException e)
        {
            return (e.Message.Contains("found ") && !e.Message.Contains('\n')).Label(e.Message);
        }
    }
}
