using System.Text;
using LoadWatch.People;

namespace LoadWatch.Service.Tests.Configuration;

public sealed class RosterReaderTests
{
    private const string Header = "person,name,group,birth_year,sex,time_zone\n";

    [Theory]
    [InlineData("anna,Anna,sqaud,,,", """group: "sqaud" is not a group of loadwatch.json; did you mean "squad"?""")]
    [InlineData("anna,Anna,,,,", """group: "" is not a group of loadwatch.json""")]
    [InlineData("anna,Anna,squad,88,,", """birth_year: "88" is not a year from 1900 to 2100""")]
    [InlineData("anna,Anna,squad,19.5,,", """birth_year: "19.5" is not a year from 1900 to 2100""")]
    [InlineData("anna,Anna,squad,,w,", """sex: "w" is neither f nor m nor blank""")]
    [InlineData("anna,Anna,squad,,,Europe/Helsinky", """time_zone: "Europe/Helsinky" is not an IANA time zone; did you mean "Europe/Helsinki"?""")]
    [InlineData("an/na,Anna,squad,,,", """person: "an/na" may hold letters, digits, - _ and . only, 60 at most, since it names a folder""")]
    [InlineData(".anna,Anna,squad,,,", """person: ".anna" may hold letters, digits, - _ and . only, 60 at most, since it names a folder""")]
    [InlineData("Con,Anna,squad,,,", """person: "Con" cannot name a folder on Windows""")]
    [InlineData("lpt1.a,Anna,squad,,,", """person: "lpt1.a" cannot name a folder on Windows""")]
    [InlineData("anna.,Anna,squad,,,", """person: "anna." cannot name a folder on Windows""")]
    [InlineData(",Anna,squad,,,", """person: "" may hold letters, digits, - _ and . only, 60 at most, since it names a folder""")]
    [InlineData("anna,Anna,squad,,,,surplus", "7 cells for 6 columns: a cell with a separator in it stands in quotes")]
    public void AMistakeInARowIsToldWithItsLine(string row, string fault) =>
        Assert.Equal([$"roster.csv:3: {fault}"], ConfigurationFolder.FaultsWith("roster.csv", $"{Header}\n{row}\n"));

    [Theory]
    [InlineData("person,name,gruop", """roster.csv:1: "gruop" is not a column here; did you mean "group"?""", """roster.csv:1: the column "group" is missing""")]
    [InlineData("person,name,group,sex,sex", """roster.csv:1: the column "sex" stands twice""", null)]
    [InlineData("person,group", """roster.csv:1: the column "name" is missing""", null)]
    public void AMistakeInTheColumnsIsToldWithTheNearestWord(string header, string first, string? second) =>
        Assert.Equal(new[] { first, second }.OfType<string>(), ConfigurationFolder.FaultsWith("roster.csv", $"{header}\n"));

    [Fact]
    public void AliasesAndTheWordOnHeartRateAreRead()
    {
        var people = ConfigurationFolder.With(
            "roster.csv",
            "person,name,group,aliases,heart_rate_valid\nanna,Anna,squad,Ahola A.; 7 |7,no since 2026-03-01\nben,Ben,squad,,No\ncas,Cas,squad,9,yes\n").People;

        Assert.Equal(["Ahola A.", "7"], people["anna"].Aliases);
        Assert.Equal("2026-03-01", people["anna"].HeartRateInvalid.ToString());
        Assert.False(people["ben"].HeartRateIsValidOn(new NodaTime.LocalDate(1900, 1, 1)));
        Assert.Empty(people["ben"].Aliases);
        Assert.True(people["cas"].HeartRateInvalid.IsEmpty);
    }

    [Theory]
    [InlineData("no 2026-02-01 to 2026-04-30", "2026-02-01/2026-04-30")]
    [InlineData("No 2026-08-01 to 2026-08-10 ; no 2026-02-01 to 2026-04-30;no since 2026-12-01", "2026-02-01/2026-04-30 2026-08-01/2026-08-10 2026-12-01")]
    [InlineData("no 2026-02-01 to 2026-04-30; no 2026-05-01 to 2026-05-31", "2026-02-01/2026-05-31")]
    public void HeartRateMaySayNothingForSeveralTimes(string cell, string periods)
    {
        var person = ConfigurationFolder.With("roster.csv", $"person,name,group,heart_rate_valid\nanna,Anna,squad,{cell}\n").People["anna"];

        Assert.Equal(periods, person.HeartRateInvalid.ToString());
    }

    [Theory]
    [InlineData("medication")]
    [InlineData("no since March")]
    [InlineData("false")]
    [InlineData("no 2026-04-30 to 2026-02-01")]
    [InlineData("no 2026-02-01 to 2026-04-30; fever")]
    [InlineData("no 2026-02-01")]
    [InlineData(";")]
    public void AReasonIsAFaultThatDoesNotRepeatIt(string cell)
    {
        var fault = Assert.Single(ConfigurationFolder.FaultsWith("roster.csv", $"person,name,group,heart_rate_valid\nanna,Anna,squad,{cell}\n"));

        Assert.Equal("roster.csv:2: heart_rate_valid: holds yes, no, no since 2026-03-01, or no 2026-02-01 to 2026-04-30, several separated by ;, and never a reason", fault);
    }

    [Theory]
    [InlineData("7", "7", "roster.csv:3: aliases: \"7\" already means anna")]
    [InlineData("BEN", "", "roster.csv:2: aliases: \"BEN\" already means ben")]
    public void AnAliasThatMeansTwoPeopleIsAFault(string ofAnna, string ofBen, string fault) => Assert.Equal(
        [fault], ConfigurationFolder.FaultsWith("roster.csv", $"person,name,group,aliases\nanna,Anna,squad,{ofAnna}\nben,Ben,squad,{ofBen}\n"));

    [Fact]
    public void TheSamePersonInAnotherCaseIsNoSecondPerson() => Assert.Equal(
        ["roster.csv:3: \"ANNA\" stands above already"],
        ConfigurationFolder.FaultsWith("roster.csv", $"{Header}anna,Anna,squad,,,\nANNA,Anna,squad,,,\n"));

    [Fact]
    public void EveryMistakeIsToldAtOnceInTheOrderOfTheFile()
    {
        var faults = ConfigurationFolder.FaultsWith("roster.csv", $"{Header}anna,Anna,sqaud,88,,\nben,Ben,squad,,x,\n");

        Assert.Equal(["roster.csv:2: group", "roster.csv:2: birth_year", "roster.csv:3: sex"], faults.Select(fault => fault[..fault.LastIndexOf(": \"", StringComparison.Ordinal)]));
    }

    [Fact]
    public void BlankCellsAreUnknownAndABlankZoneIsTheCommonOne()
    {
        using var folder = new ConfigurationFolder();
        folder.Write("loadwatch.json", """{ "time_zone": "Europe/Stockholm" }""");
        folder.Write("roster.csv", $"{Header}anna,,squad,,,\nben,Ben,squad,1970,M,Europe/Helsinki\n");

        var people = folder.Read().People;

        Assert.Equal(("anna", null, null, "Europe/Stockholm"), (people["anna"].Name, people["anna"].BirthYear, people["anna"].Sex, people["anna"].Zone.Id));
        Assert.Equal((1970, Sex.Male, "Europe/Helsinki"), (people["ben"].BirthYear, people["ben"].Sex, people["ben"].Zone.Id));
    }

    [Theory]
    [InlineData("person;name;group\nanna;Anna;squad\n")]
    [InlineData("person\tname\tgroup\nanna\tAnna\tsquad\n")]
    [InlineData("group,person,name\r\nsquad,anna,Anna\r\n")]
    [InlineData("person,name,group\n\nanna,\"Anna\",squad\n,,\n")]
    public void AnySeparatorAndOrderOfColumnsIsTaken(string text) =>
        Assert.Equal("Anna", Assert.Single(ConfigurationFolder.With("roster.csv", text).People.Values).Name);

    [Theory]
    [InlineData("windows-1252")]
    [InlineData("utf-8")]
    [InlineData("utf-8 with mark")]
    [InlineData("utf-16 with mark")]
    public void NamesKeepTheirLetters(string encoding)
    {
        const string Text = "person,name,group\nanna,Änna Öyvä,squad\n";
        using var folder = new ConfigurationFolder();
        folder.Write("roster.csv", encoding switch
        {
            "windows-1252" => Encoding.Latin1.GetBytes(Text), // The same bytes for these letters.
            "utf-16 with mark" => [0xFF, 0xFE, .. Encoding.Unicode.GetBytes(Text)],
            "utf-8 with mark" => [0xEF, 0xBB, 0xBF, .. Encoding.UTF8.GetBytes(Text)],
            _ => Encoding.UTF8.GetBytes(Text),
        });

        Assert.Equal("Änna Öyvä", folder.Read().People["anna"].Name);
    }

    [Theory]
    [InlineData("conny")]
    [InlineData("a.con")]
    [InlineData("anna.b-2_x")]
    [InlineData("Åse")]
    public void OtherIdsAreTaken(string id) =>
        Assert.Equal(["anna", id], ConfigurationFolder.With("roster.csv", $"{Header}anna,Anna,squad,,,\n{id},Anna,squad,,,\n").People.Keys);

    [Fact]
    public void PeopleAreFoundInAnyCase() => Assert.Equal("anna", ConfigurationFolder.With("loadwatch.json", """
        { "contacts": [ { "people": ["ANNA"] } ] }
        """).People["Anna"].Id);
}
