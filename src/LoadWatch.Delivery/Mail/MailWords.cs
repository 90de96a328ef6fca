
namespace LoadWatch.Delivery.Mail;

/// <summary>A server's answer as it may stand in a log: one line, no address, no secret, not long (I-12).</summary>
internal sealed class MailWords(MailSettings settings)
{
    private const int LengthAtMost = 200;

    /// <summary>What was said last, or empty.</summary>
    public string LastAnswer { get; private set; } = "";

    public string Of(string answer)
    {
        var words = OneLine.Of(answer).Split(' ').Select(word => word.Contains('@', StringComparison.Ordinal) ? "(address)" : word);
        var line = Without(settings.Password, Without(settings.User, string.Join(' ', words)));
        LastAnswer = line.Length > LengthAtMost ? line[..LengthAtMost] + "..." : line;
        return LastAnswer;
    }

    private static string Without(string? secret, string line) =>
        string.IsNullOrEmpty(secret) ? line : line.Replace(secret, "(hidden)", StringComparison.Ordinal);
}
