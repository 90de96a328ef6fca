using System.Globalization;
using System.Text;
using System.Text.Json;
using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Service.Tests.Pipeline;
using LoadWatch.Storage;
using LoadWatch.Tests;
using NodaTime;

namespace LoadWatch.Service.Tests.Commands;

/// <summary>Names and reasons that mean harm, on the terminal and in JSON.</summary>
public sealed class HostileListingTests : IDisposable
{
    private readonly WorkingFolder folder = new(roster: Roster(), anchors: "person,date,anchor,value,unit,source,exercise\n");

    public HostileListingTests()
    {
        using var store = Store.Open(DataFolder.Open(folder.Data));
        store.Write(session =>
        {
            foreach (var (text, place) in HostileTexts.All.Select((text, place) => (text, place)))
            {
                var key = new FindingKey(Id(place), "silence", null);
                session.Alerts.Put(new Alert(key, new LocalDate(2026, 6, 1), new LocalDate(2026, 6, 14), AlertState.Unacknowledged, Severity.Notice, text));
            }
        });
    }

    public void Dispose() => folder.Dispose();

    [Fact]
    public void AListingOfPeopleHasOneRowForEachAndNothingThatSteersATerminal()
    {
        var output = Out("people");

        Assert.DoesNotContain(output, HostileTexts.IsRaw);
        var rows = output.Split('\n').Where(line => line.StartsWith("│ p", StringComparison.Ordinal) && char.IsAsciiDigit(line[3])).Select(line => line[2..6]);
        Assert.Equal(Enumerable.Range(0, HostileTexts.All.Count).Select(Id), rows);
    }

    [Fact]
    public void AListingOfAlertsHasThreeLinesForEach()
    {
        var output = Out("alerts");

        Assert.DoesNotContain(output, HostileTexts.IsRaw);
        var lines = output.TrimEnd('\n').Split('\n');
        Assert.Equal((3 * HostileTexts.All.Count) + 1, lines.Length);
        Assert.Equal(HostileTexts.All.Select((_, place) => $"    {Id(place)}|silence||2026-06-01"), lines.Where((_, at) => at % 3 == 2));
    }

    [Fact]
    public void JsonHoldsTheNamesAsTheyAreAndShowsNothingRaw()
    {
        var output = Out("people", "--json");

        Assert.DoesNotContain(output, HostileTexts.IsRaw);
        using var read = JsonDocument.Parse(output);
        Assert.Equal(Names(), read.RootElement.EnumerateArray().Select(line => line.GetProperty("name").GetString()));
    }

    [Fact]
    public void AnExportHasOneLineForEachAlertThatReadsAsTheReasonWas()
    {
        var output = Out("export", "alerts");

        Assert.DoesNotContain(output, HostileTexts.IsRaw);
        var texts = output.TrimEnd('\n').Split('\n').Select(line => JsonDocument.Parse(line).RootElement.GetProperty("text").GetString());
        Assert.Equal(HostileTexts.All.Select(Utf8), texts);
    }

    [Fact]
    public void TheNameOfAFileIsShownInOneLineAndSteersNothing()
    {
        Assert.SkipWhen(OperatingSystem.IsWindows(), "Windows has no such file names");
        folder.Put("a\u001b[31m\n- forged\u202E<b>{{ x }}.fit", [1, 2, 3]);
        folder.Sweep();

        var brief = Out("brief", "staff", "--as-of", WorkingFolder.NowText);
        Assert.Contains("- a [31m - forged <b>{{ x }}.fit: ", brief, StringComparison.Ordinal);
        string[] shown = [brief, Out("export", "arrivals"), Out("explain", WorkingFolder.Sha([1, 2, 3])), folder.NoticeText];
        Assert.All(shown, text => Assert.DoesNotContain(text, HostileTexts.IsRaw));
    }

    [Fact]
    public void AFaultOfTheConfigurationIsOneLine()
    {
        folder.Write("roster.csv", "person,name,group\n\"x\u001b[31m\ny\u202E\",Ann,squad\n");

        var (code, errors) = Failed("check");

        Assert.Equal(78, code);
        Assert.DoesNotContain(errors, HostileTexts.IsRaw);
        Assert.Single(errors.TrimEnd('\n').Split('\n'));
    }

    private static string Roster() => "person,name,group\n" + string.Concat(HostileTexts.All.Select((text, place) =>
        $"{Id(place)},\"{Utf8(text).Replace("\"", "\"\"", StringComparison.Ordinal)}\",squad\n"));

    private static string Id(int place) => place.ToString("'p'000", CultureInfo.InvariantCulture);

    /// <summary>As a roster keeps them: without space at the ends, and the id where nothing is left.</summary>
    private static IEnumerable<string> Names() => HostileTexts.All.Select((text, place) => Utf8(text).Trim() is { Length: > 0 } name ? name : Id(place));

    /// <summary>Half a character cannot be written to a file.</summary>
    private static string Utf8(string text) => Encoding.UTF8.GetString(Encoding.UTF8.GetBytes(text));

    private string Out(params string[] words)
    {
        var ended = Loadwatch.Run([.. words, "--config", folder.ConfigPath]);
        Assert.Equal((0, ""), (ended.Code, ended.Errors));
        return ended.Output;
    }

    private (int Code, string Errors) Failed(params string[] words)
    {
        var ended = Loadwatch.Run([.. words, "--config", folder.ConfigPath]);
        return (ended.Code, ended.Errors);
    }
}
