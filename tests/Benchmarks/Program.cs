using BenchmarkDotNet.Running;

// dotnet run -c Release --project tests/Benchmarks -- --filter '*' --job short
BenchmarkSwitcher.FromAssembly(typeof(Program).Assembly).Run(args);
