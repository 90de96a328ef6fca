using LoadWatch.Chaos.Digests;
using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Mail;
using LoadWatch.Chaos.Places;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>A mail server, a place prepared for a night whose briefs go to it, and what comes of that night when nothing disturbs.</summary>
internal sealed class MailDesk : IDisposable
{
    /// <summary>The file of the mail server's password.</summary>
    public const string Secret = "mail.secret";

    private readonly SmtpScript well;
    private readonly Place prepared;
    private readonly MailCheck mails;
    private readonly Digest undisturbed;

    private MailDesk(ScriptedServer server, Place prepared, Nights nights)
    {
        (Server, well, this.prepared, mails) = (server, server.Script, prepared, new MailCheck(server));
        undisturbed = mails.Undisturbed(() => Trial.Undisturbed(prepared, nights));
        prepared.Fill(nights.Tonight);
    }

    public ScriptedServer Server { get; }

    /// <param name="section">Security and more keys, as <c>none</c> or <c>starttls, "user": "x"</c>; null for clear text.</param>
    /// <param name="well">How the server behaves when nothing is wrong with it.</param>
    public static MailDesk Open(Trial trial, int contacts = 1, string? section = null, SmtpScript? well = null, string take = "leave", int seconds = ScriptedServer.PatientSeconds)
    {
        var server = new ScriptedServer(well);
        var words = (section ?? "none").Split(',', 2);
        var nights = Nights.OneFile(Clock.Machine, trial.Seed);
        var place = trial.NewPlace(Clock.Machine, new PlaceOptions(take, Mail: server.Secured(words[0], seconds, words.Length > 1 ? "," + words[1] : ""), Contacts: contacts));
        WriteSecret(place);
        place.Prepare(nights);
        return new MailDesk(server, place, nights);
    }

    /// <summary>The night before its sweep, with the server's memory empty; the caller disposes it.</summary>
    public Place Night()
    {
        Server.Forget();
        return prepared.Copy();
    }

    public void MustHaveTaken(int mails) => Trial.MustBe(mails, Server.Received.Count(mail => mail.Answer is null), "mails taken");

    /// <summary>The server well again and the waits over, one more sweep sends what is left, and all is as if nothing had been.</summary>
    /// <param name="skipsWaits">False where none can be: opening the store would mend what a kill left, and that is the service's to do.</param>
    /// <returns>Copies beyond the first.</returns>
    public int MustSendTheRest(Place place, int furtherCopies, bool skipsWaits = true)
    {
        Server.Script = well;
        if (skipsWaits)
        {
            place.SkipWaits();
        }

        Trial.MustConverge(place, undisturbed);
        return mails.MustHold(furtherCopies);
    }

    public void Dispose()
    {
        prepared.Dispose();
        Server.Dispose();
    }

    private static void WriteSecret(Place place)
    {
        var path = place.At(Secret);
        File.WriteAllText(path, "the old one\n");
        if (!OperatingSystem.IsWindows())
        {
            File.SetUnixFileMode(path, UnixFileMode.UserRead | UnixFileMode.UserWrite);
        }
    }
}
