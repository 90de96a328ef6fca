using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>What the staff wrote back: the table of answers, which grows when somebody says something.</summary>
internal sealed class DemoAnswers(IReadOnlyList<DemoPerson> people, int seed, LocalDate until)
{
    public const string Path = "inbox/answers.csv";

    private const string Coach = "Sorja Hallakoski";
    private const string Physiotherapist = "Tyyne Varpusalo";

    public DemoFile Version(LocalDate morning) => DemoTable.File(
        Path, "date,person,group,answer,until,rule,file,by,note", Lines().Where(line => line.Known <= morning).Select(line => line.Text), morning);

    /// <summary>Lines with the morning from which on they stand in the table.</summary>
    private IEnumerable<(LocalDate Known, string Text)> Lines()
    {
        var before = DemoCalendar.Mornings(until)[1];
        foreach (var part in people.Select(person => person.Part))
        {
            switch (part.Plot)
            {
                case DemoPlot.Ill:
                    yield return (before, $"{Back(DemoTimeline.IllFrom)},{part.Id},,ill,,,,{Coach},");
                    yield return (before, $"{Back(DemoTimeline.IllUntil)},{part.Id},,returning,,,,{Coach},starts with short rows");
                    break;
                case DemoPlot.AwayAsTold:
                    yield return (before, $"{Back(DemoTimeline.AwayFrom)},{part.Id},,away,{DemoCalendar.Iso(until.PlusDays(4))},,,{Physiotherapist},visits a sister");
                    break;
                case DemoPlot.EasyOnly:
                    yield return (until, $"{Back(1)},{part.Id},,seen,,stimulus_gap,,{Coach},gym again this week");
                    break;
                case DemoPlot.LeftOnLaptop when LaptopFile(part) is { } file:
                    yield return (until.PlusDays(-1), $"{Back(2)},{part.Id},,belongs_to,,,{file},{Coach},rowed with the club's spare watch");
                    break;
                default:
                    break;
            }
        }
    }

    private string Back(int days) => DemoCalendar.Iso(until.PlusDays(-days));

    /// <summary>Below the inbox.</summary>
    private string? LaptopFile(DemoPart part) => DemoTimeline.Of(part, seed, until)
        .Where(planned => DeliveryPlan.IsLeftOnLaptop(part, planned.Date, until))
        .Select(planned => Deliveries.LaptopPath(planned))
        .FirstOrDefault();
}
