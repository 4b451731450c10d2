using System.CommandLine;
using MocapClean.Cli.Batch;
using MocapClean.Cli.Formats;
using MocapClean.Cli.Report.Csv;
using MocapClean.Core.Diff;
using MocapClean.Core.Orientation;

namespace MocapClean.Cli.Commands;

/// <summary><c>mocapclean diff</c>: how far any two takes differ, whoever made them.</summary>
internal static class DiffCommand
{
    /// <summary>The verb with its options.</summary>
    public static Command Create()
    {
        var before = new Argument<string>("BEFORE") { Description = "a take" };
        var after = new Argument<string>("AFTER") { Description = "another take of the same joints, in any format" };
        var output = new Option<string?>("--out") { HelpName = "DIR", Description = "also write the table to DIR/comparison.csv" };
        var shift = new Option<int>("--shift") { HelpName = "N", Description = "set the second take's clock later by N of its frames" };
        var strict = new Option<bool>("--strict") { Description = "end with 3 when a difference is beyond --tolerance" };
        var tolerance = new Option<double>("--tolerance") { HelpName = "DEG", DefaultValueFactory = _ => 0.5, Description = "degrees, for --strict" };
        PathArguments.RefuseOptions(before);
        PathArguments.RefuseOptions(after);
        var command = new Command("diff", "Compares two takes joint by joint, in degrees.") { before, after, output, shift, strict, tolerance };
        tolerance.Validators.Add(r =>
        {
            if (r.Tokens.Count == 1 && !(double.TryParse(r.Tokens[0].Value, out var degrees) && degrees >= 0))
            {
                r.AddError("--tolerance takes degrees, 0 or more");
            }
        });
        command.SetAction(parsed =>
        {
            try
            {
                var (first, second) = (TakeOpener.Ingest(parsed.GetRequiredValue(before)), TakeOpener.Ingest(parsed.GetRequiredValue(after)));
                var comparison = TakeComparison.Of(first, second, parsed.GetValue(shift));
                if (first.Space != second.Space)
                {
                    Console.Out.WriteLine("one take is read as orientations in the room, the other as relative to the parent: the angles mean little");
                }

                Print(comparison);
                if (parsed.GetValue(output) is { } folder)
                {
                    new FolderOutput(folder).Write("comparison.csv", s => ComparisonCsv.Write(comparison, s));
                }

                return parsed.GetValue(strict) && !comparison.IsWithin(Angle.FromDegrees(parsed.GetValue(tolerance))) ? ExitCode.Strict : ExitCode.Done;
            }
            catch (InputFormatException e)
            {
                Terminal.Error(e.Message);
                return ExitCode.TakesFailed;
            }
            catch (Exception e) when (e is IOException or UnauthorizedAccessException)
            {
                Terminal.Error(e.Message);
                return ExitCode.Usage;
            }
        });
        return command;
    }

    private static void Print(TakeComparison comparison)
    {
        Console.Out.WriteLine($"{comparison.PairedFrames} frames paired by time, {comparison.Joints.Length} joints in both");
        if (comparison.Joints.Length > 0)
        {
            var width = Math.Max(5, comparison.Joints.Max(j => j.Name.Length));
            Console.Out.WriteLine($"{"joint".PadRight(width)}  {"changed",8}  {"largest",11}  {"at frame",8}  {"RMS",11}  {"95 %",11}");
            foreach (var j in comparison.Joints)
            {
                Console.Out.WriteLine($"{j.Name.PadRight(width)}  {j.Changed,8}  {Deg(j.Change.Largest),11}  {j.LargestAt,8}  {Deg(j.Change.Rms),11}  {Deg(j.Change.Percentile95),11}{Missing(j)}");
            }
        }

        Unmatched("only before", comparison.OnlyBefore);
        Unmatched("only after", comparison.OnlyAfter);
    }

    private static string Deg(double radians) => $"{Angle.ToDegrees(radians):0.0000} deg";

    private static string Missing(JointComparison j) =>
        j.MissingBefore + j.MissingAfter == 0 ? "" : $"  missing only before {j.MissingBefore}, only after {j.MissingAfter}";

    private static void Unmatched(string what, IReadOnlyList<string> names)
    {
        if (names.Count > 0)
        {
            Console.Out.WriteLine($"{what}: {string.Join(", ", names)}");
        }
    }
}
