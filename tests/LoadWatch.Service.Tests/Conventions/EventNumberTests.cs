using LoadWatch.Service.Health;
using Microsoft.Extensions.Logging;

namespace LoadWatch.Service.Tests.Conventions;

/// <summary>Event numbers are a contract with whoever watches the log: a change of them shows here as a difference to read.</summary>
public sealed class EventNumberTests
{
    private static readonly IReadOnlyList<(string, LoggerMessageAttribute)> Catalogue = Convention.Events(typeof(LogMessages));

    [Fact]
    public void ThereAreEvents() => Assert.NotEmpty(Catalogue);

    [Fact]
    public void EventNumbersAreUniqueAndInTheirRangesAndNamedAsTheirMethods() => Assert.Empty(Convention.EventFaults(Catalogue));

    [Fact]
    public void TheEventsAreTheAcceptedOnes()
    {
        var accepted = Path.Combine(Configuration.Repository.Root, "tests", "LoadWatch.Service.Tests", "Conventions", "accepted-events.txt");

        Assert.Equal(File.ReadAllText(accepted), Convention.EventList(Catalogue), ignoreLineEndingDifferences: true);
    }

    [Fact]
    public void TheCheckFindsWhatIsWrong()
    {
        var faults = Convention.EventFaults([Event("First", 4001), Event("Again", 4001), Event("Outside", 6001), Event("Misnamed", 1002, "Other")]);

        Assert.Equal(["4001 stands twice", "6001 is in no range", "1002 is not named Misnamed"], faults);
    }

    private static (string, LoggerMessageAttribute) Event(string method, int number, string? name = null) =>
        (method, new LoggerMessageAttribute { EventId = number, EventName = name ?? method, Level = LogLevel.Information, Message = "Something happened" });
}
