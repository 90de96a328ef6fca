using System.IO.Compression;
using LoadWatch.Decoding.Csv;
using LoadWatch.Decoding.Fit;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Service.Demo;

/// <summary>How the sessions reach the inbox: nearly all as one FIT file each, some of a few people by other ways.</summary>
internal static class Deliveries
{
    private const int ThinningSeconds = 5;

    private static readonly LocalDateTimePattern Stamp = LocalDateTimePattern.CreateWithInvariantCulture("uuuu-MM-dd-HHmm");

    public static IEnumerable<DemoFile> Of(DemoPerson person, int seed, LocalDate until)
    {
        var packed = new List<DemoFile>();
        foreach (var activity in DemoSessions.Of(person, seed, until))
        {
            switch (Way(person, activity, until))
            {
                case Delivery.Pod:
                    yield return Placed(Fit(person, activity), $"inbox/{DemoPods.Folder}/{Stamp.Format(Local(activity))}-pod-{activity.Device.Serial}.fit");
                    break;
                case Delivery.Laptop:
                    yield return Placed(Fit(person, activity), $"inbox/{LaptopPath(Local(activity))}");
                    break;
                case Delivery.Packed:
                    packed.Add(Fit(person, activity));
                    break;
                case Delivery.Compressed:
                    yield return Compressed(Fit(person, activity));
                    break;
                case Delivery.Table:
                    yield return Table(person, activity);
                    break;
                case Delivery.FileAndTable:
                    yield return Fit(person, activity);
                    yield return Table(person, Thinned(activity));
                    break;
                case Delivery.Twice:
                    yield return Fit(person, activity);
                    yield return Renamed(Fit(person, activity), "copy of ");
                    break;
                case Delivery.AlsoCut:
                    yield return Fit(person, activity);
                    yield return Cut(Fit(person, activity));
                    break;
                default:
                    yield return Fit(person, activity);
                    break;
            }
        }

        if (packed.Count > 0)
            yield return Archive(packed);
    }

    /// <summary>Where the club's laptop puts a session, below the inbox.</summary>
    public static string LaptopPath(PlannedSession planned) => LaptopPath(planned.Start);

    private static string LaptopPath(LocalDateTime start) => $"_club-laptop/{Stamp.Format(start)}.fit";

    private static Delivery Way(DemoPerson person, FitActivity activity, LocalDate until)
    {
        var date = Local(activity).Date;
        if (DemoPods.Of(person.Part.Id, date) is not null)
            return Delivery.Pod;

        return DeliveryPlan.IsLeftOnLaptop(person.Part, date, until)
            ? Delivery.Laptop
            : DeliveryPlan.Of(person.Part.Id, Period.DaysBetween(date, until), date.DayOfWeek, activity.Sets.Count > 0);
    }

    /// <summary>A file of the person, in the folder of that name.</summary>
    public static DemoFile Fit(DemoPerson person, FitActivity activity) =>
        new(Path(person, activity, "fit"), FitEncoder.Encode(activity), Modified(activity));

    private static DemoFile Table(DemoPerson person, FitActivity activity) =>
        new(Path(person, activity, "csv"), CsvSamplesWriter.Write(DemoRecording.Of(activity)), Modified(activity));

    /// <summary>What a second, simpler device kept of the session.</summary>
    private static FitActivity Thinned(FitActivity activity) => activity with
    {
        Samples = [.. activity.Samples.Where((_, i) => i % ThinningSeconds == 0).Select(sample => new FitSample(sample.Time, sample.HeartRate, sample.Power))],
    };

    private static DemoFile Compressed(DemoFile file)
    {
        using var bytes = new MemoryStream();
        using (var gzip = new GZipStream(bytes, CompressionLevel.Optimal))
            gzip.Write(file.Bytes);

        return file with { Path = file.Path + ".gz", Bytes = bytes.ToArray() };
    }

    private static DemoFile Archive(List<DemoFile> files)
    {
        using var bytes = new MemoryStream();
        using (var zip = new ZipArchive(bytes, ZipArchiveMode.Create, leaveOpen: true))
        {
            foreach (var file in files)
            {
                var entry = zip.CreateEntry(file.Path[(file.Path.LastIndexOf('/') + 1)..], CompressionLevel.Optimal);
                entry.LastWriteTime = file.Modified.ToDateTimeOffset();
                using var stream = entry.Open();
                stream.Write(file.Bytes);
            }
        }

        return new DemoFile(files[0].Path[..(files[0].Path.LastIndexOf('/') + 1)] + "week.zip", bytes.ToArray(), files[^1].Modified);
    }

    private static DemoFile Placed(DemoFile file, string path) => file with { Path = path };

    private static DemoFile Renamed(DemoFile file, string before)
    {
        var name = file.Path.LastIndexOf('/') + 1;
        return file with { Path = file.Path.Insert(name, before) };
    }

    private static DemoFile Cut(DemoFile file) => Renamed(file, "half of ") with { Bytes = file.Bytes[..(file.Bytes.Length * 3 / 5)] };

    private static string Path(DemoPerson person, FitActivity activity, string ending)
    {
        var what = activity.Sport.Detail is "strength_training" ? "strength" : activity.Sport.Name;
        return $"inbox/{person.Part.Id}/{Stamp.Format(Local(activity))}-{what}.{ending}";
    }

    private static LocalDateTime Local(FitActivity activity) => activity.Start.InZone(DemoPerson.Zone).LocalDateTime;

    private static Instant Modified(FitActivity activity) => DemoCalendar.Written(Local(activity).Date.PlusDays(1));
}
