using System.Buffers;
using System.Net;
using System.Security.Cryptography.X509Certificates;
using SmtpServer;
using SmtpServer.Authentication;
using SmtpServer.Mail;
using SmtpServer.Net;
using SmtpServer.Protocol;
using SmtpServer.Storage;

namespace LoadWatch.Delivery.Tests.Mail;

/// <summary>A real mail server on a free port of this machine.</summary>
internal sealed class MailServer : IAsyncDisposable
{
    public const string User = "loadwatch";
    public const string Password = "Tr0ub4dor-canary";

    private readonly CancellationTokenSource end = new();
    private readonly Task serving;

    private MailServer(SmtpServer.SmtpServer server, Desk desk)
    {
        serving = server.StartAsync(end.Token);
        Seen = desk;
    }

    public int Port { get; private set; }

    public Desk Seen { get; }

    /// <param name="certificate">Null for a server that cannot speak TLS.</param>
    /// <param name="answer">Answers the message of a number, from 1; null takes it.</param>
    /// <param name="largest">Bytes of the largest message taken.</param>
    public static async Task<MailServer> Start(
        X509Certificate2? certificate, Func<int, SmtpResponse?>? answer = null, bool login = false, bool tlsFromStart = false, int? largest = null)
    {
        var desk = new Desk(answer ?? (_ => null));
        var started = new TaskCompletionSource<int>();
        var listeners = new EndpointListenerFactory();
        listeners.EndpointStarted += (_, e) => started.TrySetResult(((IPEndPoint)e.LocalEndPoint).Port);
        var services = new SmtpServer.ComponentModel.ServiceProvider();
        services.Add((IMessageStore)desk);
        services.Add((IMailboxFilter)desk);
        services.Add((IUserAuthenticator)desk);
        services.Add(listeners);
        var options = new SmtpServerOptionsBuilder().ServerName("test.example.org");
        if (largest is { } bytes)
        {
            options = options.MaxMessageSize(bytes);
        }

        options = options.Endpoint(endpoint =>
        {
            endpoint.Endpoint(new IPEndPoint(IPAddress.Loopback, 0)).AuthenticationRequired(login).AllowUnsecureAuthentication(false).IsSecure(tlsFromStart);
            if (certificate is not null)
            {
                endpoint.Certificate(certificate);
            }
        });
        var server = new MailServer(new SmtpServer.SmtpServer(options.Build(), services), desk);
        server.Port = await started.Task;
        return server;
    }

    public async ValueTask DisposeAsync()
    {
        await end.CancelAsync();
        try
        {
            await serving;
        }
        catch (OperationCanceledException)
        {
            // That is how it ends.
        }

        end.Dispose();
    }
}

/// <summary>What the server was given, and how it answers.</summary>
internal sealed class Desk(Func<int, SmtpResponse?> answer) : IMessageStore, IMailboxFilter, IUserAuthenticator
{
    public const string Stranger = "nobody@example.org";
    public const string Banned = "banned@example.org";

    /// <summary>A message that is taken, after which the line goes dead before the answer.</summary>
    public static readonly SmtpResponse HangUp = new((SmtpReplyCode)999, "");

    /// <summary>Every message whose final dot came, refused ones too.</summary>
    public List<byte[]> Messages { get; } = [];

    public List<string> Passwords { get; } = [];

    public Task<SmtpResponse> SaveAsync(
        ISessionContext context, IMessageTransaction transaction, ReadOnlySequence<byte> buffer, CancellationToken cancellationToken)
    {
        Messages.Add(buffer.ToArray());
        var reply = answer(Messages.Count) ?? SmtpResponse.Ok;
        if (reply == HangUp)
        {
            ((IDisposable)context.Pipe!).Dispose();
            throw new IOException("the line is dead");
        }

        return Task.FromResult(reply);
    }

    public Task<bool> CanAcceptFromAsync(ISessionContext context, IMailbox from, int size, CancellationToken cancellationToken) =>
        from.AsAddress() == Banned
            ? throw new SmtpResponseException(new SmtpResponse((SmtpReplyCode)550, $"<{Banned}> may not send here"))
            : Task.FromResult(true);

    public Task<bool> CanDeliverToAsync(ISessionContext context, IMailbox to, IMailbox from, CancellationToken cancellationToken) =>
        to.AsAddress() == Stranger
            ? throw new SmtpResponseException(new SmtpResponse((SmtpReplyCode)550, $"5.1.1 <{Stranger}> no such user here"))
            : Task.FromResult(true);

    public Task<bool> AuthenticateAsync(ISessionContext context, string user, string password, CancellationToken cancellationToken)
    {
        Passwords.Add(password);
        return Task.FromResult(user == MailServer.User && password == MailServer.Password);
    }
}
