using System.Text;
using MocapClean.Core.Stages.Settings;

namespace MocapClean.Cli.Config;

/// <summary>Writes a config to start from: two live lines, and every other key with its default behind a comment sign.</summary>
public static class ConfigStarter
{
    private const string Head = """
        # yaml-language-server: $schema=mocapclean.schema.json
        # A session for MocapClean. Two lines are live: the takes to read and the folder to write. Every other key stands here with its
        # default, or with an example where nothing is the default; take away the "# " in front of a key, and of its block, to change it.


        """;

    /// <summary>The text of the starter.</summary>
    public static string Text()
    {
        var text = new StringBuilder(Head.ReplaceLineEndings("\n"));
        foreach (var key in ConfigCatalog.Root.Children)
        {
            Write(text, key, "", isLive: IsLive(key));
            text.Append(key.Setting is null && key != ConfigCatalog.Root.Children[^1] ? "\n" : "");
        }

        return text.ToString();
    }

    private static void Write(StringBuilder text, KeyNode key, string indent, bool isLive)
    {
        if (key.Setting is { } setting)
        {
            var unset = setting.Default.Length > 0 || setting.IsRequired ? "" : $" (else: {setting.Unset})";
            var only = setting.OnlyFor is [var method] ? $" ({method})" : "";
            Line(text, $"{indent}{key.Name}: {Value(setting)}", $"{key.Meaning}{unset}{only}", isLive);
            return;
        }

        Line(text, $"{indent}{key.Name}:", key.Meaning, isLive);
        if (key.IsList)
        {
            WriteEntry(text, key, indent);
            return;
        }

        foreach (var child in key.Children)
        {
            Write(text, child, indent + "  ", isLive && child.Setting is { IsRequired: true });
        }
    }

    // Of each block one key stands for all: they are those above.
    private static void WriteEntry(StringBuilder text, KeyNode list, string indent)
    {
        var start = "- ";
        foreach (var child in list.Children)
        {
            var first = child.Leaves().First();
            var value = Value(first.Setting!);
            var yaml = child == first ? value : $"{{{first.Name}: {value}}}";
            Line(text, $"{indent}  {start}{child.Name}: {yaml}", child == first ? child.Meaning : "", isLive: false);
            start = "  ";
        }
    }

    private static string Value(Setting setting) => setting.Default.Length > 0 ? setting.Default : setting.Example;

    private static void Line(StringBuilder text, string yaml, string comment, bool isLive)
    {
        var line = isLive ? yaml : "# " + yaml;
        text.Append(comment.Length == 0 ? line : $"{line,-44} # {comment}").Append('\n');
    }

    private static bool IsLive(KeyNode key) => !key.IsList && key.Children.Any(c => c.Setting is { IsRequired: true });
}
