namespace LoadWatch.Chaos.Mail;

/// <summary>What a server got against what it gets when nothing disturbs: every message, and copies only under the Message-ID of the first (I-7).</summary>
public sealed class MailCheck(ScriptedServer server)
{
    private IReadOnlyDictionary<string, string> wanted = new Dictionary<string, string>();

    /// <summary>Runs what is undisturbed and remembers its mails.</summary>
    public T Undisturbed<T>(Func<T> run)
    {
        ArgumentNullException.ThrowIfNull(run);
        server.Forget();
        var result = run();
        wanted = Taken().ToDictionary(mail => mail.MessageId, mail => mail.Content, StringComparer.Ordinal);
        return wanted.Count > 0 ? result : throw new ChaosFailureException("an undisturbed run sends no mail");
    }

    /// <param name="atMost">Copies beyond the first that are forgiven: one for each cut or kill.</param>
    /// <returns>How many there were.</returns>
    /// <exception cref="ChaosFailureException">A mail is lost, differs, or came too often.</exception>
    public int MustHold(int atMost)
    {
        var taken = Taken();
        var lost = wanted.Keys.Except(taken.Select(mail => mail.MessageId), StringComparer.Ordinal).ToList();
        var other = taken.Where(mail => wanted.GetValueOrDefault(mail.MessageId) != mail.Content).Select(mail => mail.MessageId).Distinct(StringComparer.Ordinal).ToList();
        var copies = taken.Count - wanted.Count;
        return (lost.Count, other.Count) == (0, 0) && copies <= atMost
            ? copies
            : throw new ChaosFailureException($"mails: {lost.Count} lost, {other.Count} with another text or name, {copies} further copies where {atMost} may be");
    }

    /// <summary>Those the server took, and those whose taking the sender could not learn of.</summary>
    private List<ReceivedMail> Taken() =>
        [.. server.Received.Where(mail => mail.Answer is null or SmtpScript.Cut or SmtpScript.Silence)];
}
