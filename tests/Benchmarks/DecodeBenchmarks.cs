using System.Security.Cryptography;
using BenchmarkDotNet.Attributes;
using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;

namespace LoadWatch.Benchmarks;

/// <summary>Decoding a long 1 Hz activity of twelve fields a record to channels, against the least that reading it takes and against hashing it.</summary>
[MemoryDiagnoser]
public class DecodeBenchmarks
{
    private readonly byte[] file = LongRide.FileOfTwelveFields();
    private readonly RecordFloor floor = new(LongRide.Seconds);

    [Benchmark(Baseline = true)]
    public int Floor() => floor.Run(file);

    [Benchmark]
    public byte[] Sha256() => SHA256.HashData(file);

    [Benchmark]
    public ushort Crc() => FitCrc.Of(file);

    [Benchmark]
    public DecodedFile Decode() => FitDecoder.Decode(file);
}
