using LoadWatch.People;

namespace LoadWatch.Findings;

/// <summary>Who decides about a finding, as each reader is told: the same people, with "you" for whoever reads.</summary>
/// <param name="Told">To nobody in particular.</param>
public sealed record Deciders(string Told, string Coach, string Physiotherapist, string Clinician, string FrontDesk, string Self)
{
    public static Deciders CoachAndPerson { get; } = new(
        "the person and their coach",
        "you and the person",
        "the person and their coach, with what you know",
        "the person and their coach, with what you know",
        "the person and their coach, please pass it on",
        "you, with your coach or clinician where you have one");

    /// <summary>Of heavy work: what older and ill people do of it is their clinician's matter, too.</summary>
    public static Deciders WithClinician { get; } = new(
        "the person and their coach; with their clinician where one looks after them",
        "you and the person, with their clinician where one looks after them",
        "the person and their coach, with what you know, with their clinician where one looks after them",
        "the person, with you",
        "the person and their coach or clinician, please pass it on",
        "you, with your clinician where one looks after you");

    /// <summary>A strap that fails is nobody's decision about training.</summary>
    public static Deciders PersonAndDevices { get; } = OfThings("the devices");

    public static Deciders PersonAndUploads { get; } = OfThings("devices and uploads");

    public static Deciders PersonAndClinician { get; } = OfHealth("the person, with their clinician", "the person, with you", "you, with your clinician");

    public static Deciders ClinicianAndPerson { get; } = OfHealth("the clinician, with the person", "you, with the person", "your clinician, with you");

    public string For(ContactRole role) => role switch
    {
        ContactRole.Coach => Coach,
        ContactRole.Physiotherapist => Physiotherapist,
        ContactRole.Clinician => Clinician,
        ContactRole.FrontDesk => FrontDesk,
        ContactRole.Self => Self,
        _ => throw new ArgumentOutOfRangeException(nameof(role)),
    };

    private static Deciders OfThings(string things)
    {
        var staff = $"the person, and whoever looks after {things}";
        return new($"the person; whoever looks after {things}", staff, staff, staff, $"{staff}, please pass it on", $"you, or whoever looks after {things}");
    }

    /// <summary>Others are not told of it (<see cref="RuleRecord.IsOfHealth"/>).</summary>
    private static Deciders OfHealth(string told, string clinician, string self) => new(told, told, told, clinician, told, self);
}
