namespace MocapClean.Cli.Formats;

/// <summary>A file in memory.</summary>
/// <param name="Name">Path relative to the session's root, forward slashes: the take's name in messages and reports.</param>
/// <param name="Bytes">Content, never changed.</param>
public sealed record TakeSource(string Name, byte[] Bytes);
