using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Tests.Formats.Bvh;

/// <summary>
/// Forward kinematics for the tests alone, by 3 x 3 matrices: where joints and end sites stand in the room. Shares nothing with the program
/// but the take it is given.
/// </summary>
internal static class Chain
{
    /// <summary>Positions of the joints, then of the end sites, of one frame; a root joint stands at its bone vector plus the root's position.</summary>
    public static (Dictionary<string, double[]> Joints, Dictionary<string, double[]> Ends) Positions(Take take, int frame, double[] root)
    {
        var bones = take.Skeleton!.Bones;
        var rotations = new double[bones.Length][,];
        var origins = new double[bones.Length][];
        for (var j = 0; j < bones.Length; j++)
        {
            var (parent, local) = (bones[j].Parent, Matrix(take.Tracks[j].Samples[frame]));
            rotations[j] = parent < 0 ? local : Product(rotations[parent], local);
            origins[j] = parent < 0 ? Sum(root, Column(bones[j].Vector)) : Sum(origins[parent], Turn(rotations[parent], bones[j].Vector));
        }

        var ends = take.Skeleton.EndSites.ToDictionary(
            e => bones[e.Parent].Name + " end", e => Sum(origins[e.Parent], Turn(rotations[e.Parent], e.Vector)));
        return (bones.Index().ToDictionary(b => b.Item.Name, b => origins[b.Index]), ends);
    }

    private static double[,] Matrix(Quat q) => new[,]
    {
        { 1 - (2 * ((q.Y * q.Y) + (q.Z * q.Z))), 2 * ((q.X * q.Y) - (q.W * q.Z)), 2 * ((q.X * q.Z) + (q.W * q.Y)) },
        { 2 * ((q.X * q.Y) + (q.W * q.Z)), 1 - (2 * ((q.X * q.X) + (q.Z * q.Z))), 2 * ((q.Y * q.Z) - (q.W * q.X)) },
        { 2 * ((q.X * q.Z) - (q.W * q.Y)), 2 * ((q.Y * q.Z) + (q.W * q.X)), 1 - (2 * ((q.X * q.X) + (q.Y * q.Y))) },
    };

    private static double[,] Product(double[,] a, double[,] b)
    {
        var c = new double[3, 3];
        for (var n = 0; n < 27; n++)
        {
            c[n / 9, n / 3 % 3] += a[n / 9, n % 3] * b[n % 3, n / 3 % 3];
        }

        return c;
    }

    private static double[] Turn(double[,] m, Vec3 v) =>
        [.. Enumerable.Range(0, 3).Select(r => (m[r, 0] * v.X) + (m[r, 1] * v.Y) + (m[r, 2] * v.Z))];

    private static double[] Column(Vec3 v) => [v.X, v.Y, v.Z];

    private static double[] Sum(double[] a, double[] b) => [.. a.Zip(b, (x, y) => x + y)];
}
