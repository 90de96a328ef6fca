using LoadWatch.Findings;
using LoadWatch.Loads;
using LoadWatch.People;
using LoadWatch.Rows;
using LoadWatch.Storage;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>A person's function tests, each with the body that it was done with where that tells more of it.</summary>
internal static class TestRows
{
    /// <summary>Of some dates, both ends included, as the store has them.</summary>
    public static IReadOnlyList<DatedTest> Of(StoreSession session, TableBasis basis, Person person, LocalDate from, LocalDate to)
    {
        var anchors = new Lazy<AnchorBook>(() => basis.AnchorsOf(person, from));
        return
        [
            .. session.TableRows.OfPerson(person.Id, RowKind.Tests, from, to).Select(row => new DatedTest(row.Date, (TestRow)row.Content)
            {
                Body = SitToStandPower.IsOf((TestRow)row.Content) ? BodySize.On(anchors.Value, row.Date, person.Id) : BodySize.Unknown,
            }),
        ];
    }
}
