using System.Globalization;
using System.Text;
using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Demo;

/// <summary>Writes an invented take as BVH: a rest pose in front, the root's position carried.</summary>
internal static class DemoBvh
{
    public static void Write(DemoTake take, Quat[][] tracks, Stream output)
    {
        using var text = new StreamWriter(output, new UTF8Encoding(encoderShouldEmitUTF8Identifier: false), leaveOpen: true) { NewLine = "\n" };
        text.WriteLine("HIERARCHY");
        WriteJoint(text, 0, 0);
        text.WriteLine("MOTION");
        text.WriteLine($"Frames: {tracks[0].Length}");
        text.WriteLine(string.Create(CultureInfo.InvariantCulture, $"Frame Time: {1 / take.Rate:0.0000000}"));
        WriteMotion(text, take.Rate, tracks);
    }

    private static void WriteJoint(StreamWriter text, int joint, int depth)
    {
        var indent = new string('\t', depth);
        var bone = DemoTakes.Bones[joint];
        text.WriteLine($"{indent}{(depth == 0 ? "ROOT" : "JOINT")} {DemoTakes.Joints[joint]}");
        text.WriteLine($"{indent}{{");
        text.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{indent}\tOFFSET {bone.X:0.00} {bone.Y:0.00} {bone.Z:0.00}"));
        text.WriteLine(depth == 0
            ? $"{indent}\tCHANNELS 6 Xposition Yposition Zposition Zrotation Xrotation Yrotation"
            : $"{indent}\tCHANNELS 3 Zrotation Xrotation Yrotation");
        var children = Enumerable.Range(0, DemoTakes.Parents.Length).Where(j => DemoTakes.Parents[j] == joint).ToList();
        foreach (var child in children)
        {
            WriteJoint(text, child, depth + 1);
        }

        if (children.Count == 0)
        {
            text.WriteLine($"{indent}\tEnd Site\n{indent}\t{{\n{indent}\t\tOFFSET 0.00 0.00 12.00\n{indent}\t}}");
        }

        text.WriteLine($"{indent}}}");
    }

    private static void WriteMotion(StreamWriter text, double rate, Quat[][] tracks)
    {
        var order = Depth(0).ToArray();
        var angles = new EulerAngles[tracks.Length];
        for (var n = 0; n < tracks[0].Length; n++)
        {
            var walked = 140 * n / rate;
            text.Write(string.Create(CultureInfo.InvariantCulture, $"{0.2 * walked:0.0000} {96 + Math.Sin(n / 9.0):0.0000} {walked:0.0000}"));
            foreach (var joint in order)
            {
                angles[joint] = Euler.ToAngles(tracks[joint][n], EulerOrder.ZXY, angles[joint]);
                var (z, x, y) = angles[joint].ToDegrees();
                text.Write(string.Create(CultureInfo.InvariantCulture, $" {z:0.000000} {x:0.000000} {y:0.000000}"));
            }

            text.WriteLine();
        }
    }

    private static IEnumerable<int> Depth(int joint) =>
        Enumerable.Range(0, DemoTakes.Parents.Length).Where(j => DemoTakes.Parents[j] == joint).SelectMany(Depth).Prepend(joint);
}
