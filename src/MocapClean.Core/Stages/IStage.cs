using MocapClean.Core.Takes;

namespace MocapClean.Core.Stages;

/// <summary>
/// One step of the flow: a whole take in, a whole take out, with findings added or settled. No state, no files, no clock, no log;
/// the same take and settings always give the same result, whatever the number of workers.
/// </summary>
public interface IStage
{
    /// <summary>Runs the stage.</summary>
    /// <exception cref="OperationCanceledException">The context was cancelled.</exception>
    Take Run(Take take, StageContext context);
}
