using System.Collections.Immutable;

namespace MocapClean.Cli.Formats.Csv;

/// <summary>Which columns of a wide table hold a component of which joint.</summary>
internal sealed class ColumnPattern
{
    /// <summary>Stands for the name of the joint.</summary>
    public const string JointMark = "{joint}";

    /// <summary>Stands for the name of the component.</summary>
    public const string ComponentMark = "{component}";

    private readonly string[] before;
    private readonly string[] after;
    private readonly bool namesJoint;
    private readonly StringComparison comparison;

    /// <summary>A pattern with its four component names.</summary>
    /// <param name="pattern">With <c>{component}</c>, and with <c>{joint}</c> unless the table has one joint without a name.</param>
    /// <param name="components">In the order w, x, y, z.</param>
    /// <param name="comparison">How the fixed parts are compared.</param>
    public ColumnPattern(string pattern, ImmutableArray<string> components, StringComparison comparison)
    {
        var at = pattern.IndexOf(JointMark, StringComparison.Ordinal);
        namesJoint = at >= 0;
        this.comparison = comparison;
        before = [.. components.Select(c => Fill(namesJoint ? pattern[..at] : pattern, c))];
        after = [.. components.Select(c => Fill(namesJoint ? pattern[(at + JointMark.Length)..] : "", c))];
    }

    /// <summary>Takes a column's name apart.</summary>
    /// <param name="name">Name of the column without padding.</param>
    /// <param name="joint">Name of the joint; empty where the pattern has none.</param>
    /// <param name="component">0 to 3 for w, x, y, z.</param>
    public bool TryMatch(string name, out string joint, out int component)
    {
        for (component = 0; component < before.Length; component++)
        {
            if (Fits(name, before[component], after[component]))
            {
                joint = namesJoint ? name[before[component].Length..^after[component].Length] : "";
                return true;
            }
        }

        joint = "";
        return false;
    }

    /// <summary>Name of the column of a joint's component.</summary>
    public string ColumnOf(string joint, int component) => before[component] + joint + after[component];

    private static string Fill(string part, string component) => part.Replace(ComponentMark, component, StringComparison.Ordinal);

    private bool Fits(string name, string start, string end)
    {
        var room = name.Length - start.Length - end.Length;
        return (namesJoint ? room > 0 : room == 0) && name.StartsWith(start, comparison) && name.EndsWith(end, comparison);
    }
}
