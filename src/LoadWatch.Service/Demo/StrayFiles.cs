using LoadWatch.Decoding.Fit;
using LoadWatch.People;
using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>Files that are nobody's session: one of somebody who is not in the roster, and one without training in it.</summary>
internal static class StrayFiles
{
    private const int FileId = 0;
    private const int SettingsType = 2;
    private const byte TypeField = 0;
    private const byte ManufacturerField = 1;
    private const byte ProductField = 2;
    private const byte SerialField = 3;
    private const int UnknownBack = 5;

    private static readonly DemoPart Guest = new("_unknown-upload", "", DemoCast.Boat, 25, Sex.Male, WeekPlan.FiveRows);

    public static IEnumerable<DemoFile> All(int seed, LocalDate until)
    {
        var guest = DemoPerson.Draw(Guest, seed, until);
        var session = new PlannedSession(until.PlusDays(-UnknownBack), Guest.Week.Slots[0]);
        yield return Deliveries.Fit(guest, DemoSessions.Record(guest, session, seed));
        yield return new DemoFile("inbox/henri/settings.fit", Settings(), DemoPerson.Zone.AtStartOfDay(until.PlusDays(-DemoTimeline.Days)).ToInstant());
    }

    private static byte[] Settings() => new FitPartWriter()
        .Define(0, new FitDefinition(
            FileId,
            new FitFieldLayout(TypeField, FitBaseType.Enumeration),
            new FitFieldLayout(ManufacturerField, FitBaseType.Unsigned16),
            new FitFieldLayout(ProductField, FitBaseType.Unsigned16),
            new FitFieldLayout(SerialField, FitBaseType.Unsigned32Z)))
        .Message(0, SettingsType, FitActivity.Development, 13, 100_001)
        .ToBytes();
}
