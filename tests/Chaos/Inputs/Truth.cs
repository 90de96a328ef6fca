using System.Security.Cryptography;
using NodaTime;

namespace LoadWatch.Chaos.Inputs;

/// <summary>What happened, kept by whoever wrote the files and never asked of the service.</summary>
public sealed class Truth
{
    public const string Stored = "stored";
    public const string Aside = "aside";
    public const string Held = "held";
    public const string Refused = "refused";

    private readonly List<TrueSession> sessions = [];
    private readonly List<(string Person, LocalDate Date, double Kilograms)> lifted = [];
    private readonly Dictionary<string, string> states = new(StringComparer.Ordinal);

    /// <summary>Each counts once, however many files tell of it.</summary>
    public IReadOnlyList<TrueSession> Sessions => sessions;

    /// <summary>Kilograms times repetitions, summed over a person's date.</summary>
    public IReadOnlyList<(string Person, LocalDate Date, double Kilograms)> Lifted => lifted;

    /// <summary>SHA-256 of each content and the state it must end in. Containers are not among them.</summary>
    public IReadOnlyDictionary<string, string> States => states;

    /// <summary>Rule and person of the alerts that must stand.</summary>
    public IReadOnlyList<(string Rule, string Person)> Alerts { get; init; } = [];

    public static string Sha(byte[] bytes) => Convert.ToHexStringLower(SHA256.HashData(bytes));

    public TrueSession Happened(TrueSession session)
    {
        sessions.Add(session);
        return session;
    }

    public void Lifts(string person, LocalDate date, double kilograms) => lifted.Add((person, date, kilograms));

    /// <summary>A content, a member of an archive too.</summary>
    public byte[] Must(string state, byte[] bytes)
    {
        states[Sha(bytes)] = state;
        return bytes;
    }
}
