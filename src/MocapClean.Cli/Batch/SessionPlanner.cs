using System.Collections.Immutable;
using MocapClean.Cli.Config;
using MocapClean.Cli.Config.Sources;
using MocapClean.Cli.Report;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Batch;

/// <summary>Turns a config into a plan.</summary>
public static class SessionPlanner
{
    /// <summary>The plan of a session.</summary>
    /// <exception cref="ConfigException">No take is found, or the slates cannot be read.</exception>
    public static (SessionPlan Plan, ImmutableArray<string> Notes) Plan(SessionConfig config, int workers)
    {
        var found = TakeFinder.Find(config);
        var slates = SlateReader.Read(config, [.. found.Takes.Select(t => t.Name)]);
        ImmutableArray<SettingRow> settings =
        [
            .. SettingsListing.ForSession(config).Where(r => r.Value != "(required)").Select(r => new SettingRow(r.Key, r.Value, r.Origin)),
        ];
        var addresses = new AddressOf(config, slates);
        var plan = new SessionPlan
        {
            Title = config.Title,
            Takes = [.. found.Takes.Select(t => new PlannedTake(t.Name, t.Path))],
            Read = config.Source.Read,
            SettingsFor = (_, joint) => config.SettingsFor(joint),
            Verdict = config.Reshoot,
            LabelsFor = addresses.Labels,
            ActionFor = take => Action(slates.For(take)),
            Settings = settings,
            JointGlobs =
            [
                .. config.Reshoot.Critical.Select(g => ("reshoot.critical", g)), .. config.Reshoot.Ignore.Select(g => ("reshoot.ignore", g)),
                .. config.JointNames.Select(g => ("joints", g)),
            ],
            SlateTextFor = take => slates.For(take) is { } s ? $"{s.Slate.Frame} {s.Slate.Address} {s.ActionFirst} {s.ActionLast}" : "",
            Fingerprint = Fingerprint(settings),
            WriteKeys = config.Output.Keys.Contains("csv"),
            LargestTake = config.Limits.TakeSize,
            Workers = workers,
        };
        return (plan, [.. found.Notes, .. slates.Notes]);
    }

    /// <summary>Frames of the action; where only one end is told, the other is the take's.</summary>
    private static Segment? Action(TakeSlate? slate) =>
        slate is null or { ActionFirst: null, ActionLast: null } ? null : new Segment(slate.ActionFirst ?? 0, slate.ActionLast ?? int.MaxValue);

    /// <summary>All that can change an output; where the output lies and how the session is called does not.</summary>
    private static string Fingerprint(ImmutableArray<SettingRow> settings) => SessionRunner.Fingerprint(string.Join(
        '\n',
        settings.Where(s => s.Key is not ("session" or "output.folder" or "ingest.takes" or "ingest.except" or "time-code.slates"))
            .Select(s => $"{s.Key} {s.Value}").Append(ProgramVersion.Build)));
}
