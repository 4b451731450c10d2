namespace MocapClean.Core.Tests.Takes;

/// <summary>Reads the plain check tables of Data/Takes: no cell there holds a comma inside quotes but the last.</summary>
internal static class CheckCsv
{
    public static string[][] Rows(string name) =>
        [.. File.ReadLines(Path.Combine(AppContext.BaseDirectory, "Data", "Takes", name)).Skip(1).Select(line => line.Split(','))];
}
