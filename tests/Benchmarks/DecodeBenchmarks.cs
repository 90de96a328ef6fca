using System.Security.Cryptography;
using BenchmarkDotNet.Attributes;
using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;

namespace LoadWatch.Benchmarks;

/// <summary>Decoding a long 1 Hz activity to channels, against hashing the same bytes.</summary>
[MemoryDiagnoser]
public class DecodeBenchmarks
{
    private readonly byte[] file = LongRide.File();

    [Benchmark(Baseline = true)]
    public byte[] Sha256() => SHA256.HashData(file);

    [Benchmark]
    public ushort Crc() => FitCrc.Of(file);

    [Benchmark]
    public DecodedFile Decode() => FitDecoder.Decode(file);
}
