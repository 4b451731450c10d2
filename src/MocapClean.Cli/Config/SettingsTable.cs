using System.Text;

namespace MocapClean.Cli.Config;

/// <summary>Writes the table of settings that stands in the README.</summary>
public static class SettingsTable
{
    /// <summary>The table in Markdown: key, default, meaning.</summary>
    public static string Markdown()
    {
        var text = new StringBuilder("| key | default | meaning |\n| --- | --- | --- |\n");
        foreach (var key in ConfigCatalog.Root.Leaves())
        {
            var setting = key.Setting!;
            var value = setting.Default.Length > 0 ? $"`{setting.Default.Trim('"')}`" : setting.Unset;
            var only = setting.OnlyFor is [] ? "" : $" ({ShapeText.All(setting.OnlyFor)})";
            text.Append($"| `{key.Path}` | {value} | {key.Meaning}{only} |\n");
        }

        var joints = ConfigCatalog.Root.Child(ConfigCatalog.Joints)!;
        var blocks = ShapeText.All([.. joints.Children.Where(c => c.Setting is null).Select(c => $"`{c.Name}`")]);
        return text.Append($"| `{joints.Path}` | none | list of `{ConfigCatalog.Names}` (globs) with {blocks} blocks: ")
            .Append("merged key by key, later entries win, a changed `method` clears the other keys of its block |\n").ToString();
    }
}
