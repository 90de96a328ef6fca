using LoadWatch.Notices;
using LoadWatch.People;
using LoadWatch.Service.Commands;
using LoadWatch.Service.Pipeline;
using NodaTime;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>What a brief costs, in rows read: some days of each person, however long the history, and once for all contacts.</summary>
public sealed class BriefCostTests
{
    private static readonly LocalDate Last = new(2026, 6, 13);

    [Fact]
    public void ABriefReadsTheSameAfterOneAndAfterFourYears()
    {
        var (one, four) = (RowsOfABrief(1), RowsOfABrief(4));

        Assert.Equal(one, four);
        Assert.InRange(one, BriefDays.Usual, (3 * BriefDays.OfPicture) + 50);
    }

    [Fact]
    public void ASecondContactCostsNoFurtherDays()
    {
        using var folder = Filled(1, out var workplace);
        using (workplace)
        {
            var coach = workplace.Configuration.Contacts[0];
            var clinician = coach with { Id = "other", Role = ContactRole.Clinician };
            var (one, two) = (Rows(workplace, coach), Rows(workplace, coach, clinician));

            Assert.InRange(two, one, one + (one / 4));
        }
    }

    private static long RowsOfABrief(int years)
    {
        using var folder = Filled(years, out var workplace);
        using (workplace)
        {
            return Rows(workplace, workplace.Configuration.Contacts[0]);
        }
    }

    private static WorkingFolder Filled(int years, out Workplace workplace)
    {
        var folder = new WorkingFolder();
        workplace = Workplace.OpenToWork(folder.ConfigPath);
        workplace.Store.Write(session =>
        {
            foreach (var back in Enumerable.Range(0, years * 365))
            {
                StoredTraining.Put(session, "anna", Last.PlusDays(-back), 60 + (back % 30));
            }
        });
        StoredTraining.Update(workplace.Configuration, workplace.Store, Last);
        return folder;
    }

    private static long Rows(Workplace workplace, params Contact[] contacts)
    {
        var briefs = new Briefs(workplace.Configuration, Last.PlusDays(1).AtMidnight().PlusHours(7).InUtc().ToInstant(), [], []);
        var before = workplace.Store.RowsRead;
        _ = workplace.Store.Read(session =>
        {
            var people = briefs.People(session);
            return contacts.Select(contact => briefs.Build(session, people, contact)).ToList();
        });
        return workplace.Store.RowsRead - before;
    }
}
