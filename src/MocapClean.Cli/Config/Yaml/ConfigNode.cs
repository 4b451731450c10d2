using System.Collections.Immutable;

namespace MocapClean.Cli.Config.Yaml;

/// <summary>A piece of YAML with its place. Nothing is typed: what a word means is for the setting to say.</summary>
/// <param name="At">Where it starts.</param>
internal abstract record ConfigNode(TextPlace At)
{
    /// <summary>What it is, as a message says it.</summary>
    public abstract string Kind { get; }

    /// <summary>Nothing after the colon, or one of YAML's words for it.</summary>
    public bool IsNothing => this is WordNode { IsPlain: true, Text: "" or "~" or "null" or "Null" or "NULL" };
}

/// <summary>A single text.</summary>
/// <param name="Text">The text, without quotes.</param>
/// <param name="IsPlain">Written without quotes.</param>
/// <param name="At">Where it starts.</param>
internal sealed record WordNode(string Text, bool IsPlain, TextPlace At) : ConfigNode(At)
{
    /// <inheritdoc/>
    public override string Kind => IsNothing ? "nothing" : $"'{Text}'";
}

/// <summary>A list.</summary>
/// <param name="Items">In order.</param>
/// <param name="At">Where it starts.</param>
internal sealed record ListNode(ImmutableArray<ConfigNode> Items, TextPlace At) : ConfigNode(At)
{
    /// <inheritdoc/>
    public override string Kind => "a list";
}

/// <summary>Keys with values.</summary>
/// <param name="Entries">In order, no key twice.</param>
/// <param name="At">Where it starts.</param>
internal sealed record BlockNode(ImmutableArray<KeyedNode> Entries, TextPlace At) : ConfigNode(At)
{
    /// <inheritdoc/>
    public override string Kind => "a block of keys";
}

/// <summary>A key and its value.</summary>
/// <param name="Key">The key.</param>
/// <param name="At">Where the key starts.</param>
/// <param name="Value">The value.</param>
internal sealed record KeyedNode(string Key, TextPlace At, ConfigNode Value);
