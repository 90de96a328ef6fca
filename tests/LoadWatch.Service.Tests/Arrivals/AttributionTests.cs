using LoadWatch.People;
using LoadWatch.Recordings;
using LoadWatch.Service.Arrivals;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Tests.Configuration;
using NodaTime;

namespace LoadWatch.Service.Tests.Arrivals;

public sealed class AttributionTests : IDisposable
{
    private static readonly Instant Now = Instant.FromUtc(2026, 3, 20, 6, 0);

    private readonly ConfigurationFolder folder = new();
    private readonly WorkingConfiguration configuration;

    public AttributionTests()
    {
        folder.Write("loadwatch.json", """
            { "time_zone": "UTC", "inboxes": [{ "name": "pods", "path": "inbox", "file_pattern": "{person}_*" }, { "name": "plain", "path": "other" }] }
            """);
        folder.Write("roster.csv", "person,name,group,time_zone,aliases\nanna,Anna Ahola,squad,,7\nanna_b,Anna Berg,squad,,\nben,Ben,squad,Pacific/Auckland,\n");
        folder.Write("devices.csv", "serial,person,from,to,session\n4711,anna,,2026-03-02,\n4711,ben,2026-03-03,,\n4712,ben,,,\n");
        configuration = folder.Read();
    }

    public void Dispose() => folder.Dispose();

    [Theory]
    [InlineData("ben", "pods", "anna/anna_1.fit", "ben")] // A decision goes before all.
    [InlineData("gone", "pods", "anna/ride.fit", "gone")]
    [InlineData(null, "pods", "ben/anna_1.fit", "ben")] // Folders go before file names.
    [InlineData(null, "pods", "week/anna_1.fit", "anna")]
    [InlineData(null, "pods", "anna_1.zip!/ride.fit", "anna")]
    [InlineData(null, "pods", "week.zip!/BEN_1.fit.gz", "ben")]
    [InlineData(null, "pods", "7_run.fit", "anna")]
    [InlineData(null, "pods", "Anna Berg_run.fit", "anna_b")]
    [InlineData(null, "pods", "anna_b_run.fit", "anna_b")] // The longest reading.
    [InlineData(null, "pods", "cas_run.fit", "")]
    [InlineData(null, "pods", "anna.fit", "")]
    [InlineData(null, "plain", "anna_1.fit", "")] // That inbox has no pattern.
    public void TheFirstThatNamesAnybodyTells(string? decided, string inbox, string path, string expected) =>
        Assert.Equal(expected, string.Join(',', Attribution.Claims(decided, [new SeenName(inbox, path)], configuration)));

    [Fact]
    public void AFolderOfOneNameGoesBeforeTheFileNameOfAnother() =>
        Assert.Equal(["ben"], Attribution.Claims(null, [new SeenName("pods", "anna_1.fit"), new SeenName("pods", "ben/x.fit")], configuration));

    [Fact]
    public void TwoNamesMayClaimForTwoPeople() =>
        Assert.Equal(["anna", "ben"], Attribution.Claims(null, [new SeenName("pods", "ben_1.fit"), new SeenName("pods", "anna_1.fit")], configuration));

    [Theory]
    [InlineData("2026-03-02T10:00:00Z", 4711, "anna")]
    [InlineData("2026-03-05T10:00:00Z", 4711, "ben")]
    [InlineData("2026-03-02T23:30:00Z", 4711, "anna,ben")] // Already the third in Ben's zone, still the second in Anna's.
    [InlineData("2026-03-02T10:00:00Z", 4713, "")]
    [InlineData("2026-03-02T10:00:00Z", null, "")]
    public void ADeviceTellsByTheDateOfTheRecording(string start, int? serial, string expected) =>
        Assert.Equal(expected, string.Join(',', ByDevice(Recorded(start, serial))));

    [Fact]
    public void EveryRecordingOfAFileMustHaveAnOwner()
    {
        Assert.Equal(["ben"], ByDevice(Recorded("2026-03-05T10:00:00Z", 4711), Recorded("2026-03-05T12:00:00Z", 4712)));
        Assert.Empty(ByDevice(Recorded("2026-03-05T10:00:00Z", 4711), Recorded("2026-03-05T12:00:00Z", 4713)));
        Assert.Equal(["anna", "ben"], ByDevice(Recorded("2026-03-01T10:00:00Z", 4711), Recorded("2026-03-05T12:00:00Z", 4711)));
        Assert.Equal(["ben"], ByDevice(Recorded("2026-03-05T10:00:00Z", 4711), Recorded("1999-03-05T12:00:00Z", 4713)));
    }

    [Theory]
    [InlineData("{person}", "anna.fit", "anna")]
    [InlineData("{person}", "anna.fit.gz", "anna")]
    [InlineData("*-{person}-??.fit", "pod-7-01.fit", "anna")]
    [InlineData("*-{person}-??.fit", "pod-7-1.fit", null)]
    [InlineData("[{person}]*", "[ben] run.csv", "ben")]
    [InlineData("{person}_*", "_anna_.fit", null)]
    public void APatternFindsThePersonWhereItSays(string pattern, string name, string? person) =>
        Assert.Equal(person, FilePattern.Parse(pattern)!.Find(name, configuration.Subjects)?.Id);

    [Theory]
    [InlineData("ANNA", "anna")]
    [InlineData(" Anna Ahola ", "anna")]
    [InlineData("7", "anna")]
    [InlineData("4712", "ben")]
    [InlineData("nobody", null)]
    public void ASubjectIsFoundByIdNameAliasOrDevice(string written, string? person) =>
        Assert.Equal(person, configuration.Subjects.Find(written, new LocalDate(2026, 3, 2))?.Id);

    [Fact]
    public void ANameOfTwoPeopleTellsNobody() =>
        Assert.Null(ConfigurationFolder.With("roster.csv", "person,name,group\na1,Anna,squad\na2,Anna,squad\n").Subjects.Find("Anna"));

    [Theory]
    [InlineData("SQUAD", "squad")]
    [InlineData("anna", null)]
    public void AGroupIsFoundByItsId(string written, string? group) => Assert.Equal(group, configuration.Subjects.FindGroup(written)?.Id);

    private IReadOnlyList<string> ByDevice(params Recording[] recordings) => Attribution.ByDevice(recordings, Now, configuration.Devices, configuration.People);

    private static Recording Recorded(string start, int? serial) => new()
    {
        Part = 1,
        Sport = new Sport("running"),
        Start = NodaTime.Text.InstantPattern.ExtendedIso.Parse(start).Value,
        Device = new Device(1, 1, serial),
    };
}
