using System.Collections.Immutable;
using MocapClean.Cli.Config;
using MocapClean.Cli.Report;
using MocapClean.Core.Diff;

namespace MocapClean.Cli.Batch;

/// <summary>Puts the session's report together from what was done now and earlier; who did it when leaves no trace.</summary>
public static class SessionAssembly
{
    /// <summary>The report over all takes of the plan.</summary>
    /// <param name="plan">The plan.</param>
    /// <param name="takes">Every take with its summary, if it has one, and whether that is stale.</param>
    /// <param name="leftovers">Output files that belong to no take of the plan.</param>
    public static SessionReport Build(
        SessionPlan plan, IReadOnlyList<(PlannedTake Take, TakeSummary? Summary, bool Stale)> takes, ImmutableArray<string> leftovers)
    {
        ImmutableArray<TakeSummary> done = [.. takes.Where(t => t.Summary is not null).Select(t => t.Summary!)];
        var processed = done.Where(t => t.Failure is null).ToList();
        var names = Enum.GetValues<Verdict>().Select(v => v.Text());
        return new SessionReport
        {
            Session = plan.Title,
            Version = ProgramVersion.Text,
            Verdicts =
            [
                .. names.Select(v => new VerdictCount(v, processed.Count(t => t.Verdict == v))),
                new VerdictCount("not processed", done.Length - processed.Count),
            ],
            Settings = plan.Settings,
            Takes = done,
            Trouble = JointTrouble.Across(processed.SelectMany(t => t.PerJoint).Select(j => (j.Name, j.BadFrames, j.Mended))),
            UnmatchedJoints =
            [
                .. plan.JointGlobs.Where(g => processed.Count > 0 && !processed.Any(t => t.PerJoint.Any(j => JointGlobs.MatchesAny(j.Name, [g.Glob]))))
                    .Select(g => $"{g.Key}: '{g.Glob}' matches no joint"),
            ],
            NotRun = [.. takes.Where(t => t.Summary is null && !t.Stale).Select(t => t.Take.Name)],
            Stale = [.. takes.Where(t => t.Stale).Select(t => t.Take.Name)],
            Leftovers = leftovers,
        };
    }
}
