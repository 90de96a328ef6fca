using BenchmarkDotNet.Running;
using LoadWatch.Benchmarks.Imports;

// dotnet run -c Release --project tests/Benchmarks -- --filter '*' --job short
// dotnet run -c Release --project tests/Benchmarks -- import
if (args is [ImportBenchmark.Name, .. var rest])
{
    return ImportBenchmark.Run(rest);
}

BenchmarkSwitcher.FromAssembly(typeof(Program).Assembly).Run(args);
return 0;
