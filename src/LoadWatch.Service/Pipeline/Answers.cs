using LoadWatch.Notices;
using LoadWatch.Rows;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage;
using LoadWatch.Storage.Decisions;
using LoadWatch.Storage.Rows;
using NodaTime;

namespace LoadWatch.Service.Pipeline;

/// <summary>
/// Brings decisions in line with the rows of answers: a row without its decisions makes them, a decision whose row is gone or says something else is withdrawn.
/// A second time changes nothing. A table of which no row is left was lost, not retracted: what it told stands. What a row made stays as it was made while the row stands unchanged, whoever joins the group later.
/// </summary>
public sealed class Answers(WorkingConfiguration configuration, Instant now)
{
    private const int QuestionDays = 14;

    /// <summary>Within a transaction: after alerts were judged, rows about alerts find those that were raised by it.</summary>
    public AnswersReport TakeUp(StoreSession session)
    {
        var all = session.Decisions.All();
        var told = Told(all);
        var rows = Read(session, told);
        var kept = rows.SelectMany(row => row.Kept).Select(decision => decision.Id).ToHashSet(StringComparer.Ordinal);

        var effects = new DecisionEffects(configuration, session);
        var taken = all.Select(decision => decision.Id).ToHashSet(StringComparer.Ordinal);
        var gone = told.SelectMany(same => same).Where(decision => !kept.Contains(decision.Id) && IsThere(session, decision.Via!)).ToList();
        gone.ForEach(decision => effects.Withdraw(decision, now, decision.Via));
        var made = rows.SelectMany(row => row.Wanted).Count(decision => effects.Make(WithFreeId(decision, taken)));
        return new AnswersReport(made, gone.Count, [.. rows.Select(row => row.Question).OfType<BriefLine>()]);
    }

    /// <summary>Rows of the last 14 days that nobody can follow as things stand, by table and date, with the reason. Writes nothing.</summary>
    public IReadOnlyList<BriefLine> Questions(StoreSession session) =>
    [
        .. Read(session, Told(session.Decisions.All()))
            .Where(read => read.Date >= now.InUtc().Date.PlusDays(-QuestionDays))
            .Select(read => read.Question)
            .OfType<BriefLine>(),
    ];

    private static ILookup<string, Decision> Told(IReadOnlyList<Decision> all) =>
        DecisionTable.InForce(all).Where(decision => decision.IsAnswer).ToLookup(decision => decision.Via!, StringComparer.Ordinal);

    private List<ReadAnswer> Read(StoreSession session, ILookup<string, Decision> told)
    {
        var reading = new AnswerReading(configuration, session, now);
        return [.. session.TableRows.OfKind(RowKind.Answers).Select(row => Read(row, told, reading))];
    }

    private static ReadAnswer Read(StoredRow row, ILookup<string, Decision> told, AnswerReading reading)
    {
        var kept = told[Decision.ViaRow(row.Scope, row.Subject, row.Key)].Where(decision => reading.StillSays(row, decision)).ToList();
        var (wanted, question) = reading.Of(row, kept);
        return new ReadAnswer(row.Date, kept, wanted, question);
    }

    /// <summary>Whether the table that told a decision is still known: one that cannot be read takes nothing back.</summary>
    private static bool IsThere(StoreSession session, string via) => Enumerable.Range(0, via.Length)
        .Where(at => via[at] == '|')
        .Select(at => via[..at])
        .Any(table => Decision.ScopeOf(table) is { } scope
            && (session.TableRows.OfScope(scope).Any(row => row.Kind == RowKind.Answers) || session.TableVersions.Applied(scope).Count > 0));

    /// <summary>A row that went and came back within one moment decides a nanosecond later.</summary>
    private static Decision WithFreeId(Decision decision, HashSet<string> taken)
    {
        while (!taken.Add(decision.Id))
        {
            decision = decision with { Made = decision.Made + Duration.Epsilon };
        }

        return decision;
    }

    private sealed record ReadAnswer(LocalDate Date, IReadOnlyList<Decision> Kept, IReadOnlyList<Decision> Wanted, BriefLine? Question);
}

/// <summary>What taking up answers did.</summary>
/// <param name="Made">Decisions appended.</param>
/// <param name="Withdrawn">Decisions withdrawn.</param>
/// <param name="Questions">Rows that nobody can follow, by table and date, with the reason.</param>
public sealed record AnswersReport(int Made, int Withdrawn, IReadOnlyList<BriefLine> Questions);
