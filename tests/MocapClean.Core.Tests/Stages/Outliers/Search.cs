using MocapClean.Core.Orientation;
using MocapClean.Core.Stages;
using MocapClean.Core.Stages.Outliers;
using MocapClean.Core.Takes;

namespace MocapClean.Core.Tests.Stages.Outliers;

/// <summary>Runs the stage and words what it found.</summary>
internal static class Search
{
    public static Take Run(Take take, StageSettings? settings = null) =>
        new OutliersStage().Run(take, StageContext.Uniform(take, settings ?? new StageSettings()));

    public static Take Run(double rate, Quat[] samples) => Run(Motion.Take(rate, samples));

    /// <summary>Rows such as <c>spike 91-92</c>, sign flips left out, in order of frames.</summary>
    public static string Rows(Take take) => string.Join(", ", take.Findings
        .Where(f => f.Kind != FaultKind.SignFlip).OrderBy(f => f.First).Select(f => $"{f.Kind.Text()} {f.First}-{f.Last}"));
}
