using MocapClean.Core.Orientation;
using Xunit;

namespace MocapClean.Core.Tests.Stages.Outliers;

/// <summary>A real optical capture with faults put in; Data/Stages/Outliers/README.md tells its source and what was done.</summary>
public sealed class RealCaptureTests
{
    private static Quat[] HandTurned() => [.. File
        .ReadLines(Path.Combine(AppContext.BaseDirectory, "Data", "Stages", "Outliers", "hand-turned.csv")).Skip(1)
        .Select(line => line.Split(',')[1..].Select(double.Parse).ToArray())
        .Select(c => new Quat(c[0], c[1], c[2], c[3]).Normalised())];

    [Fact]
    public void Every_fault_put_in_is_found_at_its_frames_and_nothing_else() => Assert.Equal(
        "spike 91-92, offset 430-469, offset 593-663, step 833-833, step 932-932", Search.Rows(Search.Run(1 / 0.007, HandTurned())));

    [Theory]
    [InlineData(430, 0.882061594738, -0.092995333501, 0.227563594117, -0.401912952850, false)]
    [InlineData(593, 0.836559563975, 0.078008879941, -0.530775719610, -0.111174844477, true)]
    [InlineData(833, 0.998918746021, 0.042949977028, 0.016657754696, 0.006257597683, true)]
    [InlineData(932, 0.767857426695, -0.192195323566, 0.492631877202, 0.361621021835, true)]
    public void The_turns_are_measured_to_a_fifth_of_a_degree(int first, double w, double x, double y, double z, bool inRoom)
    {
        var found = Search.Run(1 / 0.007, HandTurned()).Findings.Single(f => f.First == first);
        var undo = inRoom ? found.UndoRoom : found.UndoJoint;
        Assert.InRange(Angle.ToDegrees(Angle.Between(undo!.Value, new Quat(w, x, y, z).Conjugate)), 0, 0.2);
    }
}
