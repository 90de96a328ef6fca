using System.Net;
using System.Net.Sockets;

namespace LoadWatch.Chaos.Mail;

/// <summary>A mail server on a free port of this machine that does as its script says and keeps every message whose final dot came.</summary>
public sealed class ScriptedServer : IDisposable
{
    /// <summary>A deadline for one message that only a server that never answers breaks.</summary>
    public const int PatientSeconds = 60;

    private readonly TcpListener listener = new(IPAddress.Loopback, 0);
    private readonly List<ReceivedMail> received = [];
    private readonly List<string> logins = [];
    private readonly List<Socket> open = [];
    private int connections;
    private volatile SmtpScript script;

    public ScriptedServer(SmtpScript? script = null)
    {
        this.script = script ?? new SmtpScript();
        listener.Start();
        Port = ((IPEndPoint)listener.LocalEndpoint).Port;
        new Thread(Listen) { IsBackground = true }.Start();
    }

    public int Port { get; }

    /// <summary>The section <c>mail</c> of a configuration that sends here in clear text, with a deadline that a busy machine does not break.</summary>
    public string Section => Secured("none", PatientSeconds);

    public int Connections => Volatile.Read(ref connections);

    public SmtpScript Script
    {
        get => script;
        set => script = value;
    }

    public IReadOnlyList<ReceivedMail> Received
    {
        get
        {
            lock (received)
            {
                return [.. received];
            }
        }
    }

    /// <summary>Passwords in the order in which they came.</summary>
    public IReadOnlyList<string> Logins
    {
        get
        {
            lock (received)
            {
                return [.. logins];
            }
        }
    }

    /// <param name="seconds">The deadline for one message.</param>
    /// <param name="more">More keys of the section, each with a comma before it.</param>
    public string Secured(string security, int seconds, string more = "") =>
        FormattableString.Invariant($"\"host\": \"localhost\", \"port\": {Port}, \"security\": \"{security}\", \"from\": \"LoadWatch <brief@example.org>\", \"timeout_seconds\": {seconds}{more}");

    /// <summary>Forgets what came, so that the next trial counts anew.</summary>
    public void Forget()
    {
        lock (received)
        {
            received.Clear();
            logins.Clear();
        }
    }

    public void Dispose()
    {
        listener.Dispose();
        lock (open)
        {
            open.ForEach(socket => socket.Dispose());
        }
    }

    /// <returns>The message's number, from 1.</returns>
    internal string? Keep(byte[] raw, IReadOnlyList<string> recipients)
    {
        lock (received)
        {
            var answer = script.ToMessage(received.Count + 1);
            received.Add(new ReceivedMail(raw, recipients, answer));
            return answer;
        }
    }

    /// <param name="initial">What came with AUTH PLAIN: three words parted by NUL, in Base64 (RFC 4616).</param>
    internal void KeepLogin(string initial)
    {
        lock (received)
        {
            logins.Add(System.Text.Encoding.UTF8.GetString(Convert.FromBase64String(initial)).Split('\0')[^1]);
        }
    }

    private void Listen()
    {
        try
        {
            while (true)
            {
                var socket = listener.AcceptSocket();
                var number = Interlocked.Increment(ref connections);
                lock (open)
                {
                    open.Add(socket);
                }

                new Thread(() => Serve(socket, number)) { IsBackground = true }.Start();
            }
        }
        catch (Exception e) when (e is SocketException or ObjectDisposedException or InvalidOperationException)
        {
            // The server ends.
        }
    }

    private void Serve(Socket socket, int number)
    {
        try
        {
            using var line = new NetworkStream(socket, ownsSocket: true);
            new SmtpConversation(this, line, number).Run();
        }
        catch (Exception e) when (e is IOException or SocketException or ObjectDisposedException or System.Security.Authentication.AuthenticationException)
        {
            // The other side went, or did not want our certificate.
        }
    }
}
