using MocapClean.Cli.Config.Yaml;

namespace MocapClean.Cli.Config;

/// <summary>What was read of a block and of the blocks within it.</summary>
internal sealed class BlockContent
{
    /// <summary>Values within their shapes, in order.</summary>
    public List<Given> Given { get; } = [];

    /// <summary>Paths of all keys that stand there, well read or not.</summary>
    public HashSet<string> Asked { get; } = [];

    /// <summary>Lists of blocks, unread, by path.</summary>
    public Dictionary<string, ConfigNode> Lists { get; } = [];
}
