using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Processes;
using Microsoft.Data.Sqlite;
using NodaTime;

namespace LoadWatch.Chaos.Places;

/// <summary>How a place is configured.</summary>
/// <param name="Take"><c>leave</c> or <c>move</c>.</param>
/// <param name="Mail">The inside of the section <c>mail</c>, or null for a place without mail.</param>
/// <param name="Contacts">How many are told, each with an address where there is mail.</param>
public sealed record PlaceOptions(string Take = "leave", string? Mail = null, int Contacts = 1)
{
    /// <summary>The address of a contact, from 0.</summary>
    public static string Address(int contact) => FormattableString.Invariant($"staff{contact}@example.org");
}

/// <summary>A temporary working folder as a user has it: configuration, roster, anchors, an inbox. Deleted by its exact path.</summary>
public sealed class Place : IDisposable
{
    private static readonly Duration Settled = Duration.FromHours(1);

    private readonly Binary binary;
    private readonly DirectoryInfo root;

    private Place(Binary binary, Clock clock)
    {
        this.binary = binary;
        Clock = clock;
        root = Directory.CreateTempSubdirectory("loadwatch-chaos-");
    }

    public Clock Clock { get; }

    public string Root => root.FullName;

    public string ConfigPath => At("loadwatch.json");

    public string Inbox => At("inbox");

    public string Data => At("data");

    public string DatabasePath => Path.Combine(Data, "loadwatch.db");

    public static Place Make(Binary binary, Clock clock, PlaceOptions? options = null)
    {
        var place = new Place(binary, clock);
        Directory.CreateDirectory(place.Inbox);
        File.WriteAllText(place.ConfigPath, Configuration(clock, options ?? new PlaceOptions()));
        File.WriteAllText(place.At("roster.csv"), Cast.Roster);
        File.WriteAllText(place.At("anchors.csv"), Cast.Anchors);
        return place;
    }

    public string At(string path) => Path.Combine(Root, path);

    /// <summary>The same place once more, files with their times.</summary>
    public Place Copy()
    {
        var copy = new Place(binary, Clock);
        if (!Tool.Run("cp", "-a", Root + "/.", copy.Root))
        {
            throw new ChaosFailureException($"{Root} cannot be copied");
        }

        return copy;
    }

    /// <summary>Puts files into the inbox, written an hour ago.</summary>
    public void Fill(IEnumerable<InboxFile> files)
    {
        ArgumentNullException.ThrowIfNull(files);
        foreach (var file in files)
        {
            Put(file.Path, file.Bytes);
        }
    }

    /// <returns>The full path.</returns>
    public string Put(string path, byte[] bytes)
    {
        var full = Path.Combine(Inbox, path);
        Directory.CreateDirectory(Path.GetDirectoryName(full)!);
        File.WriteAllBytes(full, bytes);
        File.SetLastWriteTimeUtc(full, (Clock.Now - Settled).ToDateTimeUtc());
        return full;
    }

    /// <summary>Empties the inbox, as staff may once its files are in.</summary>
    public void ClearInbox()
    {
        foreach (var file in Directory.EnumerateFiles(Inbox, "*", SearchOption.AllDirectories).ToList())
        {
            File.Delete(file);
        }
    }

    /// <summary>Takes the files of before in, as of the morning before, and empties the inbox.</summary>
    public void Prepare(Nights nights)
    {
        ArgumentNullException.ThrowIfNull(nights);
        Fill(nights.Before);
        MustEndWell(Start(["sweep", "--as-of", Text(Clock.Now - Duration.FromDays(1))]).WaitForEnd());
        ClearInbox();
    }

    /// <summary>The words of one sweep at the place's clock.</summary>
    public IReadOnlyList<string> SweepWords => Clock.IsFixed ? ["sweep", "--as-of", Text(Clock.Now)] : ["sweep"];

    public Child StartSweep(params IEnumerable<(string Name, string Value)> environment) => Start(SweepWords, environment);

    public Ended Sweep(params IEnumerable<(string Name, string Value)> environment) => StartSweep(environment).WaitForEnd();

    /// <summary>A sweep that must end well.</summary>
    public Ended SweepWell() => MustEndWell(Sweep());

    /// <summary>Any command, with the place's configuration.</summary>
    public Child Start(IEnumerable<string> words, params IEnumerable<(string Name, string Value)> environment) =>
        StartUnder([], words, environment);

    /// <param name="tracer">A program with its options that runs the service, as strace or unshare.</param>
    public Child StartUnder(IEnumerable<string> tracer, IEnumerable<string> words, params IEnumerable<(string Name, string Value)> environment) =>
        Child.Start([.. tracer, .. binary.Words, .. words, "--config", ConfigPath], Root, environment);

    public Ended Command(params IEnumerable<string> words) => Start(words).WaitForEnd();

    public static Ended MustEndWell(Ended ended)
    {
        ArgumentNullException.ThrowIfNull(ended);
        return ended.Code == 0 ? ended : throw new ChaosFailureException($"ended with {ended.Code}: {ended.Said}");
    }

    /// <summary>Lets a delivery that waits for its next attempt be due at once; the only thing that is ever written into a store, and only where nothing runs.</summary>
    public void SkipWaits() => Write("UPDATE delivery SET next_attempt = NULL WHERE state = 'pending'");

    /// <summary>Lets the first attempt of what waits lie as far back as if that time had gone by; only where nothing runs.</summary>
    public void AgeWaits(Duration time) =>
        Write($"UPDATE delivery SET next_attempt = NULL, first_attempt = '{Text(Clock.Now - time)[..^1]}.000000000Z' WHERE state = 'pending'");

    public void Dispose() => root.Delete(recursive: true);

    private void Write(string sql)
    {
        using var connection = new SqliteConnection(new SqliteConnectionStringBuilder { DataSource = DatabasePath, Pooling = false }.ConnectionString);
        connection.Open();
        using var command = connection.CreateCommand();
#pragma warning disable CA2100 // The texts stand above.
        command.CommandText = sql;
#pragma warning restore CA2100
        command.ExecuteNonQuery();
    }

    private static string Text(Instant instant) => NodaTime.Text.InstantPattern.General.Format(instant);

    private static string Configuration(Clock clock, PlaceOptions options)
    {
        var mail = options.Mail is null ? "" : $",\n  \"mail\": {{ {options.Mail} }}";
        var contacts = Enumerable.Range(0, options.Contacts).Select(number =>
            $"{{ \"id\": \"staff{number}\", \"name\": \"Staff {number}\", \"groups\": [\"squad\"], \"brief_at\": \"05:00\"{(options.Mail is null ? "" : $", \"mail\": \"{PlaceOptions.Address(number)}\"")} }}");
        return $$"""
            {
              "time_zone": "{{clock.Zone}}",
              "inboxes": [{ "name": "inbox", "path": "inbox", "take": "{{options.Take}}" }],
              "groups": [{ "id": "squad", "name": "Squad" }],
              "contacts": [{{string.Join(", ", contacts)}}],
              "intake": { "scan_seconds": 5 },
              "limits": { "silence": { "extra_days": 2 } }{{mail}}
            }

            """;
    }
}
