using BenchmarkDotNet.Running;
using LoadWatch.Benchmarks;
using LoadWatch.Benchmarks.Briefs;
using LoadWatch.Benchmarks.Imports;

// dotnet run -c Release --project tests/Benchmarks -- --filter '*' --job short
// dotnet run -c Release --project tests/Benchmarks -- import
// dotnet run -c Release --project tests/Benchmarks -- worst
// dotnet run -c Release --project tests/Benchmarks -- compute
// dotnet run -c Release --project tests/Benchmarks -- decode
// dotnet run -c Release --project tests/Benchmarks -- brief
if (args is [ImportBenchmark.Name, .. var rest])
{
    return ImportBenchmark.Run(rest);
}

if (args is [WorstFiles.Name])
{
    return WorstFiles.Run();
}

if (args is [ComputeSpeed.Name])
{
    return ComputeSpeed.Run();
}

if (args is [DecodeTable.Name])
{
    return DecodeTable.Run();
}

if (args is [BriefBenchmark.Name])
{
    return BriefBenchmark.Run();
}

BenchmarkSwitcher.FromAssembly(typeof(Program).Assembly).Run(args);
return 0;
