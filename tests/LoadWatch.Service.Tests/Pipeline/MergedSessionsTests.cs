using System.Text.RegularExpressions;
using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;
using LoadWatch.Service.Explain;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>I-9 through real sweeps: what several devices recorded of one session counts once, and everybody can see why.</summary>
public sealed class MergedSessionsTests : IDisposable
{
    private static readonly byte[] Bike = Device(1, 0, 40, power: 200, heartRate: 140);
    private static readonly byte[] Watch = Device(2, 0, 120, heartRate: 140);

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Theory]
    [InlineData("together")]
    [InlineData("bike", "watch")]
    [InlineData("watch", "bike")]
    public void ABikeComputerThatDiedGoesOnByTheWatchInWhateverOrderTheyCome(params string[] nights)
    {
        foreach (var night in nights)
        {
            Put(night is "bike" or "together", "anna/bike.fit", Bike);
            Put(night is "watch" or "together", "anna/watch.fit", Watch);
            folder.Sweep();
        }

        var activity = Assert.Single(folder.Activities("anna"));
        Assert.Equal((7200, 120, 40 * 60 * 200 / 1000.0), (activity.GetProperty("elapsed_s").GetDouble(), activity.Value("minutes"), activity.Value("work")));
        Assert.Equal(["wins", "gives"], activity.GetProperty("recordings").EnumerateArray().OrderBy(one => one.GetProperty("file").GetString(), StringComparer.Ordinal).Select(one => one.GetProperty("role").GetString()));
        Assert.Contains("power in 40 of 120 min: what is computed from it is of those", activity.Words("remarks"));
        Assert.Contains(": wins, gives heart rate until 40 min, power\n", Explained("anna/bike.fit"), StringComparison.Ordinal);
        Assert.Contains($"part 1 in the session {Nights.Day(0)}T12:00:00Z of anna: gives heart rate after 40 min\n", Explained("anna/watch.fit"), StringComparison.Ordinal);
        Assert.Contains($"recording 1 of anna/watch.fit ({WorkingFolder.Sha(Watch)[..12]}): gives heart rate after 40 min", ExplainedDay(), StringComparison.Ordinal);
        AssertSettled();
    }

    [Fact]
    public void ACopyWithOtherBytesIsSupersededVisibly()
    {
        folder.Put("anna/a.fit", Device(1, 0, 60, power: 200));
        folder.Put("anna/b.fit", Device(1, 0, 30, power: 200));
        folder.Sweep();

        Assert.Contains(": wins, all of it counts\n", Explained("anna/a.fit"), StringComparison.Ordinal);
        Assert.Matches(@": superseded by anna/a\.fit \([0-9a-f]{12}\): they overlap 30 of 30 min\n", Explained("anna/b.fit"));
        AssertSettled();
    }

    /// <summary>Its winner is not read again: that its original is gone makes no difference.</summary>
    [Fact]
    public void ALaterCopyLeavesTheValuesAlone()
    {
        folder.Put("anna/bike.fit", Bike);
        folder.Put("anna/watch.fit", Watch);
        folder.Sweep();
        var before = folder.Activities("anna")[0].GetProperty("quantities").GetRawText();
        foreach (var path in WorkingFolder.Files(Path.Combine(folder.Data, "archive")))
        {
            File.Delete(path);
        }

        folder.Put("anna/copy.fit", Device(4, 10, 30, heartRate: 139));
        folder.Sweep();

        var activity = Assert.Single(folder.Activities("anna"));
        Assert.Equal(before, activity.GetProperty("quantities").GetRawText());
        Assert.Equal(["gives", "superseded", "wins"], activity.GetProperty("recordings").EnumerateArray().Select(one => one.GetProperty("role").GetString()).Order(StringComparer.Ordinal));
        Assert.Contains("superseded by anna/bike.fit", Explained("anna/copy.fit"), StringComparison.Ordinal);
    }

    /// <summary>Both have merged sessions, before and after.</summary>
    [Fact]
    public void ReassigningIsAsIfTheFileHadComeToTheRightPersonAtOnce()
    {
        using var right = new WorkingFolder();
        (string, byte[])[] common = [("anna/bike.fit", Bike), ("bo/bike.fit", Device(1, 5, 45, power: 210, heartRate: 130)), ("bo/strap.fit", Device(3, 0, 100, heartRate: 131))];
        right.Fill([.. common, ("anna/watch.fit", Watch)]);
        right.Sweep();
        folder.Fill([.. common, ("bo/watch.fit", Watch)]);
        folder.Sweep();
        Assert.NotEqual(WithoutFiles(right), WithoutFiles(folder));

        folder.Assign(Watch, "anna");
        folder.Sweep();

        Assert.Equal(WithoutFiles(right), WithoutFiles(folder));
        Assert.Equal(7200, Assert.Single(folder.Activities("anna")).GetProperty("elapsed_s").GetDouble());
        AssertSettled();

        folder.Assign(Watch, "bo", WorkingFolder.Now + Duration.FromMinutes(1));
        folder.Sweep(WorkingFolder.Now + Duration.FromMinutes(1));
        Assert.Equal(2400, Assert.Single(folder.Activities("anna")).GetProperty("elapsed_s").GetDouble());
        Assert.Single(folder.Activities("bo"));
        AssertSettled();
    }

    [Fact]
    public void ACorrectedFileReplacesARicherOneUntilThatOneIsBack()
    {
        var corrected = Device(1, 0, 40, heartRate: 120);
        folder.Put("anna/ride.fit", Bike);
        folder.Sweep();
        folder.Put("anna/ride.fit", corrected, Duration.FromMinutes(30));
        folder.Sweep();

        Assert.Null(Assert.Single(folder.Activities("anna")).Value("work"));
        Assert.Contains("seen as anna/ride.fit in inbox, where other bytes are by now\n", Explained(WorkingFolder.Sha(Bike)[..12]), StringComparison.Ordinal);
        Assert.Contains($": replaced under its name by anna/ride.fit ({WorkingFolder.Sha(corrected)[..12]})\n", Explained(WorkingFolder.Sha(Bike)[..12]), StringComparison.Ordinal);
        AssertSettled();

        folder.Put("anna/ride.fit", Bike, Duration.FromMinutes(20));
        folder.Sweep(WorkingFolder.Now + Duration.FromMinutes(1));

        Assert.Equal(480, Assert.Single(folder.Activities("anna")).Value("work"));
        Assert.Contains(": replaced under its name by anna/ride.fit", Explained(WorkingFolder.Sha(corrected)[..12]), StringComparison.Ordinal);
        AssertSettled();
    }

    [Fact]
    public void ACopyUnderAnotherNameStillCountsWhenOneNameIsCorrected()
    {
        folder.Put("anna/ride.fit", Bike);
        folder.Put("anna/kept.fit", Bike);
        folder.Sweep();
        folder.Put("anna/ride.fit", Device(1, 0, 40, heartRate: 120), Duration.FromMinutes(30));
        folder.Sweep();

        Assert.Equal(480, Assert.Single(folder.Activities("anna")).Value("work"));
        AssertSettled();
    }

    [Fact]
    public void ABrokenFileUnderItsNameTakesNothingAway()
    {
        folder.Put("anna/bike.fit", Bike);
        folder.Put("anna/watch.fit", Watch);
        folder.Sweep();
        var before = folder.Export("activities");
        folder.Put("anna/bike.fit", Device(1, 0, 30, power: 100)[..^9], Duration.FromMinutes(61));
        folder.Sweep();

        Assert.Equal(2, folder.Arrivals().Count(arrival => arrival.State == ArrivalState.Stored));
        Assert.Equal(before, folder.Export("activities"));
        AssertSettled();
    }

    [Fact]
    public void AnExporterThatAlwaysWritesOneNameLosesNoDay()
    {
        for (var daysAgo = 2; daysAgo >= 0; daysAgo--)
        {
            folder.Put("anna/latest.fit", Some.Fit(Nights.Date(daysAgo)), Duration.FromDays(daysAgo) + Duration.FromHours(1));
            folder.Sweep(Nights.Before(daysAgo));
        }

        Assert.Equal([Nights.Day(2), Nights.Day(1), Nights.Day(0)], folder.Activities("anna").Select(activity => activity.GetProperty("date").GetString()));
        AssertSettled();
    }

    [Fact]
    public void ADamagedOriginalOfOneDeviceStopsNothing()
    {
        folder.Put("anna/bike.fit", Bike);
        folder.Put("anna/watch.fit", Watch);
        folder.Sweep();
        var original = WorkingFolder.Files(Path.Combine(folder.Data, "archive")).Single(path => Path.GetFileName(path) == WorkingFolder.Sha(Watch));
        File.WriteAllBytes(original, new byte[Watch.Length]);
        folder.Put("anna/strap.fit", Device(3, 0, 60, heartRate: 141));
        folder.Put("bo/ride.fit", Some.Fit(Some.Yesterday));
        folder.Sweep();

        var activity = Assert.Single(folder.Activities("anna"));
        Assert.Contains($"computed without session 1 of {WorkingFolder.Sha(Watch)[..12]}: its original in the archive is missing or damaged", activity.Words("remarks"));
        Assert.Equal(3600, activity.GetProperty("elapsed_s").GetDouble());
        Assert.Contains(": gives nothing: its original in the archive is missing or damaged\n", Explained("anna/watch.fit"), StringComparison.Ordinal);
        Assert.Single(folder.Activities("bo"));
    }

    [Fact]
    public void ASessionOfTheDayBeforeIsNotTouched()
    {
        folder.Put("anna/before.fit", Device(1, -24 * 60, -23 * 60, power: 200));
        folder.Put("anna/bike.fit", Bike);
        folder.Sweep();
        var stored = Kept(Nights.Day(1));
        folder.Put("anna/watch.fit", Watch);

        var report = folder.Sweep();

        Assert.Equal(stored, Kept(Nights.Day(1)));
        Assert.Equal(1, report.PeopleComputed);
    }

    [Fact]
    public void ARatingJoinsTheMergedSession()
    {
        folder.Put("anna/bike.fit", Bike);
        folder.Put("anna/watch.fit", Watch);
        folder.PutTable("sessions.csv", 0, "date,person,session,start,sport,minutes,rating", $"{Nights.Day(0)},anna,1,13:30,cycling,,5");
        folder.Sweep();

        // 13:30 lies in the part that only the watch recorded; 5 x 120 min.
        var activity = Assert.Single(folder.Activities("anna"));
        Assert.Equal((5.0, 600.0), (activity.Value("rating"), activity.Value("foster_load")));
    }

    /// <summary>A reading every 10 s, minutes after noon of yesterday.</summary>
    private static byte[] Device(int product, int from, int to, int? power = null, int? heartRate = null)
    {
        var start = (Some.Yesterday + new LocalTime(12, 0)).InUtc().ToInstant() + Duration.FromMinutes(from);
        return FitEncoder.Encode(new FitActivity
        {
            Start = start,
            Sport = new Sport("cycling"),
            Device = new Device(FitActivity.Development, product, 4711),
            Samples = [.. Enumerable.Range(0, ((to - from) * 6) + 1).Select(row => new FitSample(start + Duration.FromSeconds(row * 10), HeartRate: heartRate, Power: power))],
        });
    }

    private void Put(bool isNow, string path, byte[] bytes)
    {
        if (isNow)
        {
            folder.Put(path, bytes);
        }
    }

    private string Explained(string word) => folder.Read((_, session) => FileExplanation.Of(session, word))!.ReplaceLineEndings("\n");

    private string ExplainedDay() => folder.Read((workplace, session) => DayExplanation.Of(workplace.Configuration, session, "anna", Some.Yesterday))!;

    private string Kept(string date) => folder.Activities("anna").Single(activity => activity.GetProperty("date").GetString() == date).GetRawText();

    private static string WithoutFiles(WorkingFolder folder) => Regex.Replace(
        folder.Export("activities") + folder.Export("days"), "\"file\":\"[^\"]*\"", "", RegexOptions.None, TimeSpan.FromSeconds(5));

    /// <summary>Another sweep changes nothing, and neither does computing everything anew.</summary>
    private void AssertSettled()
    {
        var before = folder.Export("activities") + folder.Export("days");
        Assert.Equal(0, folder.Sweep(WorkingFolder.Now + Duration.FromMinutes(2)).PeopleComputed);
        folder.Rebuild(WorkingFolder.Now + Duration.FromMinutes(2));
        Assert.Equal(before, folder.Export("activities") + folder.Export("days"));
    }
}
