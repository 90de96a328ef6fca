using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>A way by which a session reaches the inbox.</summary>
internal enum Delivery
{
    /// <summary>As a FIT file.</summary>
    File,

    /// <summary>With the rest of its week in a zip file only.</summary>
    Packed,

    /// <summary>As a gzip file only.</summary>
    Compressed,

    /// <summary>As a CSV only.</summary>
    Table,

    /// <summary>As a FIT file, and by a second device as a CSV with less in it.</summary>
    FileAndTable,

    /// <summary>As two files of equal content.</summary>
    Twice,

    /// <summary>As a whole file, and as one of which the end is missing.</summary>
    AlsoCut,

    /// <summary>As a FIT file in the folder of the pods, which names nobody.</summary>
    Pod,

    /// <summary>As a FIT file in a folder that names nobody, and whose device nobody knows.</summary>
    Laptop,
}

/// <summary>Whose sessions come by another way than most, and when.</summary>
internal static class DeliveryPlan
{
    /// <param name="back">Days before the morning of the brief.</param>
    /// <param name="day">Of the session.</param>
    /// <param name="hasSets">A CSV holds samples only.</param>
    public static Delivery Of(string person, int back, IsoDayOfWeek day, bool hasSets) => (person, back, hasSets) switch
    {
        ("lauri", >= 22 and <= 28, _) => Delivery.Packed,
        ("milla", >= 4 and <= 10, _) => Delivery.Compressed,
        ("otso", >= 8 and <= 14, false) => Delivery.Table,
        ("petra", >= 4 and <= 10, false) => Delivery.FileAndTable,
        ("kaisa", >= 4 and <= 10, _) when day == IsoDayOfWeek.Saturday => Delivery.Twice,
        ("joel", >= 4 and <= 10, _) when day == IsoDayOfWeek.Saturday => Delivery.AlsoCut,
        _ => Delivery.File,
    };

    /// <summary>The Saturday row of the first week back from the brief that is more than a few days old.</summary>
    public static bool IsLeftOnLaptop(DemoPart part, LocalDate date, LocalDate until) =>
        part.Plot == DemoPlot.LeftOnLaptop && date == DemoCalendar.LatestBefore(until, 5, IsoDayOfWeek.Saturday);

    /// <summary>In words, for a terminal.</summary>
    public static IReadOnlyList<string> Lines { get; } =
    [
        "A week of Lauri Viimakoski's comes as a zip file, some days of Milla Usvalehto's as gzip files, a week of Otso Kelovaara's rows as CSV.",
        "Some rows of Petra Sarahiisi's come twice, from two devices: each counts once, the richer one stands.",
        "Kaisa Suvantoharju has sent a file twice, once under another name: it counts once.",
        "An upload of Joel Terhokari's broke off: that half is refused, the whole file beside it counts.",
        "Inka Lumisola and Sanni Kuuraniitty hand two pods to each other every Monday: serial number and date tell whose a recording is.",
        "The clinic's set log comes whole every night, under the names that the gym knows: two of its lines are corrected and one is taken out.",
        "The squad's form of ratings grows every night; one rating fits two recordings and one fits none: both are asked about.",
        "A row of Saku Honkaluoto's lay on the club's laptop: held, until the table of answers said whose it is.",
        "A file in another folder that names nobody stays held; a settings file of Henri Loivarinne's is put aside.",
    ];
}
