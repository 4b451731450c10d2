using MocapClean.Core.Orientation;

namespace MocapClean.Core.Takes;

/// <summary>One thing found about a run of frames, and what was done about it. Stages add findings and settle their action.</summary>
public sealed record Finding
{
    /// <summary>Index of the track, or -1 for the whole take.</summary>
    public required int Joint { get; init; }

    /// <summary>First frame, from 0.</summary>
    public required int First { get; init; }

    /// <summary>Last frame, included. A step is one frame: the first turned one.</summary>
    public required int Last { get; init; }

    /// <summary>What was found.</summary>
    public required FaultKind Kind { get; init; }

    /// <summary>What was done.</summary>
    public required FaultAction Action { get; init; }

    /// <summary>The jump or the turn from edge to edge, radians; NaN where it has none.</summary>
    public double SizeRadians { get; init; } = double.NaN;

    /// <summary>How many robust spreads from what was predicted; null where nothing was tested.</summary>
    public double? Spreads { get; init; }

    /// <summary>Expected RMS error of what was put in, radians; null where nothing was put in.</summary>
    public double? ExpectedErrorRadians { get; init; }

    /// <summary>The rotation that, multiplied on the left, would undo a step or offset.</summary>
    public Quat? UndoRoom { get; init; }

    /// <summary>The rotation that, multiplied on the right, would undo a step or offset.</summary>
    public Quat? UndoJoint { get; init; }

    /// <summary>Frames that were never recorded between this frame and the one before; 0 but for lost frames.</summary>
    public long Lost { get; init; }

    /// <summary>Plain words for the reader where kind and action do not say it all; empty otherwise.</summary>
    public string Note { get; init; } = "";

    /// <summary>Number of frames.</summary>
    public int Count => Last - First + 1;
}
