using LoadWatch.Recordings;
using LoadWatch.Service.Tests.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Tests.Metamorphic;

/// <summary>The same bytes under two people's folders are held, whichever came first and however they are packed (I-5).</summary>
public sealed class TwoFoldersTests
{
    private static readonly byte[] Ride = Some.Fit(Some.Yesterday, 75);

    private static readonly string[] Packings = ["bare", "gzip", "zip"];

    public static TheoryData<string, string> Pairs()
    {
        var data = new TheoryData<string, string>();
        foreach (var one in Packings)
        {
            foreach (var other in Packings)
            {
                data.Add(one, other);
            }
        }

        return data;
    }

    [Theory]
    [MemberData(nameof(Pairs))]
    public void TheyAreHeldInEitherOrderAndInOneSweep(string ofAnna, string ofBo)
    {
        var (anna, bo) = (Pack("anna", ofAnna), Pack("bo", ofBo));

        var held = Digested([anna, bo]);

        Assert.Contains($"{WorkingFolder.Sha(Ride)} fit {ArrivalState.Held}", held, StringComparison.Ordinal);
        Assert.DoesNotContain($"{WorkingFolder.Sha(Ride)}/", held, StringComparison.Ordinal);
        MetamorphicTests.AssertSame(held, Digested([anna], [bo]));
        MetamorphicTests.AssertSame(held, Digested([bo], [anna]));
    }

    private static (string Path, byte[] Bytes) Pack(string person, string packing) => packing switch
    {
        "gzip" => ($"{person}/ride.fit.gz", Some.Gzip(Ride)),
        "zip" => ($"all {person}.zip", Some.Zip(($"{person}/ride.fit", Ride), ($"{person}/other {person}.fit", Some.Fit(Some.Yesterday, person.Length, product: 9)))),
        _ => ($"{person}/ride.fit", Ride),
    };

    /// <summary>Of what came in these sweeps beside another ride of each, at the same last moment; without the other file of a zip.</summary>
    private static string Digested(params (string Path, byte[] Bytes)[][] sweeps)
    {
        using var folder = new WorkingFolder();
        folder.Put("anna/first.fit", Some.Fit(Some.Yesterday.PlusDays(-3)));
        folder.Put("bo/first.fit", Some.Fit(Some.Yesterday.PlusDays(-3), 1));
        foreach (var files in sweeps)
        {
            folder.Fill(files);
            folder.Sweep(WorkingFolder.Now - Duration.FromMinutes(1));
        }

        folder.Sweep();
        return Digest.Of(folder, SquadBase.Shared.DerivedTables);
    }
}
