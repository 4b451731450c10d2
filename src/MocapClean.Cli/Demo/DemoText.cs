using System.Text;

namespace MocapClean.Cli.Demo;

/// <summary>The words that go with the invented session.</summary>
internal static class DemoText
{
    public static byte[] Config { get; } = """
        # The invented session of the demo. Run it from anywhere: mocapclean run session.yaml
        session: The Lantern Yard, day 1
        ingest:
          takes: "takes/**/*"
        time-code:
          rate: 24
          slates: slates.csv
        output:
          folder: cleaned
        reshoot:
          critical: pelvis

        """u8.ToArray();

    public static byte[] Readme(ulong seed) => Encoding.UTF8.GetBytes($"""
        # An invented shooting day

        Written by `mocapclean demo` with seed {seed}: nobody performed this, no camera saw it. The motion is generated, the faults are put in on
        purpose, and `truth/` says where: joint, first and last frame (from 0, the last included), kind, size in degrees, and `hard` where
        the fault is close to what honest motion does. `slates.csv` gives each take's first frame a time code and says where the action is.

        Clean it with `mocapclean run session.yaml`; the outputs go to `cleaned/`.

        """);
}
