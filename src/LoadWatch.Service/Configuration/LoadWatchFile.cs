using System.ComponentModel.DataAnnotations;
using System.Text.Json.Serialization;
using LoadWatch.Activities;
using LoadWatch.Decoding.Csv;
using LoadWatch.Findings;
using LoadWatch.People;
using LoadWatch.Quality;
using NodaTime;

namespace LoadWatch.Service.Configuration;

/// <summary>The file <c>loadwatch.json</c>. Paths are relative to the file; every key has its default here and in <c>config/loadwatch.json</c>.</summary>
public sealed record LoadWatchFile
{
    /// <summary>Address of the JSON schema, for editors only.</summary>
    [JsonPropertyName("$schema")]
    public string? Schema { get; init; }

    /// <summary>Folder of the archive and the database.</summary>
    public string Data { get; init; } = "data";

    /// <summary>Whether the folder may lie on a network file system: only where no other machine ever opens it.</summary>
    public bool AllowNetworkDataFolder { get; init; }

    /// <summary>Folder of the pages, one file per contact.</summary>
    public string Pages { get; init; } = "pages";

    /// <summary>Folder of the notice files, one per month.</summary>
    public string Notices { get; init; } = "notices";

    /// <summary>Who is watched: a CSV with the columns person, name, group, birth_year, sex, time_zone, aliases, heart_rate_valid.</summary>
    public string Roster { get; init; } = "roster.csv";

    /// <summary>Personal reference values: a CSV with the columns person, date, anchor, value, unit, source, exercise.</summary>
    public string Anchors { get; init; } = "anchors.csv";

    /// <summary>Devices that are handed out: a CSV with the columns serial, person, from, to, session. It may be missing.</summary>
    public string Devices { get; init; } = DefaultDevices;

    internal const string DefaultDevices = "devices.csv";

    /// <summary>IANA zone of people and contacts that name none; blank takes the zone of this machine.</summary>
    public string TimeZone { get; init; } = "";

    /// <summary>Watched folders.</summary>
    public IReadOnlyList<InboxEntry> Inboxes { get; init; } = [new InboxEntry()];

    /// <summary>Squads and classes.</summary>
    public IReadOnlyList<GroupEntry> Groups { get; init; } = [new GroupEntry()];

    /// <summary>What differs for single people from their group, by the person's id in the roster.</summary>
    public IReadOnlyDictionary<string, PersonEntry> People { get; init; } = new Dictionary<string, PersonEntry>();

    /// <summary>Who is told.</summary>
    public IReadOnlyList<ContactEntry> Contacts { get; init; } = [new ContactEntry()];

    /// <summary>Who looks after the service: told once a day how it is, and at once when it is in trouble. Nothing about people.</summary>
    public IReadOnlyList<AdministratorEntry> Administrators { get; init; } = [];

    /// <summary>The server that takes mail.</summary>
    public MailEntry Mail { get; init; } = new();

    /// <summary>How notices are posted to chat or ticket systems.</summary>
    public WebhookEntry Webhook { get; init; } = new();

    /// <summary>CSV layouts beside the built-in ones; the header picks the layout.</summary>
    public IReadOnlyList<CsvLayout> Layouts { get; init; } = [];

    /// <summary>Zones, body regions, and how much of a recording must be usable.</summary>
    public ComputationEntry Computation { get; init; } = new();

    /// <summary>Limits of the rules for every group that sets none of its own.</summary>
    public RuleLimits Limits { get; init; } = new();

    /// <summary>How the service looks for files.</summary>
    public IntakeEntry Intake { get; init; } = new();
}

/// <summary>One watched folder.</summary>
public sealed record InboxEntry
{
    /// <summary>Short name, used in listings.</summary>
    [Required(AllowEmptyStrings = false)]
    public string Name { get; init; } = "inbox";

    /// <summary>The folder. A sub-folder named after a person holds that person's recordings.</summary>
    [Required(AllowEmptyStrings = false)]
    public string Path { get; init; } = "inbox";

    /// <summary>Whether files stay (<c>leave</c>) or go once their effects are durable (<c>move</c>).</summary>
    public TakeMode Take { get; init; } = TakeMode.Leave;

    /// <summary>How file names tell whose a file is, where no folder does: {person} once, and * for any text, ? for one character; blank: not at all.</summary>
    public string FilePattern { get; init; } = "";

    /// <summary>A file or folder that lies in the inbox whenever it is there, such as a hidden one on a share; blank: none.</summary>
    public string Marker { get; init; } = "";

    /// <summary>Whether the beginning of a FIT file that was cut off is used; else such a file is refused.</summary>
    public bool Salvage { get; init; }
}

public enum TakeMode
{
    Leave,
    Move,
}

/// <summary>One squad or class.</summary>
public sealed record GroupEntry
{
    /// <summary>Short name, used in the roster.</summary>
    [Required(AllowEmptyStrings = false)]
    public string Id { get; init; } = "squad";

    /// <summary>The name that briefs show; blank shows the id.</summary>
    public string Name { get; init; } = "";

    /// <summary>What it is: in a <c>clinic</c> the rules of ratio, jump, monotony and hard days are off, unless its own limits turn them on.</summary>
    public GroupKind Kind { get; init; } = GroupKind.Squad;

    /// <summary>
    /// The quantity that is this group's load: banister_trimp, edwards_load, lucia_load, stagno_load, individual_trimp, foster_load, minutes, distance,
    /// distance_above_5_5_m_s, distance_above_7_m_s (of the speed bounds from 5.5 on), distance_above_80_percent_speed_max,
    /// distance_above_90_percent_speed_max (of the shares of the best speed), accelerations, decelerations, climb, work, sets, repetitions or kilograms.
    /// </summary>
    public string LoadQuantity { get; init; } = "banister_trimp";

    /// <summary>
    /// Quantities that stand in for it, first choice first, where a session lacks it: converted by the person's own sessions that have both, 10 of them
    /// at least.
    /// </summary>
    public IReadOnlyList<string> LoadFallbacks { get; init; } = [];

    /// <summary>Local time at which a day begins, 00:00 to 12:00: sessions that begin before it count for the date before.</summary>
    [RegularExpression("^(0[0-9]|1[01]):[0-5][0-9]$|^12:00$", ErrorMessage = "is not a time from 00:00 to 12:00")]
    public string DayBeginsAt { get; init; } = "00:00";

    /// <summary>Limits that differ from the common ones; only the keys that differ.</summary>
    public RuleLimits? Limits { get; init; }
}

public enum GroupKind
{
    Squad,
    Clinic,
}

/// <summary>What differs for one person.</summary>
public sealed record PersonEntry
{
    /// <summary>Limits that differ from those of the person's group; only the keys that differ.</summary>
    public RuleLimits? Limits { get; init; }
}

/// <summary>One reader of briefs.</summary>
public sealed record ContactEntry
{
    /// <summary>Short name; names the page.</summary>
    [Required(AllowEmptyStrings = false)]
    [RegularExpression("^[A-Za-z0-9_-]{1,40}$", ErrorMessage = "may hold letters, digits, - and _ only, 40 at most")]
    public string Id { get; init; } = "staff";

    /// <summary>The name that the brief shows; blank shows the id.</summary>
    public string Name { get; init; } = "";

    /// <summary>What the contact is to the people watched.</summary>
    public ContactRole Role { get; init; } = ContactRole.Coach;

    /// <summary>Ids of groups; empty for all of them.</summary>
    public IReadOnlyList<string> Groups { get; init; } = [];

    /// <summary>Ids of single people; where any is named, the brief is about them and not about groups.</summary>
    public IReadOnlyList<string> People { get; init; } = [];

    /// <summary>Local time of the brief, 00:00 to 23:59.</summary>
    [RegularExpression("^([01][0-9]|2[0-3]):[0-5][0-9]$", ErrorMessage = "is a time of day such as 06:30")]
    public string BriefAt { get; init; } = "06:30";

    /// <summary>Weekdays of the brief.</summary>
    public IReadOnlyList<IsoDayOfWeek> BriefDays { get; init; } =
    [
        IsoDayOfWeek.Monday, IsoDayOfWeek.Tuesday, IsoDayOfWeek.Wednesday, IsoDayOfWeek.Thursday,
        IsoDayOfWeek.Friday, IsoDayOfWeek.Saturday, IsoDayOfWeek.Sunday,
    ];

    /// <summary>
    /// What the brief holds: <c>daily</c> (who is to be looked at, and the groups), <c>weekly</c> (the week; with the first brief of a week), <c>call_list</c>
    /// (whom to call; with the first brief of a week), <c>class_sheet</c> (who is planned today, to print); empty: as usual for the role and the days.
    /// </summary>
    public IReadOnlyList<BriefForm> Forms { get; init; } = [];

    /// <summary>IANA zone; blank takes the common one.</summary>
    public string TimeZone { get; init; } = "";

    /// <summary>Address for mail; blank for none.</summary>
    public string Mail { get; init; } = "";

    /// <summary>Address of a chat or ticket system that notices are posted to, https; blank for none.</summary>
    public string Webhook { get; init; } = "";

    /// <summary>How mail and webhook name the people: <c>full</c>, <c>initials</c>, or <c>none</c> (counts only). Page and notice file name them in full.</summary>
    public NamesShown Names { get; init; } = NamesShown.Full;
}

/// <summary>Somebody who looks after the service.</summary>
public sealed record AdministratorEntry
{
    /// <summary>Short name.</summary>
    [Required(AllowEmptyStrings = false)]
    [RegularExpression("^[A-Za-z0-9_-]{1,40}$", ErrorMessage = "may hold letters, digits, - and _ only, 40 at most")]
    public string Id { get; init; } = "administrator";

    /// <summary>Address for mail; blank: the notice file only.</summary>
    public string Mail { get; init; } = "";

    /// <summary>Local time of the daily report, 00:00 to 23:59.</summary>
    [RegularExpression("^([01][0-9]|2[0-3]):[0-5][0-9]$", ErrorMessage = "is a time of day such as 07:00")]
    public string ReportAt { get; init; } = "07:00";

    /// <summary>IANA zone; blank takes the common one.</summary>
    public string TimeZone { get; init; } = "";
}

/// <summary>What may be set of the computation.</summary>
public sealed record ComputationEntry
{
    /// <summary>Share of the sampled time with a usable reading below which a channel gives no load and no stimulus. 0 to 1.</summary>
    [Range(0.0, 1.0)]
    public double UsableShareWanted { get; init; } = 0.5;

    /// <summary>From when on a heart rate is no reading of the person.</summary>
    public QualityLimits Quality { get; init; } = new();

    /// <summary>Which published equations are used, and their constants from memory.</summary>
    public EquationChoices Equations { get; init; } = new();

    /// <summary>Inner bounds of the heart-rate zones, fractions of heart-rate reserve, where thresholds are not anchored.</summary>
    public IReadOnlyList<double> HeartRateReserveBounds { get; init; } = [0.30, 0.40, 0.60, 0.90];

    /// <summary>Inner bounds of the power zones, fractions of critical power.</summary>
    public IReadOnlyList<double> PowerBounds { get; init; } = [0.65, 0.85, 1.00, 1.15];

    /// <summary>Inner bounds of the speed zones, m/s.</summary>
    public IReadOnlyList<double> SpeedBounds { get; init; } = [2, 4, 5.5, 7];

    /// <summary>Shares of the person's best speed (the anchor speed_max) from which distance counts apart, 0.5 to 1, rising.</summary>
    public IReadOnlyList<double> SpeedMaxShares { get; init; } = [0.8, 0.9];

    /// <summary>Body regions by exercise, added to the shipped table or replacing its entries: legs, trunk, arms.</summary>
    public IReadOnlyDictionary<string, IReadOnlyList<string>> Exercises { get; init; } = new Dictionary<string, IReadOnlyList<string>>();

    /// <summary>Body regions by sport, added to the shipped table or replacing its entries: legs, trunk, arms.</summary>
    public IReadOnlyDictionary<string, IReadOnlyList<string>> Sports { get; init; } = new Dictionary<string, IReadOnlyList<string>>();
}

/// <summary>How files are looked for.</summary>
public sealed record IntakeEntry
{
    /// <summary>Seconds between two looks at the inboxes.</summary>
    [Range(5, 3600)]
    public int ScanSeconds { get; init; } = 60;

    /// <summary>Seconds for which a file that does not show by its content that it is whole must stand still.</summary>
    [Range(0, 86400)]
    public int SettleSeconds { get; init; } = 60;

    /// <summary>Largest file taken that is no CSV, megabytes.</summary>
    [Range(1, 512)]
    public int LargestFileMegabytes { get; init; } = 32;

    /// <summary>Largest CSV taken that is not packed, megabytes.</summary>
    [Range(1, 4096)]
    public int LargestCsvMegabytes { get; init; } = 512;
}
