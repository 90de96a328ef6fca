using System.Text;
using System.Text.Json;
using LoadWatch.Notices;
using LoadWatch.Rows;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage.Rows;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>Tables in the inbox over several nights, and what came of them.</summary>
internal static class Nights
{
    /// <summary>The morning so many days before <see cref="WorkingFolder.Now"/>.</summary>
    public static Instant Before(int days) => WorkingFolder.Now - Duration.FromDays(days);

    public static LocalDate Date(int daysBeforeYesterday) => Some.Yesterday.PlusDays(-daysBeforeYesterday);

    /// <summary><c>2026-06-14</c> for 0.</summary>
    public static string Day(int daysBeforeYesterday) => LocalDatePattern.Iso.Format(Date(daysBeforeYesterday));

    /// <summary>Puts a table into the inbox an hour before the morning so many days ago; a version of one that is there, a second after that one at least.</summary>
    /// <returns>Its bytes.</returns>
    public static byte[] PutTable(this WorkingFolder folder, string path, int daysBefore, params IEnumerable<string> lines)
    {
        var bytes = Some.Text(string.Join('\n', lines) + "\n");
        var earlier = File.GetLastWriteTimeUtc(Path.Combine(folder.Inbox, path));
        var full = folder.Put(path, bytes, Duration.FromDays(daysBefore) + Duration.FromHours(1));
        if (File.GetLastWriteTimeUtc(full) <= earlier)
        {
            File.SetLastWriteTimeUtc(full, earlier.AddSeconds(1));
        }

        return bytes;
    }

    /// <summary>Replaces a text of a file of the working folder that must be there.</summary>
    public static void Edit(this WorkingFolder folder, string name, string old, string text)
    {
        var before = File.ReadAllText(Path.Combine(folder.Root, name));
        Assert.Contains(old, before, StringComparison.Ordinal);
        folder.Write(name, before.Replace(old, text, StringComparison.Ordinal));
    }

    /// <summary>Adds keys to loadwatch.json.</summary>
    public static void Configure(this WorkingFolder folder, string keys) => folder.Edit("loadwatch.json", "\"contacts\"", $"{keys}, \"contacts\"");

    /// <summary>Every row in force as text, without the moment since when it says so.</summary>
    public static IReadOnlyList<string> Rows(this WorkingFolder folder) => folder.Read((_, session) => Enum.GetValues<RowKind>()
        .SelectMany(session.TableRows.OfKind)
        .Select(row => $"{row.Kind} {row.Subject} {row.Person} {row.Date} {row.Key} {RowText.Write(row.Content)}")
        .ToList());

    /// <summary>The brief of the only contact as of a moment, in one line.</summary>
    public static string Brief(this WorkingFolder folder, Instant? now = null) => folder.Read((workplace, session) => InOneLine(
        BriefText.Write(new Briefs(workplace.Configuration, now ?? WorkingFolder.Now, [], []).Build(session, workplace.Configuration.Contacts[0]))));

    public static string InOneLine(string text) => string.Join(' ', text.Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries));

    public static int Count(string text, string part) => text.Split(part).Length - 1;

    /// <summary>What is computed, and so must not depend on how it came about.</summary>
    public static string Computed(this WorkingFolder folder) => new StringBuilder()
        .AppendJoin('\n', new[] { "activities", "days", "findings" }.Select(folder.Export))
        .ToString();

    public static IReadOnlyList<JsonElement> Activities(this WorkingFolder folder, string person) => folder.Lines("activities", person);

    public static JsonElement OnDay(this WorkingFolder folder, string person, string date) =>
        folder.Lines("days", person).Single(day => day.GetProperty("date").GetString() == date);

    public static IReadOnlyList<JsonElement> Lines(this WorkingFolder folder, string table, string person) =>
    [
        .. folder.Export(table)
            .Split('\n', StringSplitOptions.RemoveEmptyEntries)
            .Select(line => JsonDocument.Parse(line).RootElement)
            .Where(line => line.GetProperty("person").GetString() == person),
    ];

    /// <summary>The value of a quantity of an exported activity, or null.</summary>
    public static double? Value(this JsonElement activity, string quantity) => activity.GetProperty("quantities").EnumerateArray()
        .Where(one => one.GetProperty("name").GetString() == quantity)
        .Select(one => (double?)one.GetProperty("value").GetDouble())
        .FirstOrDefault();

    public static IReadOnlyList<string?> Words(this JsonElement activity, string list) =>
        [.. activity.GetProperty(list).EnumerateArray().Select(one => one.GetString())];
}
