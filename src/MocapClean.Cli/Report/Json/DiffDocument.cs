using System.Collections.Immutable;
using System.Text.Json;
using MocapClean.Core.Orientation;
using MocapClean.Core.Takes;

namespace MocapClean.Cli.Report.Json;

/// <summary>The diff report of a take as JSON: the rows of the table, with what a table has no room for.</summary>
public sealed record DiffDocument(TakeSummary Summary, ImmutableArray<DiffDocument.FindingRow> Rows)
{
    /// <summary>One finding.</summary>
    public sealed record FindingRow
    {
        /// <summary>The joint; empty for the whole take.</summary>
        public required string Joint { get; init; }

        /// <summary>First frame.</summary>
        public required int FirstFrame { get; init; }

        /// <summary>Last frame, included.</summary>
        public required int LastFrame { get; init; }

        /// <summary>What was found.</summary>
        public required string Kind { get; init; }

        /// <summary>What was done.</summary>
        public required string Action { get; init; }

        /// <summary>Largest angle between delivered and written, or the jump.</summary>
        public double? LargestDeg { get; init; }

        /// <summary>Expected RMS error of what was put in.</summary>
        public double? ExpectedErrorDeg { get; init; }

        /// <summary>Robust spreads from what was predicted.</summary>
        public double? Spreads { get; init; }

        /// <summary>SMPTE address of the first frame.</summary>
        public required string FirstTimecode { get; init; }

        /// <summary>SMPTE address of the last frame.</summary>
        public required string LastTimecode { get; init; }

        /// <summary>The rotation (w, x, y, z) on the left that would undo it.</summary>
        public ImmutableArray<double>? UndoRoom { get; init; }

        /// <summary>The rotation (w, x, y, z) on the right that would undo it.</summary>
        public ImmutableArray<double>? UndoJoint { get; init; }

        /// <summary>Plain words.</summary>
        public required string Note { get; init; }
    }

    /// <summary>Writes the document to a stream that stays open.</summary>
    public static void Write(TakeReport report, TakeSummary summary, Stream output)
    {
        var rows = report.Diff.Rows.Select(r => new FindingRow
        {
            Joint = report.JointName(r.Finding),
            FirstFrame = report.Labels.Number(r.Finding.First),
            LastFrame = report.Labels.Number(r.Finding.Last),
            Kind = r.Finding.Kind.Text(),
            Action = r.Finding.Action.Text(),
            LargestDeg = ReportDegrees.Of(r.LargestRadians),
            ExpectedErrorDeg = ReportDegrees.Of(r.Finding.ExpectedErrorRadians),
            Spreads = r.Finding.Spreads is { } s ? Math.Round(s, 2) : null,
            FirstTimecode = report.Labels.TimeCode(r.Finding.First),
            LastTimecode = report.Labels.TimeCode(r.Finding.Last),
            UndoRoom = Numbers(r.Finding.UndoRoom),
            UndoJoint = Numbers(r.Finding.UndoJoint),
            Note = r.Finding.Note,
        });
        JsonSerializer.Serialize(output, new DiffDocument(summary, [.. rows]), ReportJson.Indented.DiffDocument);
        output.Write("\n"u8);
    }

    private static ImmutableArray<double>? Numbers(Quat? q) => q is { } v ? [v.W, v.X, v.Y, v.Z] : null;
}
