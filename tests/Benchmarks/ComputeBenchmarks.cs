using BenchmarkDotNet.Attributes;
using LoadWatch.Activities;
using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;

namespace LoadWatch.Benchmarks;

/// <summary>
/// All pure work for the file of a three-hour session with power, heart rate and speed, against the least that reading the file takes: decoding it, what merging
/// wants to know, whether it can be its owner's, and everything computed from it.
/// </summary>
[MemoryDiagnoser]
public class ComputeBenchmarks
{
    private static readonly ComputationSettings Settings = new();

    private readonly byte[] file = LongRide.File();
    private readonly RecordFloor floor = new(LongRide.Seconds);
    private Recording recording = null!;

    [GlobalSetup]
    public void Setup() => recording = FitDecoder.Decode(file).Recordings[0];

    [Benchmark(Baseline = true)]
    public int Floor() => floor.Run(file);

    [Benchmark]
    public DecodedFile Decode() => FitDecoder.Decode(file);

    [Benchmark]
    public RecordingSummary Summarize() => RecordingSummaries.Of("", new UsableRecording(recording, 0.5), LongRide.Person, sourceName: null);

    [Benchmark]
    public string? Judge() => Plausibility.Of(new UsableRecording(recording, 0.5), LongRide.Person, LongRide.Anchors, LongRide.Date);

    [Benchmark]
    public ActivityValues Compute() => ActivityComputation.Compute(recording, LongRide.Person, LongRide.Anchors, Settings);
}
