using LoadWatch.Anchors;
using LoadWatch.People;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using LoadWatch.Service.Commands;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>What bringing the days up to date costs, in rows read: it grows with what is new, not with the history.</summary>
public sealed class DayCostTests
{
    private const int MostRows = 1000;

    private static readonly LocalDate Last = new(2026, 6, 13);

    [Fact]
    public void OneNewSessionReadsTheSameAfterTwoAndAfterTenYears()
    {
        var (one, two, ten) = (RowsOfOneNewSession(1), RowsOfOneNewSession(2), RowsOfOneNewSession(10));

        Assert.InRange(one, 1, MostRows);
        Assert.InRange(ten, 1, MostRows);
        Assert.Equal(two, ten);
        Assert.True(ten <= one * 1.15, $"{one} rows after a year, {ten} after ten");
    }

    /// <summary>The days and histograms of the look-back before the change, and nothing that grows.</summary>
    [Theory]
    [InlineData(20, 910)]
    [InlineData(300, 1470)]
    public void AfterAChangedReferenceValueItReadsTheSessionsOfItsLookBackToo(int daysAgo, int most)
    {
        var (two, four) = (RowsAfterAChange(2, daysAgo), RowsAfterAChange(4, daysAgo));

        Assert.InRange(two, 1, most);
        Assert.Equal(two, four);
    }

    [Fact]
    public void LongAfterAChangeItIsForgotten() => Assert.InRange(RowsAfterAChange(3, daysAgo: 440), 1, MostRows);

    [Fact]
    public void WhoIsNotBehindCostsNothing()
    {
        using var folder = new WorkingFolder();
        using var workplace = Workplace.OpenToWork(folder.ConfigPath);
        Fill(workplace, days: 30, everyDay: false);
        StoredTraining.Update(workplace.Configuration, workplace.Store, Last);

        Assert.Equal(0, StoredTraining.Update(workplace.Configuration, workplace.Store, Last));
    }

    /// <summary>With a rating, sets, attendance and a planned session of every day beside the recordings, and a maximal power from own sessions month by month.</summary>
    private static long RowsOfOneNewSession(int years)
    {
        using var folder = new WorkingFolder();
        using var workplace = Workplace.OpenToWork(folder.ConfigPath);
        Fill(workplace, years * 365, everyDay: true);
        workplace.Store.Write(session => session.ObservedAnchors.Replace("anna", LocalDate.MinIsoValue, [.. Enumerable.Range(0, years * 12).Select(Power)]));
        StoredTraining.Update(workplace.Configuration, workplace.Store, Last);
        workplace.Store.Write(session => StoredTraining.Put(session, "anna", Last, 90));
        return StoredTraining.Update(workplace.Configuration, workplace.Store, Last);
    }

    private static long RowsAfterAChange(int years, int daysAgo)
    {
        var anchors = $"{WorkingFolder.Anchors.TrimEnd()}\nanna,{Last.PlusDays(-daysAgo):uuuu-MM-dd},heart_rate_max,176,bpm,,\n";
        using var folder = new WorkingFolder(anchors: anchors);
        using var workplace = Workplace.OpenToWork(folder.ConfigPath);
        var (person, book) = (workplace.Configuration.People["anna"], workplace.Configuration.Anchors);
        workplace.Store.Write(session =>
        {
            foreach (var date in Enumerable.Range(1, years * 365).Select(day => Last.PlusDays(-day)))
            {
                StoredTraining.Put(session, person, book, date, 40 + date.Day);
            }
        });
        StoredTraining.Update(workplace.Configuration, workplace.Store, Last);
        workplace.Store.Write(session => StoredTraining.Put(session, person, book, Last, 90));
        return StoredTraining.Update(workplace.Configuration, workplace.Store, Last);
    }

    private static void Fill(Workplace workplace, int days, bool everyDay) => workplace.Store.Write(session =>
    {
        foreach (var date in Enumerable.Range(1, days).Select(day => Last.PlusDays(-day)))
        {
            StoredTraining.Put(session, "anna", date, 60 + date.Day);
            if (everyDay)
            {
                StoredTraining.Put(session, "anna", RowKind.Sessions, date, new SessionRow(null, null, null, null, 60, 5, [], null));
                StoredTraining.Put(session, "anna", RowKind.Plan, date, new PlanRow(PlanWord.TeamSession, null, null, null, true, null));
                StoredTraining.Put(session, "anna", RowKind.Days, date, new DayRow(DayWord.Attended));
                StoredTraining.Put(session, "anna", RowKind.Sets, date, Set(1), "inbox/sets.csv");
                StoredTraining.Put(session, "anna", RowKind.Sets, date, Set(2), "inbox/more sets.csv");
            }
        }
    });

    private static ObservedAnchor Power(int monthsAgo)
    {
        var month = new LocalDate(2026, 6, 1).PlusMonths(-monthsAgo);
        return new ObservedAnchor("anna", AnchorKind.PowerMax, month, 900, 45, month.PlusDays(-1), "one second") { Sport = "cycling" };
    }

    private static SetRow Set(int number) => new(1, null, "leg press", null, number, 10, 100, null, 2, null, null, SetLoad.Weight, false, false);
}
