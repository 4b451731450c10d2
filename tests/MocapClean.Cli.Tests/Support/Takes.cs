using System.Globalization;
using System.Text;

namespace MocapClean.Cli.Tests.Support;

/// <summary>Small tables of one or more joints, as a file would hold them.</summary>
internal static class Takes
{
    /// <summary>Joints a and b that swing, 100 Hz.</summary>
    public static string Wide(int frames = 60) => Wide(frames, (_, line) => line);

    /// <summary>The same with a chance to spoil each row: number of the frame and the row's text.</summary>
    public static string Wide(int frames, Func<int, string, string> spoil)
    {
        var text = new StringBuilder("time,a.qw,a.qx,a.qy,a.qz,b.qw,b.qx,b.qy,b.qz\n");
        for (var n = 0; n < frames; n++)
        {
            var (a, b) = (0.3 * Math.Sin(n / 15.0), 0.2 * Math.Cos(n / 11.0));
            text.Append(spoil(n, string.Create(
                CultureInfo.InvariantCulture,
                $"{n / 100.0:0.0000},{Math.Cos(a):0.00000000},{Math.Sin(a):0.00000000},0,0,{Math.Cos(b):0.00000000},0,{Math.Sin(b):0.00000000},0"))).Append('\n');
        }

        return text.ToString();
    }
}
