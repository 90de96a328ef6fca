using LoadWatch.People;
using LoadWatch.Service.Configuration;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>
/// A property that is in no part of the basis must change no derived row: who adds one decides here, and in <c>BasisParts</c> where rows depend on it.
/// </summary>
public sealed class BasisPartsTests
{
    private static readonly string[] OfConfiguration = ["People", "Groups", "Anchors", "Layouts", "Computation", "Devices", "Inboxes", "LimitsOfPeople"];

    private static readonly string[] WithoutRows =
    [
        "Folder", "Hash", "Text", "DataFolder", "PagesFolder", "NoticesFolder", "Contacts", "ScanEvery", "Settle", "LargestFileBytes", "LargestCsvBytes", "Mail", "Webhook", "AllowNetworkDataFolder", "Administrators",
        "CommonLimits", // Part of those of the groups.
        "Subjects", // Of people, groups and devices.
    ];

    [Fact]
    public void EveryPropertyOfTheConfigurationIsDecidedAbout() =>
        Assert.Equal(Sorted([.. OfConfiguration, .. WithoutRows]), Properties(typeof(WorkingConfiguration)));

    [Fact]
    public void EveryPropertyOfAPersonIsInAPart() =>
        Assert.Equal(Sorted(["Id", "Name", "Group", "BirthYear", "Sex", "Zone", "DayBeginsAt", "HeartRateInvalid", "Aliases"]), Properties(typeof(Person)));

    [Fact]
    public void EveryPropertyOfAGroupIsInAPart() =>
        Assert.Equal(Sorted(["Id", "Name", "LoadQuantity", "Limits", "LoadFallbacks", "Deviation", "DayBeginsAt"]), Properties(typeof(Group)));

    [Fact]
    public void EveryPropertyOfAnAnchorIsInItsLine() =>
        Assert.Equal(Sorted(["Person", "Date", "Kind", "Value", "Source", "Exercise", "Note", "Machine", "Sport", "ShownOn"]), Properties(typeof(Anchor)));

    [Fact]
    public void OfAnInboxNamePatternAndSalvageCount() =>
        Assert.Equal(Sorted(["Name", "FilePattern", "Path", "Take", "Marker", "Salvage"]), Properties(typeof(Inbox)));

    private static IReadOnlyList<string> Properties(Type type) => Sorted(type.GetProperties().Select(property => property.Name));

    private static IReadOnlyList<string> Sorted(IEnumerable<string> names) => [.. names.Order(StringComparer.Ordinal)];
}
