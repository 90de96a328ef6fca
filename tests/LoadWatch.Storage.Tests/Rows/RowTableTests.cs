using LoadWatch.Loads;
using LoadWatch.Plans;
using LoadWatch.Recordings;
using LoadWatch.Rows;
using LoadWatch.Storage.Files;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Storage.Tests.Rows;

public sealed class RowTableTests(SharedFolder shared) : StoreTest(shared)
{
    private static readonly LocalDate Date = new(2026, 3, 2);

    public static TheoryData<RowKind, RowContent> Contents => new()
    {
        { RowKind.Sessions, new SessionRow(2, new LocalTime(17, 30), "soccer", "rondo", 12.5, 7, [new Quantity("distance", 812.5, "m", false)], DeclaredContent.Match) },
        { RowKind.Sets, new SetRow(1, null, "leg press", "B2", 3, 10, null, 7, null, 8.5, null, SetLoad.Pin, false, true) },
        { RowKind.Tests, new TestRow("grip_strength", null, null, null, null, TestOutcome.Unable, "left", "old one", 0.43) },
        { RowKind.Days, new LoadWatch.Rows.DayRow(DayWord.Absent) },
        { RowKind.Plan, new PlanRow(PlanWord.LightWeek, Date.PlusDays(6), null, new LocalTime(0, 30), true, null) },
        { RowKind.Answers, new AnswerRow(AnswerWord.BelongsTo, null, null, "pods/7.fit", "Ida", "swapped \"pods\"") },
    };

    [Theory]
    [MemberData(nameof(Contents))]
    public void EveryKindComesBackAsItWasWritten(RowKind kind, RowContent content)
    {
        Store.Write(session => session.TableRows.Put([Row("t", "anna", kind, content, 0)]));

        var read = Assert.Single(Store.Read(session => session.TableRows.OfPerson("anna", kind)));
        Assert.Equal(content.GetType(), read.Content.GetType());
        Assert.Equal(RowText.Write(content), RowText.Write(read.Content));
    }

    [Fact]
    public void OfTwoTablesThatTellTheSameRowTheOneSeenLaterCounts()
    {
        Store.Write(session => session.TableRows.Put([Rating("form", 7, 2), Rating("sheet", 4, 1)]));

        Assert.Equal(7, ((SessionRow)Assert.Single(Store.Read(session => session.TableRows.OfPerson("anna", RowKind.Sessions))).Content).Rating);
        Assert.Equal(2, Store.Read(session => session.TableRows.OfScope("form").Count + session.TableRows.OfScope("sheet").Count));
    }

    [Fact]
    public void RowsOfNobodyAreFoundAndPlansOfGroupsAreNoneOfThem()
    {
        Store.Write(session => session.TableRows.Put([
            Rating("form", 7, 0) with { Person = null, Subject = "Pod 7" },
            Row("plan", "", RowKind.Plan, new PlanRow(PlanWord.Rest, null, null, null, false, null), 0) with { Person = null, Subject = "squad" },
        ]));

        Assert.Equal("Pod 7", Assert.Single(Store.Read(session => session.TableRows.OfNobody())).Subject);
    }

    [Fact]
    public void ReferenceValuesStandUntilTheNextOneAndFunctionTestsDoNot()
    {
        Store.Write(session => session.TableRows.Put([
            Row("t", "anna", RowKind.Tests, new TestRow("heart_rate_max", 188, null, null, null, null, null, null, null), 0),
            Row("u", "anna", RowKind.Tests, new TestRow("gait_speed", 1.1, null, null, null, null, null, null, null), 0) with { Key = "gait", Date = Date.PlusDays(9) },
        ]));

        Assert.Equal(["heart_rate_max"], Store.Read(session => session.TableRows.StandingOf("anna", RowKind.Tests)).Select(row => ((TestRow)row.Content).Test));
        Assert.Equal(["gait_speed"], Store.Read(session => session.TableRows.OfPerson("anna", RowKind.Tests, Date.PlusDays(9), Date.PlusDays(9))).Select(row => ((TestRow)row.Content).Test));
    }

    [Fact]
    public void ARemovedRowIsGone()
    {
        Store.Write(session =>
        {
            session.TableRows.Put([Rating("form", 7, 0)]);
            session.TableRows.Remove([Rating("form", 3, 5)]);
        });

        Assert.Empty(Store.Read(session => session.TableRows.OfScope("form")));
    }

    [Fact]
    public void VersionsAreTheNamesOfTableContentsInTheOrderTheyWereSeen()
    {
        See("form/ratings.csv", Some.Sha(1), night: 0);
        See("form/ratings.csv", Some.Sha(2), night: 1);
        See("form/ratings.csv", Some.Sha(1), night: 2);

        Assert.Equal([Some.Sha(2), Some.Sha(1)], Store.Read(session => session.TableVersions.Seen("inbox/form/ratings.csv")).Select(version => version.Sha));
        Assert.Empty(Store.Read(session => session.TableVersions.Seen("inbox/form/")));
    }

    [Fact]
    public void ATableIsChangedUntilTheRowsOfItsVersionsAreIn()
    {
        See("ratings.csv", Some.Sha(1), night: 0);
        See("squad/form/monday.csv", Some.Sha(2), night: 0, namedByFolder: true);
        See("squad/form/tuesday.csv", Some.Sha(3), night: 1, namedByFolder: true);
        See("top.csv", Some.Sha(4), night: 0, namedByFolder: true);
        string[] tables = ["inbox/ratings.csv", "inbox/squad/form/|ratings", "inbox/|ratings"];
        Assert.Equal(tables.Order(StringComparer.Ordinal), Changed());
        Assert.Equal([Some.Sha(2), Some.Sha(3)], Store.Read(session => session.TableVersions.Seen(tables[1])).Select(version => version.Sha));

        foreach (var table in tables)
        {
            Apply(table);
        }

        Assert.Empty(Changed());
        See("ratings.csv", Some.Sha(5), night: 2);
        Assert.Equal([tables[0]], Changed());
        Apply(tables[0]);
        Store.Write(session => session.TableVersions.Forget(Some.Sha(3)));
        Assert.Equal([tables[1]], Changed());
        Apply(tables[1]);
        Store.Write(session => session.Arrivals.Settle(Some.Sha(4), ArrivalState.Stored, "table", null, "anna"));
        Assert.Equal([tables[2]], Changed());
        Apply(tables[2]);
        Assert.Empty(Changed());
        Store.Write(session => session.TableVersions.ReplayAll());
        Assert.Equal(tables.Order(StringComparer.Ordinal), Changed());
    }

    private IReadOnlyList<string> Changed() => Store.Read(session => session.TableVersions.Changed());

    private void Apply(string table) => Store.Write(session => session.TableVersions.SetApplied(table, session.TableVersions.Seen(table)));

    private void See(string path, string sha, int night, bool namedByFolder = false) => Store.Write(session =>
    {
        session.Arrivals.AddWaiting(sha, null, sha, 10);
        session.Sightings.Upsert("inbox", path, sha, Some.Moment + Duration.FromDays(night), new FileStamp(10, 1, "1"));
        session.TableVersions.Note(sha, "ratings", namedByFolder);
    });

    private static StoredRow Rating(string scope, double rating, int night) =>
        Row(scope, "anna", RowKind.Sessions, new SessionRow(null, null, null, null, 60, rating, [], null), night);

    private static StoredRow Row(string scope, string person, RowKind kind, RowContent content, int night) =>
        new(scope, kind, "ratings", person, person, Date, "2026-03-02|1", Some.Moment + Duration.FromDays(night), content);
}
