using System.Collections.Immutable;

namespace MocapClean.Cli.Config.Sources;

/// <summary>A take of the session.</summary>
/// <param name="Name">Path relative to the root, with forward slashes: its name everywhere.</param>
/// <param name="Path">The file, absolute.</param>
public sealed record FoundTake(string Name, string Path);

/// <summary>The takes of a session.</summary>
/// <param name="Root">The folder that names are relative to, absolute.</param>
/// <param name="Takes">In ordinal order of their names.</param>
/// <param name="Notes">One line each for what a glob met and what is no take, or for a glob that met nothing.</param>
public sealed record TakeList(string Root, ImmutableArray<FoundTake> Takes, ImmutableArray<string> Notes);
