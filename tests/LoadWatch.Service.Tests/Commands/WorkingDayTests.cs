using System.Text.Json;
using LoadWatch.Service.Tests.Pipeline;

namespace LoadWatch.Service.Tests.Commands;

/// <summary>The commands as a user gives them one after the other.</summary>
public sealed class WorkingDayTests : IDisposable
{
    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void AFreshFolderCanBeSweptAtOnce()
    {
        var fresh = Path.Combine(folder.Root, "fresh");
        var config = Path.Combine(fresh, "loadwatch.json");
        var made = Loadwatch.Run("init", "--dir", fresh);
        Assert.Equal((0, ""), (made.Code, made.Errors));
        Assert.Contains($"sweep --config {config}", made.Output, StringComparison.Ordinal);
        var swept = Loadwatch.Run("sweep", "--config", config);
        Assert.Equal((0, ""), (swept.Code, swept.Errors));
        Assert.StartsWith("0 files in the inboxes", swept.Output, StringComparison.Ordinal);
        Assert.True(File.Exists(Path.Combine(fresh, "pages", "staff.html")));
        var again = Loadwatch.Run("init", "--dir", fresh);
        Assert.Equal(0, again.Code);
        Assert.Contains("nothing is missing", again.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void WhatWasTakenInIsListedAndExplained()
    {
        folder.Fill(Some.Fortnight());

        folder.Sweep();
        var people = Json("people", "--json");
        Assert.Equal(["anna", "bo", "cara"], people.Select(line => line.GetProperty("person").GetString()));
        Assert.Equal(["2026-06-10", "2026-06-12", "2026-06-12"], people.Select(line => line.GetProperty("last_recorded").GetString()));
        var table = Out("people");
        Assert.All(["Anna Ahola", "Bo Björk", "Cara Costa", "2026-06-10"], cell => Assert.Contains(cell, table, StringComparison.Ordinal));
        var id = JsonDocument.Parse(Out("alerts", "--json")).RootElement.GetProperty("id").GetString()!;
        Assert.All(["Anna Ahola", id], cell => Assert.Contains(cell, Out("alerts"), StringComparison.Ordinal));
        Assert.Contains("No recording for 4 days", Out("explain", id), StringComparison.Ordinal);
        Assert.Contains("2026-06-10", Out("explain", "anna", "--date", "2026-06-10"), StringComparison.Ordinal);
        Assert.Contains("refused: byte", Out("explain", "anna/cut.fit"), StringComparison.Ordinal);
        Assert.Contains("owner unknown", Out("explain", WorkingFolder.Sha(Some.Fortnight().Single(file => file.Path == "nobody.fit").Bytes)[..12]), StringComparison.Ordinal);
        Assert.Contains("Anna Ahola", Out("brief", "staff", "--as-of", WorkingFolder.NowText), StringComparison.Ordinal);

        // A sweep in the test's own process leaves no status file: nothing is known of a service, but the database answers.
        var status = Loadwatch.Run("status", "--config", folder.ConfigPath);
        Assert.Equal((3, ""), (status.Code, status.Errors));
        Assert.Contains("1 held, 2 refused", status.Output, StringComparison.Ordinal);
        Assert.Equal(64, Loadwatch.Run("explain", "nobody at all", "--config", folder.ConfigPath).Code);
    }

    [Fact]
    public void TheRebuildCommandEndsWithTheSameActivities()
    {
        folder.Fill(Some.LastNight());

        folder.Sweep();
        var before = folder.Export("activities") + folder.Export("arrivals");
        Assert.StartsWith("Rebuilt: ", Out("rebuild"), StringComparison.Ordinal);
        Assert.Equal(before, folder.Export("activities") + folder.Export("arrivals"));
    }

    private List<JsonElement> Json(params string[] words) => [.. JsonDocument.Parse(Out(words)).RootElement.EnumerateArray()];

    private string Out(params string[] words)
    {
        var ended = Loadwatch.Run([.. words, "--config", folder.ConfigPath]);
        Assert.True(ended is { Code: 0, Errors: "" }, $"{string.Join(' ', words)}: {ended}");
        return ended.Output;
    }
}
