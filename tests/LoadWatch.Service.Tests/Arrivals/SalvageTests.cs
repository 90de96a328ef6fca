using LoadWatch.Recordings;
using LoadWatch.Service.Tests.Pipeline;

namespace LoadWatch.Service.Tests.Arrivals;

/// <summary>An inbox with <c>salvage</c> uses the beginning of a FIT file that was cut off; the activity says so.</summary>
public sealed class SalvageTests : IDisposable
{
    private readonly WorkingFolder folder = new();
    private readonly byte[] whole = Some.Fit(Some.Yesterday);

    public void Dispose() => folder.Dispose();

    private byte[] Cut => whole[..^400];

    [Fact]
    public void ACutFileCountsAndItsActivitySaysWhatIsMissing()
    {
        Salvage(on: true);
        folder.Put("anna/ride.fit", Cut);
        folder.Sweep();
        Assert.Equal(ArrivalState.Stored, folder.Arrival(Cut)!.State);
        Assert.Contains("what lies before is used", folder.Arrival(Cut)!.Reason, StringComparison.Ordinal);
        Assert.StartsWith("only its beginning is used: cut short", Remarks().First(), StringComparison.Ordinal);
    }

    [Fact]
    public void AWholeCopyTakesItsPlace()
    {
        Salvage(on: true);
        folder.Put("anna/ride.fit", Cut);
        folder.Sweep();
        folder.Put("anna/again.fit", whole);
        folder.Sweep();
        Assert.DoesNotContain(Remarks(), remark => remark.StartsWith("only its beginning", StringComparison.Ordinal));
    }

    [Fact]
    public void AChangeOfTheSettingReadsTheFileAgain()
    {
        folder.Put("anna/ride.fit", Cut);
        folder.Sweep();
        Assert.Equal(ArrivalState.Refused, folder.Arrival(Cut)!.State);
        Salvage(on: true);
        folder.Sweep();
        Assert.Equal(ArrivalState.Stored, folder.Arrival(Cut)!.State);
        Salvage(on: false);
        folder.Sweep();
        Assert.Equal(ArrivalState.Refused, folder.Arrival(Cut)!.State);
        Assert.Empty(folder.Read((_, session) => session.Activities.OfPerson("anna")));
    }

    [Fact]
    public void ARebuildGivesTheSame()
    {
        Salvage(on: true);
        folder.Put("anna/ride.fit", Cut);
        folder.Sweep();
        var before = folder.Export();
        folder.Rebuild();
        Assert.Equal(before, folder.Export());
    }

    [Theory]
    [InlineData("anna/ride.fit", "../salvaged/anna/ride.fit")]
    [InlineData("../salvaged/anna/ride.fit", "anna/ride.fit")]
    public void OneInboxThatAsksForItIsEnoughInWhateverOrder(string first, string second)
    {
        var text = File.ReadAllText(folder.ConfigPath);
        folder.Write("loadwatch.json", text.Replace(
            "\"inboxes\": [", "\"inboxes\": [{ \"name\": \"salvaged\", \"path\": \"salvaged\", \"take\": \"leave\", \"salvage\": true }, ", StringComparison.Ordinal));
        folder.Put(first, Cut);
        folder.Sweep();
        folder.Put(second, Cut);
        folder.Sweep();
        Assert.Equal(ArrivalState.Stored, folder.Arrival(Cut)!.State);
    }

    private IReadOnlyList<string> Remarks() => Assert.Single(folder.Read((_, session) => session.Activities.OfPerson("anna"))).Values.Remarks;

    private void Salvage(bool on)
    {
        var text = File.ReadAllText(folder.ConfigPath).Replace(", \"salvage\": true", "", StringComparison.Ordinal);
        folder.Write("loadwatch.json", on ? text.Replace("\"take\": \"leave\"", "\"take\": \"leave\", \"salvage\": true", StringComparison.Ordinal) : text);
    }
}
