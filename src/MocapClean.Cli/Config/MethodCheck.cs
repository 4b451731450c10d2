using MocapClean.Core.Stages.Settings;

namespace MocapClean.Cli.Config;

/// <summary>
/// Finds keys that belong to a method which cannot hold where they stand. An entry of <c>joints</c> without a method of its own may meet
/// the session's or that of any entry before it.
/// </summary>
internal sealed class MethodCheck(ProblemList problems)
{
    private readonly Dictionary<string, HashSet<string>> possible = [];
    private readonly HashSet<string> unclear = [];

    /// <summary>Checks the session's own settings first, then each entry in order.</summary>
    public void Check(BlockContent content, bool isEntry)
    {
        foreach (var block in content.Given.Where(g => content.Asked.Contains(g.Key.MethodPath) || g.Key.Setting!.OnlyFor is not [])
            .GroupBy(g => g.Key.Block))
        {
            var method = block.FirstOrDefault(g => g.Key.Path == g.Key.MethodPath)?.Value.Word;
            if (method is null && content.Asked.Contains(block.First().Key.MethodPath))
            {
                // The method itself could not be read: whatever is said about its keys may be wrong.
                unclear.Add(block.Key);
            }

            CheckBlock(block, method);
            Remember(block.Key, method, isEntry);
        }
    }

    private void CheckBlock(IGrouping<string, Given> block, string? method)
    {
        if (method is null && unclear.Contains(block.Key))
        {
            return;
        }

        var methods = method is null ? Possible(block.Key) : [method];
        foreach (var given in block.Where(g => g.Key.Setting!.OnlyFor is not [] && !g.Key.Setting.OnlyFor.Any(methods.Contains)))
        {
            problems.Add(given.At, Message(given.Key, methods));
        }
    }

    private void Remember(string block, string? method, bool isEntry)
    {
        if (method is not null && !isEntry)
        {
            possible[block] = [method];
        }
        else if (method is not null)
        {
            Possible(block).Add(method);
        }
    }

    private HashSet<string> Possible(string block)
    {
        if (!possible.TryGetValue(block, out var methods))
        {
            possible[block] = methods = [StageLayers.DefaultMethod(block)];
        }

        return methods;
    }

    private static string Message(KeyNode key, IEnumerable<string> methods)
    {
        Setting setting = key.Setting!;
        var belongs = setting.OnlyFor is [var only] ? $"method {only}" : $"methods {ShapeText.All(setting.OnlyFor)}";
        return $"{key.Path} belongs to {belongs}, not {ShapeText.Either([.. methods])}";
    }
}
