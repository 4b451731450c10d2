namespace MocapClean.Cli.Tests.Support;

/// <summary>The checkout that the tests were built from.</summary>
internal static class Repository
{
    public static string Root { get; } = Find(AppContext.BaseDirectory);

    public static string Path(string relative) => System.IO.Path.Combine(Root, relative);

    private static string Find(string folder) => File.Exists(System.IO.Path.Combine(folder, "MocapClean.sln"))
        ? folder
        : Find(System.IO.Path.GetDirectoryName(System.IO.Path.TrimEndingDirectorySeparator(folder))
            ?? throw new DirectoryNotFoundException("no MocapClean.sln above the tests"));
}
