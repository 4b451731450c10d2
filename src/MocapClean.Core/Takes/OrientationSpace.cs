namespace MocapClean.Core.Takes;

/// <summary>What a joint's samples are relative to.</summary>
public enum OrientationSpace
{
    /// <summary>The room.</summary>
    World,

    /// <summary>The parent joint.</summary>
    Local,
}
