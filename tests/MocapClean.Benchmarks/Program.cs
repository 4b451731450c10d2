using BenchmarkDotNet.Columns;
using BenchmarkDotNet.Configs;
using BenchmarkDotNet.Diagnosers;
using BenchmarkDotNet.Jobs;
using BenchmarkDotNet.Running;
using BenchmarkDotNet.Toolchains.InProcess.Emit;
using MocapClean.Benchmarks;

// Every figure is for one sample (one orientation of one joint). Run as: dotnet run -c Release -- --filter '*Reduce*'
var config = DefaultConfig.Instance
    .AddJob(Job.ShortRun.WithToolchain(InProcessEmitToolchain.Instance))
    .AddDiagnoser(MemoryDiagnoser.Default)
    .HideColumns(Column.Error, Column.StdDev, Column.Gen0, Column.Gen1, Column.Gen2);
BenchmarkSwitcher.FromAssembly(typeof(InventedTake).Assembly).Run(args, config);
