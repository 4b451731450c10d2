using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Nodes;
using System.Text.RegularExpressions;
using MocapClean.Core.Stages.Settings;

namespace MocapClean.Cli.Config;

/// <summary>
/// Writes the JSON schema (draft 2020-12) that editors check a config against while it is typed. It knows keys, words and units; bounds of
/// numbers with a unit are for the reader to check.
/// </summary>
public static class ConfigSchema
{
    // Indented by two, in any culture and on any system the same; patterns stay readable.
    private static readonly JsonSerializerOptions Written = new()
    {
        WriteIndented = true,
        NewLine = "\n",
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
    };

    /// <summary>The schema, with a line end.</summary>
    public static string Text()
    {
        var schema = new JsonObject
        {
            ["$schema"] = "https://json-schema.org/draft/2020-12/schema",
            ["title"] = "MocapClean session",
        };
        foreach (var (name, node) in Block(ConfigCatalog.Root).ToList())
        {
            schema[name] = node?.DeepClone();
        }

        return schema.ToJsonString(Written) + "\n";
    }

    private static JsonObject Node(KeyNode key)
    {
        var node = key switch
        {
            { Setting: { } setting } => Value(setting),
            { IsList: true } => new JsonObject { ["type"] = Types("array", "null"), ["items"] = Block(key) },
            _ when key.Child("method") is { } method => new JsonObject { ["anyOf"] = new JsonArray(Value(method.Setting!), Block(key)) },
            _ => Block(key),
        };
        if (key.Meaning.Length > 0)
        {
            node["description"] = key.Meaning;
        }

        if (key.Setting?.Default is { Length: > 0 } text)
        {
            node["default"] = text.Trim('"');
        }

        return node;
    }

    private static JsonObject Block(KeyNode key)
    {
        var required = key.Children.Where(IsRequired).Select(c => (JsonNode)c.Name).ToArray();
        var block = new JsonObject
        {
            ["type"] = required.Length > 0 ? Types("object") : Types("object", "null"),
            ["additionalProperties"] = false,
            ["properties"] = new JsonObject(key.Children.Select(c => KeyValuePair.Create<string, JsonNode?>(c.Name, Node(c)))),
        };
        if (required.Length > 0)
        {
            block["required"] = new JsonArray(required);
        }

        return block;
    }

    private static bool IsRequired(KeyNode key) => key.Setting?.IsRequired ?? (!key.IsList && key.Children.Any(IsRequired));

    private static JsonObject Value(Setting setting) => setting.Shape switch
    {
        Shape.Choice choice => Words(choice.Words),
        Shape.Quantity quantity => Quantity(quantity),
        Shape.WholeNumber count => new() { ["type"] = "integer", ["minimum"] = count.Low, ["maximum"] = count.High },
        Shape.Flag => new() { ["type"] = "boolean" },
        Shape.FreeText text => Text(text),
        Shape.WordList words => List(Words(words.Words), least: 1),
        Shape.TextList { Length: { } length } => List(Text(new()), length, length),
        _ => List(Text(new()), setting.IsRequired ? 1 : 0),
    };

    // A word of digits is a number to an editor.
    private static JsonObject Words(IEnumerable<string> words) => new()
    {
        ["enum"] = new JsonArray([.. words.SelectMany<string, JsonNode>(w => decimal.TryParse(w, out var number) ? [w, number] : [w])]),
    };

    private static JsonObject Quantity(Shape.Quantity quantity)
    {
        var words = string.Concat(quantity.OrWords.Select(w => "|" + Regex.Escape(w)));
        return new() { ["type"] = "string", ["pattern"] = $"^({UnitText.Of(quantity.Unit).Expression()}{words})$" };
    }

    // Nothing is typed in a config, so a text may look like a number or a truth.
    private static JsonObject Text(Shape.FreeText text) => text.Holding is []
        ? new() { ["type"] = Types("string", "number", "boolean"), ["pattern"] = "\\S" }
        : new() { ["type"] = "string", ["allOf"] = new JsonArray([.. text.Holding.Select(Holding)]) };

    private static JsonObject Holding(string part) => new() { ["pattern"] = Regex.Escape(part).Replace("}", "\\}") };

    private static JsonObject List(JsonObject item, int least, int? most = null)
    {
        var list = new JsonObject { ["type"] = "array", ["items"] = item, ["minItems"] = least };
        if (most is null)
        {
            return new() { ["anyOf"] = new JsonArray(item.DeepClone(), list) };
        }

        list["maxItems"] = most;
        list["uniqueItems"] = true;
        return list;
    }

    private static JsonNode Types(params string[] names) => names is [var only] ? only : new JsonArray([.. names.Select(n => (JsonNode)n)]);
}
