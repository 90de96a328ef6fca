using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>Owners by file name and by device, from the inbox to the days. Every ride is of the device 4711.</summary>
public sealed class DeviceOwnerTests : IDisposable
{
    private const string Header = "serial,person,from,to,session\n";

    private static readonly byte[] Ride = Some.Fit(Some.Yesterday);

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void AHeldFileIsTakenUpWhenItsDeviceIsHandedOutAndMovesWithIt()
    {
        folder.Put("ride.fit", Ride);
        folder.Sweep();
        Assert.Equal(ArrivalState.Held, folder.Arrival(Ride)!.State);

        folder.Write("devices.csv", $"{Header}4711,anna,2026-06-14,,\n");
        folder.Sweep();
        Assert.Equal((ArrivalState.Stored, "anna"), (folder.Arrival(Ride)!.State, folder.Arrival(Ride)!.Person));
        AssertSettled();

        folder.Write("devices.csv", $"{Header}4711,anna,2026-06-15,,\n4711,bo,,2026-06-14,\n");
        folder.Sweep();
        Assert.Equal("bo", folder.Arrival(Ride)!.Person);
        AssertSettled();
    }

    [Fact]
    public void ACopyOfWhatADeviceOwnsIsIgnoredButAFolderGoesBeforeTheDevice()
    {
        folder.Write("devices.csv", $"{Header}4711,anna,,,\n");
        folder.Put("ride.fit", Ride);
        folder.Sweep();

        folder.Put("again.fit", Ride);
        Assert.Equal(0, folder.Sweep().PeopleComputed);
        Assert.Equal("anna", folder.Arrival(Ride)!.Person);

        folder.Put("bo/ride.fit", Ride);
        Assert.Equal(2, folder.Sweep().PeopleComputed);
        Assert.Equal("bo", folder.Arrival(Ride)!.Person);
        AssertSettled();
    }

    [Fact]
    public void AnAssignmentGoesBeforeTheDeviceUntilItIsWithdrawn()
    {
        folder.Write("devices.csv", $"{Header}4711,anna,,,\n");
        folder.Put("ride.fit", Ride);
        folder.PutRows(AnswerRows.Row("bo", Some.Yesterday, AnswerRows.Say(LoadWatch.Rows.AnswerWord.BelongsTo, file: "ride.fit"), "bo"));
        folder.Sweep();
        Assert.Equal("bo", folder.Arrival(Ride)!.Person);

        folder.PutRows();
        folder.Sweep(WorkingFolder.Now + Duration.FromMinutes(1));
        Assert.Equal("anna", folder.Arrival(Ride)!.Person);
        Assert.Equal(0, folder.Sweep(WorkingFolder.Now + Duration.FromMinutes(2)).PeopleComputed);
    }

    [Fact]
    public void AFileNameTellsWhereNoFolderDoes()
    {
        var json = File.ReadAllText(folder.ConfigPath);
        folder.Write("loadwatch.json", json.Replace("\"take\"", "\"file_pattern\": \"{person}_*\", \"take\"", StringComparison.Ordinal));
        folder.Put("Bo Björk_2026.fit", Ride);
        folder.Put("cara/bo_1.fit", Some.Fit(Some.Yesterday, 60));

        folder.Sweep();

        Assert.Equal(["bo", "cara"], folder.Arrivals().Select(arrival => arrival.Person).Order(StringComparer.Ordinal));
        AssertSettled();
    }

    private void AssertSettled()
    {
        var before = folder.Everything();
        Assert.Equal(0, folder.Sweep().PeopleComputed);
        Assert.Equal(before, folder.Everything());
        folder.Rebuild();
        Assert.Equal(before, folder.Everything());
    }
}
