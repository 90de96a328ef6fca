using NodaTime;

namespace LoadWatch.Service.Tests.Configuration;

public sealed class DevicesReaderTests
{
    private const string Header = "serial,person,from,to,session\n";

    [Theory]
    [InlineData("4711,ana,,,", """person: "ana" is not in the roster; did you mean "anna"?""")]
    [InlineData(",anna,,,", "serial: is blank")]
    [InlineData("4711,anna,1.3.2026,,", """from: "1.3.2026" is not a date such as 2026-03-31""")]
    [InlineData("4711,anna,2026-03-02,2026-03-01,", "to: lies before from")]
    [InlineData("4711,anna,,,first", """session: "first" is not the number of a session of the date, 1 to 20""")]
    public void AMistakeInARowIsToldWithItsLine(string row, string fault) =>
        Assert.Equal([$"devices.csv:2: {fault}"], ConfigurationFolder.FaultsWith("devices.csv", $"{Header}{row}\n"));

    [Fact]
    public void OneDeviceHandedOutTwiceIsAFaultThatNamesBothLines() => Assert.Equal(
        ["devices.csv:4: serial: \"4711\" is handed out at the same time in line 2"],
        ConfigurationFolder.FaultsWith("devices.csv", $"{Header}4711,anna,,2026-03-05,\n4711,ben,2026-03-06,,\n4711,ben,2026-03-05,2026-03-05,1\n"));

    [Fact]
    public void TheFileMayBeMissingUnderItsUsualName()
    {
        using var folder = new ConfigurationFolder();
        var without = folder.Read();
        Assert.Null(without.Devices.On("4711", new LocalDate(2026, 3, 2), null));

        folder.Write("devices.csv", $"{Header}4711,ANNA,,,\n");

        var with = folder.Read();
        Assert.Equal("anna", with.Devices.On("4711", new LocalDate(2026, 3, 2), null));
        Assert.NotEqual(without.Hash, with.Hash);
        Assert.Contains("4711,ANNA", with.Text, StringComparison.Ordinal);
    }

    [Fact]
    public void AnotherNameWasWrittenOnPurpose() =>
        Assert.StartsWith("pods.csv: cannot be read", Assert.Single(ConfigurationFolder.FaultsWith("loadwatch.json", """{ "devices": "pods.csv" }""")), StringComparison.Ordinal);

    [Theory]
    [InlineData("anna_*")]
    [InlineData("{person}{person}")]
    [InlineData("team/{person}_*")]
    public void AFilePatternHoldsThePersonOnceAndNoFolder(string pattern) => Assert.Equal(
        [$"loadwatch.json:1: inboxes[0].file_pattern: \"{pattern}\" must hold {{person}} once and no folder"],
        ConfigurationFolder.FaultsWith("loadwatch.json", $$"""{ "inboxes": [{ "file_pattern": "{{pattern}}" }] }"""));
}
