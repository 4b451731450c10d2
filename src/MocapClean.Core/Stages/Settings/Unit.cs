namespace MocapClean.Core.Stages.Settings;

/// <summary>Units of settings, as a person writes them.</summary>
public enum Unit
{
    /// <summary>A plain number without unit.</summary>
    None,

    /// <summary>deg.</summary>
    Degrees,

    /// <summary>deg/s.</summary>
    DegreesPerSecond,

    /// <summary>Hz.</summary>
    Hertz,

    /// <summary>%.</summary>
    Percent,

    /// <summary>Robust standard deviations.</summary>
    Spreads,

    /// <summary>Frames, or a time in ms or s.</summary>
    FramesOrTime,

    /// <summary>A whole number of frames.</summary>
    Frames,

    /// <summary>A time in ms or s.</summary>
    Time,

    /// <summary>A number of bytes in kB, MB or GB.</summary>
    Bytes,
}
