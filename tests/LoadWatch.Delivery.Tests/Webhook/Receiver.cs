using System.Globalization;
using System.Net;
using System.Net.Sockets;
using System.Text;

namespace LoadWatch.Delivery.Tests.Webhook;

/// <summary>A web server in this process that takes one request a connection, keeps it and answers what it was told to.</summary>
internal sealed class Receiver : IDisposable
{
    private readonly TcpListener listener = new(IPAddress.Loopback, 0);
    private readonly Func<int, string?> answer;
    private readonly Task loop;

    /// <param name="answer">Status line and headers for the request with that number, from 1; null to say nothing at all; empty to hang up.</param>
    public Receiver(Func<int, string?> answer)
    {
        this.answer = answer;
        listener.Start();
        loop = Task.Run(Serve);
    }

    public List<ReceivedRequest> Requests { get; } = [];

    public Uri Address => new($"http://localhost:{((IPEndPoint)listener.LocalEndpoint).Port}/hooks/7");

    public void Dispose()
    {
        listener.Stop();
        loop.Wait();
        listener.Dispose();
    }

    private void Serve()
    {
        try
        {
            while (true)
            {
                using var client = listener.AcceptTcpClient();
                using var stream = client.GetStream();
                Requests.Add(Read(stream));
                if (answer(Requests.Count) is { } said)
                {
                    stream.Write(Encoding.ASCII.GetBytes(said));
                }
                else
                {
                    // Until the other side has had enough.
                    while (stream.ReadByte() >= 0)
                    {
                    }
                }
            }
        }
        catch (Exception e) when (e is SocketException or IOException or ObjectDisposedException or InvalidOperationException)
        {
            // Stopped.
        }
    }

    private static ReceivedRequest Read(NetworkStream stream)
    {
        var head = new StringBuilder();
        while (!head.ToString().EndsWith("\r\n\r\n", StringComparison.Ordinal))
        {
            head.Append((char)stream.ReadByte());
        }

        var lines = head.ToString().Split("\r\n", StringSplitOptions.RemoveEmptyEntries);
        var headers = lines.Skip(1).Select(line => line.Split(": ", 2)).ToDictionary(pair => pair[0], pair => pair[1], StringComparer.OrdinalIgnoreCase);
        var body = new byte[int.Parse(headers["Content-Length"], CultureInfo.InvariantCulture)];
        stream.ReadExactly(body);
        return new ReceivedRequest(lines[0], headers, body);
    }
}

internal sealed record ReceivedRequest(string Line, Dictionary<string, string> Headers, byte[] Body);
