namespace MocapClean.Cli.Formats.Csv;

/// <summary>For each row of a long table its joint and frame.</summary>
/// <param name="Joints">Index of the joint.</param>
/// <param name="Frames">Index of the frame.</param>
internal sealed record RowPlaces(int[] Joints, int[] Frames);
