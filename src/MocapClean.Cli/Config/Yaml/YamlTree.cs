using System.Collections.Immutable;
using YamlDotNet.Core;
using YamlDotNet.Core.Events;

namespace MocapClean.Cli.Config.Yaml;

/// <summary>
/// Builds the tree of one YAML 1.2 document from the parser's events, and refuses on the way what a config has no need of:
/// anchors and aliases (so nothing can multiply or run in circles), tags, a second document, and nesting without end.
/// </summary>
internal sealed class YamlTree
{
    private const int Deepest = 32;

    private readonly Parser parser;
    private readonly ProblemList problems;
    private int depth;

    private YamlTree(string text, ProblemList problems)
    {
        parser = new Parser(new StringReader(text));
        this.problems = problems;
    }

    /// <summary>The document's block of keys, or null when there is none; what is wrong goes to the list.</summary>
    public static BlockNode? Read(string text, ProblemList problems)
    {
        var tree = new YamlTree(text, problems);
        try
        {
            return tree.Document();
        }
        catch (YamlException e)
        {
            problems.Add(At(e.Start), "this is not YAML: " + FirstLower(e.Message));
        }
        catch (InvalidOperationException)
        {
            // What the parser throws, without a place, when a bracket is still open where the next key starts.
            var last = tree.parser.Current is { } read ? At(read.End) : new TextPlace(1, 1);
            problems.Add(last, "this is not YAML: a bracket or brace is not closed");
        }

        return null;
    }

    private BlockNode? Document()
    {
        _ = Next<StreamStart>();
        if (!parser.MoveNext() || parser.Current is not DocumentStart)
        {
            problems.Add(new TextPlace(1, 1), "the file is empty; two keys are needed: ingest.takes and output.folder");
            return null;
        }

        var root = Node(Advance());
        _ = Next<DocumentEnd>();
        if (Advance() is DocumentStart second)
        {
            throw new YamlException(second.Start, second.End, "a second document starts here; a config is one");
        }

        if (root is BlockNode block)
        {
            return block;
        }

        problems.Add(root.At, $"a config is a block of keys, not {root.Kind}");
        return null;
    }

    private ConfigNode Node(ParsingEvent first)
    {
        var at = At(first.Start);
        return first switch
        {
            Scalar scalar => new WordNode(scalar.Value, scalar.Style == ScalarStyle.Plain, at),
            SequenceStart => new ListNode(Items(), at),
            _ => new BlockNode(Entries(), at),
        };
    }

    private ImmutableArray<ConfigNode> Items()
    {
        var items = ImmutableArray.CreateBuilder<ConfigNode>();
        for (var next = Advance(); next is not SequenceEnd; next = Advance())
        {
            items.Add(Node(next));
        }

        return items.ToImmutable();
    }

    private ImmutableArray<KeyedNode> Entries()
    {
        var entries = ImmutableArray.CreateBuilder<KeyedNode>();
        for (var next = Advance(); next is not MappingEnd; next = Advance())
        {
            var key = Node(next);
            var value = Node(Advance());
            if (key is not WordNode word)
            {
                problems.Add(key.At, $"a key is a word, not {key.Kind}");
            }
            else if (entries.FirstOrDefault(e => e.Key == word.Text) is { } earlier)
            {
                problems.Add(key.At, $"key '{word.Text}' stands here twice; the first is in line {earlier.At.Line}");
            }
            else
            {
                entries.Add(new(word.Text, key.At, value));
            }
        }

        return entries.ToImmutable();
    }

    private T Next<T>()
        where T : ParsingEvent => parser.MoveNext() && parser.Current is T next ? next : throw new InvalidOperationException();

    private ParsingEvent Advance()
    {
        if (!parser.MoveNext() || parser.Current is not { } next)
        {
            throw new InvalidOperationException();
        }

        depth += next.NestingIncrease;
        var refused = next switch
        {
            AnchorAlias => "an alias (*) is not supported; a name or glob that starts with * needs quotes",
            NodeEvent { Anchor.IsEmpty: false } => "an anchor (&) is not supported; text that starts with & needs quotes",
            NodeEvent { Tag.IsEmpty: false } => "a tag (!) is not supported; text that starts with ! needs quotes",
            _ when depth > Deepest => $"nested more than {Deepest} deep",
            _ => null,
        };
        return refused is null ? next : throw new YamlException(next.Start, next.End, refused);
    }

    private static TextPlace At(Mark mark) => new((int)mark.Line, (int)mark.Column);

    private static string FirstLower(string text) => text.Length == 0 ? text : char.ToLowerInvariant(text[0]) + text[1..];
}
