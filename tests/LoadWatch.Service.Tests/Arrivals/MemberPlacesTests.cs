using System.Security.Cryptography;
using LoadWatch.Decoding;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Tests.Pipeline;

namespace LoadWatch.Service.Tests.Arrivals;

public class MemberPlacesTests
{
    private static readonly DecoderSet Decoders = new([]);

    [Fact]
    public void EveryContentOfAZipIsFoundAlsoInsideGzip()
    {
        var (ride, walk) = (Some.Fit(Some.Yesterday), Some.Fit(Some.Yesterday, 10));
        var zip = Some.Zip(("a.fit", ride), ("b.fit.gz", Some.Gzip(walk)), ("again.fit", ride));
        var places = new MemberPlaces(Decoders);

        Assert.Equal(ride, places.Find(Sha(zip), "week.zip", zip, Sha(ride))!.Bytes.ToArray());
        var inner = places.Find(Sha(zip), "week.zip", zip, Sha(walk))!;
        Assert.Equal((walk.Length, "week.zip!/b.fit.gz!/b.fit", Sha(zip)), (inner.Bytes.Length, inner.Path, inner.ParentSha));
        Assert.Equal(zip, places.Find(Sha(zip), "week.zip", zip, Sha(zip))!.Bytes.ToArray());
        Assert.Null(places.Find(Sha(zip), "week.zip", zip, Sha([1, 2, 3])));
    }

    [Fact]
    public void AFileThatIsNoZipIsItself()
    {
        var (ride, packed) = (Some.Fit(Some.Yesterday), Some.Gzip(Some.Fit(Some.Yesterday)));
        var places = new MemberPlaces(Decoders);

        Assert.Equal(ride, places.Find(Sha(ride), "a.fit", ride, Sha(ride))!.Bytes.ToArray());
        Assert.Equal(ride, places.Find(Sha(packed), "a.fit.gz", packed, Sha(ride))!.Bytes.ToArray());
    }

    [Fact]
    public void OnceAZipIsKnownOnlyTheMemberWantedIsUnpacked()
    {
        var members = Enumerable.Range(0, 30).Select(number => Enumerable.Repeat((byte)number, 1 << 20).ToArray()).ToList();
        var zip = Some.Zip([.. members.Select((bytes, number) => ($"{number}.csv", bytes))]);
        var places = new MemberPlaces(Decoders);
        places.Find(Sha(zip), "week.zip", zip, Sha(members[0]));
        var before = GC.GetAllocatedBytesForCurrentThread();

        Assert.NotNull(places.Find(Sha(zip), "week.zip", zip, Sha(members[29])));

        Assert.InRange(GC.GetAllocatedBytesForCurrentThread() - before, 1 << 20, 3 << 20);
    }

    private static string Sha(byte[] bytes) => Convert.ToHexStringLower(SHA256.HashData(bytes));
}
