using BenchmarkDotNet.Attributes;
using LoadWatch.Activities;
using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;

namespace LoadWatch.Benchmarks;

/// <summary>Everything computed from a three-hour session with power, heart rate and speed, against decoding it.</summary>
[MemoryDiagnoser]
public class ComputeBenchmarks
{
    private static readonly ComputationSettings Settings = new();

    private readonly byte[] file = LongRide.File();
    private Recording recording = null!;

    [GlobalSetup]
    public void Setup() => recording = FitDecoder.Decode(file).Recordings[0];

    [Benchmark(Baseline = true)]
    public DecodedFile Decode() => FitDecoder.Decode(file);

    [Benchmark]
    public ActivityValues Compute() => ActivityComputation.Compute(recording, LongRide.Person, LongRide.Anchors, Settings);
}
