using System.Net.Security;
using System.Text;

namespace LoadWatch.Chaos.Mail;

/// <summary>One connection, RFC 5321 as far as a sender of single messages needs it.</summary>
internal sealed class SmtpConversation
{
    private const int EndlessBlock = 65536;

    private readonly ScriptedServer server;
    private readonly SmtpScript script;
    private readonly int number;
    private readonly List<string> recipients = [];
    private Stream line;
    private bool isSecured;

    /// <param name="number">Of the connection, from 1.</param>
    public SmtpConversation(ScriptedServer server, Stream line, int number)
    {
        (this.server, this.line, this.number) = (server, line, number);
        script = server.Script;
    }

    public void Run()
    {
        if (script.Banner is null)
        {
            Babble();
        }

        var goesOn = Say(script.Banner!);
        while (goesOn && ReadLine() is { } said)
        {
            goesOn = Answer(said);
        }
    }

    private bool Answer(string said) => said.Split(' ', ':')[0].ToUpperInvariant() switch
    {
        "EHLO" or "HELO" => Say($"250-chaos.example.org\r\n{Offers()}250 8BITMIME"),
        "STARTTLS" when script.Certificate is not null => Say("220 go ahead") && Encrypt(),
        "AUTH" => LogIn(said),
        "MAIL" => Say(script.ToSender(number) ?? "250 sender ok"),
        "RCPT" => Recipient(said),
        "DATA" => Say("354 go on") && Say(server.Keep(ReadMessage(), [.. recipients]) ?? "250 taken"),
        "QUIT" => Say("221 bye") && false,
        _ => Say("250 ok"),
    };

    private string Offers() =>
        (script.Certificate is not null && !isSecured ? "250-STARTTLS\r\n" : "") + (script.Login is not null ? "250-AUTH PLAIN\r\n" : "");

    private bool Encrypt()
    {
        var secured = new SslStream(line);
        secured.AuthenticateAsServer(script.Certificate!);
        (line, isSecured) = (secured, true);
        return true;
    }

    private bool LogIn(string said)
    {
        server.KeepLogin(said.Split(' ')[^1]);
        return Say(script.Login ?? "504 no login here");
    }

    private bool Recipient(string said)
    {
        var address = said[(said.IndexOf('<', StringComparison.Ordinal) + 1)..].Split('>')[0];
        var answer = script.ToRecipient(address);
        if (answer is null)
        {
            recipients.Add(address);
        }

        return Say(answer ?? "250 recipient ok");
    }

    /// <exception cref="EndOfStreamException">The sender went before the final dot: there is no message (RFC 5321, 4.1.1.4).</exception>
    private byte[] ReadMessage()
    {
        using var message = new MemoryStream();
        for (var text = ReadWholeLine(); text != "."; text = ReadWholeLine())
        {
            message.Write(Encoding.Latin1.GetBytes(text.StartsWith('.') ? text[1..] : text));
            message.Write("\r\n"u8);
        }

        return message.ToArray();
    }

    /// <returns>False when the conversation is over.</returns>
    private bool Say(string answer)
    {
        switch (answer)
        {
            case SmtpScript.Cut:
                return false;
            case SmtpScript.Silence:
                line.ReadByte();
                return false;
            default:
                Write(Encoding.ASCII.GetBytes(answer + "\r\n"));
                return !answer.StartsWith("421", StringComparison.Ordinal);
        }
    }

    private void Write(byte[] bytes)
    {
        if (script.Drip == TimeSpan.Zero)
        {
            line.Write(bytes);
            return;
        }

        foreach (var one in bytes)
        {
            line.WriteByte(one);
            line.Flush();
            Thread.Sleep(script.Drip);
        }
    }

    private void Babble()
    {
        var block = Encoding.ASCII.GetBytes(new string('x', EndlessBlock));
        line.Write("220-"u8);
        while (true)
        {
            line.Write(block);
        }
    }

    private string ReadWholeLine() => ReadLine() ?? throw new EndOfStreamException();

    private string? ReadLine()
    {
        var text = new StringBuilder();
        for (var one = line.ReadByte(); one >= 0; one = line.ReadByte())
        {
            if (one == '\n')
            {
                return text.ToString().TrimEnd('\r');
            }

            text.Append((char)one);
        }

        return null;
    }
}
