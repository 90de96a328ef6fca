using LoadWatch.People;
using LoadWatch.Recordings;
using NodaTime;

namespace LoadWatch.Service.Tests.Configuration;

public sealed class AnchorsReaderTests
{
    private const string Header = "person,date,anchor,value,unit,source,exercise,machine,sport\n";

    [Theory]
    [InlineData("anne,,body_mass,70,kg,,", """person: "anne" is not in the roster; did you mean "anna"?""")]
    [InlineData("anna,,hart_rate_max,190,bpm,,", """anchor: "hart_rate_max" is not an anchor; did you mean "heart_rate_max"?""")]
    [InlineData("anna,31.3.2026,body_mass,70,kg,,", """date: "31.3.2026" is not a date such as 2026-03-31""")]
    [InlineData("anna,2026-02-30,body_mass,70,kg,,", """date: "2026-02-30" is not a date such as 2026-03-31""")]
    [InlineData("anna,,body_mass,70,lb,,", """unit: "lb" is not the unit of body_mass, which is kg""")]
    [InlineData("anna,,critical_power,250,w,,", """unit: "w" is not the unit of critical_power, which is W""")]
    [InlineData("anna,,body_mass,,kg,,", """value: "" is not a number with a decimal point""")]
    [InlineData("anna,,body_mass,\"70,5\",kg,,", """value: "70,5" is not a number with a decimal point""")]
    [InlineData("anna,,body_mass,NaN,kg,,", "value: NaN kg is outside 20 to 300 for body_mass")]
    [InlineData("anna,,body_mass,700,kg,,", "value: 700 kg is outside 20 to 300 for body_mass")]
    [InlineData("anna,,body_mass,-70,kg,,", """value: "-70" is not a number with a decimal point""")]
    [InlineData("anna,,body_mass,70,kg,measurd,", """source: "measurd" is not measured, observed or estimated; did you mean "measured"?""")]
    [InlineData("anna,,one_repetition_max,90,kg,,", """exercise: "" is not an exercise with a known body region""")]
    [InlineData("anna,,one_repetition_max,90,kg,,leg_pres", """exercise: "leg_pres" is not an exercise with a known body region; did you mean "leg_press"?""")]
    [InlineData("anna,,body_mass,70,kg,,squat", "exercise: only one_repetition_max has an exercise, not body_mass")]
    [InlineData("anna,,body_mass,70,kg,,,scale 2", "machine: only one_repetition_max has a machine, not body_mass")]
    [InlineData("anna,,critical_speed,4,m/s,,,,running", "sport: only critical_power, w_prime and power_max are of a sport, not critical_speed")]
    [InlineData("anna,,critical_power,250,W,,,,rowin", """sport: "rowin" is not a sport in which power is read, such as cycling or rowing; did you mean "rowing"?""")]
    [InlineData("anna,,critical_power,250,W,,,,running", """sport: "running" is not a sport in which power is read, such as cycling or rowing""")]
    public void AMistakeInARowIsToldWithItsLine(string row, string fault) =>
        Assert.Equal([$"anchors.csv:3: {fault}"], ConfigurationFolder.FaultsWith("anchors.csv", $"{Header}ben,,body_mass,70,kg,,\n{row}\n"));

    [Theory]
    [InlineData("anna,,speed_max,8,5,m/s,,")]
    [InlineData("anna,,speed_max,8,5,m/s,measured,")]
    [InlineData("anna,,speed_max,8,5,m/s")]
    public void ADecimalCommaInACommaSeparatedFileIsNotTakenForAnotherNumber(string row) =>
        Assert.StartsWith("anchors.csv:2: ", Assert.Single(ConfigurationFolder.FaultsWith("anchors.csv", $"{Header}{row}\n")), StringComparison.Ordinal);

    [Fact]
    public void ADecimalCommaInASemicolonSeparatedFileIsToldAsSuch() => Assert.Equal(
        ["anchors.csv:2: value: \"8,5\" is not a number with a decimal point"],
        ConfigurationFolder.FaultsWith("anchors.csv", "person;anchor;value;unit\nanna;speed_max;8,5;m/s\n"));

    [Theory]
    [InlineData(20)]
    [InlineData(300)]
    public void TheEndsOfARangeBelongToIt(double kilograms)
    {
        var book = ConfigurationFolder.With("anchors.csv", FormattableString.Invariant($"{Header}anna,,body_mass,{kilograms},kg,,\n")).Anchors;

        Assert.Equal(kilograms, book.On(new LocalDate(2026, 1, 1), "anna", AnchorKind.BodyMass)!.Value);
    }

    [Theory]
    [InlineData("19.9")]
    [InlineData("300.1")]
    public void BeyondThemNothingIsTaken(string kilograms) =>
        Assert.Single(ConfigurationFolder.FaultsWith("anchors.csv", $"{Header}anna,,body_mass,{kilograms},kg,,\n"));

    [Fact]
    public void ABlankDateHoldsFromTheBeginningAndABlankSourceIsMeasured()
    {
        var book = ConfigurationFolder.With("anchors.csv", $"{Header}anna,,body_mass,70,kg,,\nanna,2026-03-01,body_mass,68,kg,,\n").Anchors;

        var (before, after) = (book.On(new LocalDate(1950, 1, 1), "anna", AnchorKind.BodyMass), book.On(new LocalDate(2026, 3, 1), "anna", AnchorKind.BodyMass));
        Assert.Equal((70.0, AnchorSource.Measured), (before!.Value, before.Source));
        Assert.Equal(68, after!.Value);
    }

    [Fact]
    public void APersonWrittenInAnotherCaseIsThePersonOfTheRoster()
    {
        var book = ConfigurationFolder.With("anchors.csv", $"{Header}ANNA,,body_mass,70,kg,,\n").Anchors;

        Assert.Equal("anna", book.On(new LocalDate(2026, 1, 1), "anna", AnchorKind.BodyMass)!.Person);
    }

    [Fact]
    public void AnExerciseOfOnesOwnMayHaveAMaximum()
    {
        using var folder = new ConfigurationFolder();
        folder.Write("loadwatch.json", """{ "computation": { "exercises": { "step_up": ["legs"] } } }""");
        folder.Write("anchors.csv", $"{Header}anna,,one_repetition_max,60,kg,observed,step_up\n");

        Assert.Equal(60, folder.Read().Anchors.On(new LocalDate(2026, 1, 1), "anna", AnchorKind.OneRepetitionMax, "step_up")!.Value);
    }

    [Fact]
    public void AMaximumIsKeptByExerciseAndMachineHoweverTheyAreWritten()
    {
        var book = ConfigurationFolder.With(
            "anchors.csv", $"{Header}anna,,one_repetition_max,90,kg,,Leg Press,\nanna,,one_repetition_max,140,kg,,leg-press,Press 2\n").Anchors;

        var maxima = new[] { null, "press 2", "press 3" }.Select(machine =>
            book.On(new LocalDate(2026, 1, 1), "anna", AnchorKind.OneRepetitionMax, "leg_press", machine)!.Value);
        Assert.Equal([90, 140, 90], maxima);
    }

    [Fact]
    public void ATableWithoutTheColumnOfMachinesIsReadAsBefore() => Assert.Equal(
        90,
        ConfigurationFolder.With("anchors.csv", "person,anchor,value,unit,exercise\nanna,one_repetition_max,90,kg,squat\n").Anchors
            .On(new LocalDate(2026, 1, 1), "anna", AnchorKind.OneRepetitionMax, "squat")!.Value);

    [Fact]
    public void ACapacityMayBeOfOneSport()
    {
        var book = ConfigurationFolder.With("anchors.csv", $"{Header}anna,,critical_power,250,W,,,,\nanna,,critical_power,210,W,,,,Rowing\n").Anchors;

        Assert.Equal(210, book.On(new LocalDate(2026, 1, 1), "anna", AnchorKind.CriticalPower, new Sport("rowing"))!.Value);
        Assert.Equal(250, book.On(new LocalDate(2026, 1, 1), "anna", AnchorKind.CriticalPower, new Sport("cycling"))!.Value);
    }
}
