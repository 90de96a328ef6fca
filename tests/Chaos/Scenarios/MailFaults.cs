using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Mail;
using LoadWatch.Chaos.Places;
using LoadWatch.Chaos.Processes;
using NodaTime;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>Faults of the mail server: section F of the catalogue. What stands there about hours of waiting is proved in process, where the clock can be moved.</summary>
public static class MailFaults
{
    private const int ShortDeadline = 10;

    private static readonly string[] Laters = ["421 4.3.2 closing", "450 4.2.1 greylisted", "451 4.3.0 local trouble", "452 4.3.1 full", "552 5.2.2 over quota"];

    private static readonly Duration SixDays = Duration.FromDays(6);

    public static IReadOnlyList<Scenario> All { get; } =
    [
        new("mail-away", "F84", "The server is away, then back: kept, then sent once.", Away),
        new("mail-cut", "F85", "The line is cut after the final dot, at one in ten messages: the same Message-ID again, one further copy a cut at most.", Cuts),
        new("mail-killed", "F86", "Killed between the server's 250 and the mark, at every delivery: one further copy a kill at most.", Killed),
        new("mail-later", "F87 F92", "421, 450, 451, 452 and 552 to the sender, the recipient or the message, and a limit of ten messages: kept, then sent once.", Later),
        new("mail-refused", "F88", "550, 553 and 554 for one of three recipients: given up and reported, the others served.", Refused),
        new("mail-stripped", "F89", "STARTTLS stripped, a certificate out of date, for another host, of a strange authority: nothing sent, then sent once.", Distrusted),
        new("mail-login", "F90", "The login is refused until the password's file is put right: kept, the new password read, sent once.", Login),
        new("mail-slow", "F91", "Answers byte by byte and a greeting without end: one deadline for all of it, then sent once. Silence after the final dot: one further copy.", Slow),
        new("mail-expired", "F93", "Away for longer than five days: given up, and shown by status.", Expired),
    ];

    private static void Away(Trial trial)
    {
        using var desk = MailDesk.Open(trial);
        Recovers(trial, desk, new SmtpScript { Banner = SmtpScript.Cut });
    }

    /// <summary>Under the fault nothing is taken; with the server well again everything comes, once.</summary>
    private static void Recovers(Trial trial, MailDesk desk, SmtpScript fault, Action<Place>? mend = null, int mails = 1)
    {
        desk.Server.Script = fault;
        using var place = desk.Night();
        place.SweepWell();
        desk.MustHaveTaken(0);
        mend?.Invoke(place);
        desk.MustSendTheRest(place, furtherCopies: 0);
        for (var mail = 0; mail < mails; mail++)
        {
            trial.Survived();
        }
    }

    private static void Cuts(Trial trial)
    {
        var random = new Random(trial.Seed);
        using var desk = MailDesk.Open(trial, contacts: 50);
        for (var turn = 0; turn < (trial.IsLong ? 400 : 10); turn++)
        {
            var cuts = 0;
            desk.Server.Script = new SmtpScript { ToMessage = _ => random.Next(10) > 0 ? null : Count(ref cuts) };
            using var place = desk.Night();
            place.SweepWell();
            trial.Figure("further copies", desk.MustSendTheRest(place, cuts));
            trial.Figure("cuts", cuts);
            trial.Figure("sends", desk.Server.Received.Count);
            for (var cut = 0; cut < cuts; cut++)
            {
                trial.Survived();
            }
        }
    }

    private static string Count(ref int cuts)
    {
        cuts++;
        return SmtpScript.Cut;
    }

    private static void Killed(Trial trial)
    {
        using var desk = MailDesk.Open(trial, contacts: 3);
        for (var passing = 1; ; passing++)
        {
            using var place = desk.Night();
            var ended = place.Sweep(("LOADWATCH_KILL_AT", $"delivered:{passing}"));
            if (ended.Code == 0)
            {
                return;
            }

            Trial.MustBe(Ended.Killed, ended.Code, "as the exit code of a killed process");
            trial.Figure("further copies", desk.MustSendTheRest(place, furtherCopies: 1));
            trial.Survived();
        }
    }

    private static void Later(Trial trial)
    {
        // A recipient each: one sweep meets all of them.
        using var each = MailDesk.Open(trial, contacts: Laters.Length);
        Recovers(trial, each, new SmtpScript { ToSender = number => Laters[number % Laters.Length] }, mails: Laters.Length);
        Recovers(trial, each, new SmtpScript { ToRecipient = address => Laters[Enumerable.Range(0, Laters.Length).First(contact => PlaceOptions.Address(contact) == address)] }, mails: Laters.Length);
        Recovers(trial, each, new SmtpScript { ToMessage = number => Laters[number % Laters.Length] }, mails: Laters.Length);
        using var desk = MailDesk.Open(trial, contacts: 25);
        desk.Server.Script = new SmtpScript { ToMessage = number => number > 10 ? "450 4.7.1 not more than ten" : null };
        using var place = desk.Night();
        place.SweepWell();
        desk.MustHaveTaken(10);
        desk.MustSendTheRest(place, furtherCopies: 0);
        trial.Survived();
    }

    private static void Refused(Trial trial)
    {
        using var desk = MailDesk.Open(trial, contacts: 3);
        foreach (var answer in new[] { "550 5.1.1 no such user", "553 5.1.3 no such name", "554 5.7.1 refused" })
        {
            desk.Server.Script = new SmtpScript { ToRecipient = address => address == PlaceOptions.Address(1) ? answer : null };
            using var place = desk.Night();
            var said = place.SweepWell().Errors;
            desk.MustHaveTaken(2);
            MustSay(said, "given up");
            MustSay(place.Command("status").Output, "refused for good");
            place.SkipWaits();
            place.SweepWell();
            desk.MustHaveTaken(2);
            trial.Survived();
        }
    }

    private static void Distrusted(Trial trial)
    {
        using var authority = new LoadWatch.Delivery.Tests.Mail.TestAuthority();
        using var stranger = new LoadWatch.Delivery.Tests.Mail.TestAuthority("Another authority");
        using var well = authority.Issue("localhost");
        using var desk = MailDesk.Open(
            trial, section: $"starttls, \"certificate_authority_file\": \"{authority.PemFile}\"", well: new SmtpScript { Certificate = well });
        Recovers(trial, desk, new SmtpScript());
        foreach (var bad in new[] { authority.Issue("localhost", daysLeft: -1), authority.Issue("mail.example.org"), stranger.Issue("localhost") })
        {
            Recovers(trial, desk, new SmtpScript { Certificate = bad });
            bad.Dispose();
        }
    }

    private static void Login(Trial trial)
    {
        using var desk = MailDesk.Open(
            trial,
            section: $"none, \"user\": \"loadwatch\", \"password_file\": \"{MailDesk.Secret}\"",
            well: new SmtpScript { Login = "235 2.7.0 welcome" });
        Recovers(trial, desk, new SmtpScript { Login = "535 5.7.8 no" }, place => File.WriteAllText(place.At(MailDesk.Secret), "the new one\n"));
        Trial.MustBe(1, desk.Server.Logins.Count(login => login == "the new one"), "logins with the new password");
    }

    private static void Slow(Trial trial)
    {
        using var desk = MailDesk.Open(trial, seconds: ShortDeadline);
        Recovers(trial, desk, new SmtpScript { Drip = TimeSpan.FromMilliseconds(400) });
        Recovers(trial, desk, new SmtpScript { Banner = null });
        desk.Server.Script = new SmtpScript { ToMessage = _ => SmtpScript.Silence };
        using var place = desk.Night();
        place.SweepWell();
        desk.MustHaveTaken(0);
        trial.Figure("further copies", desk.MustSendTheRest(place, furtherCopies: 1));
        trial.Survived();
    }

    private static void Expired(Trial trial)
    {
        using var desk = MailDesk.Open(trial);
        desk.Server.Script = new SmtpScript { Banner = SmtpScript.Cut };
        using var place = desk.Night();
        place.SweepWell();
        place.AgeWaits(SixDays);
        MustSay(place.SweepWell().Errors, "given up");
        MustSay(place.Command("status").Output, "given up after five days");
        desk.MustHaveTaken(0);
        trial.Survived();
    }

    private static void MustSay(string said, string wanted)
    {
        if (!said.Contains(wanted, StringComparison.Ordinal))
        {
            throw new ChaosFailureException($"\"{wanted}\" is not said, but: {said}");
        }
    }
}
