using System.Net.Sockets;

namespace LoadWatch.Delivery.Mail;

/// <summary>
/// The line to the server, cut when more comes back than answers need: the mail library keeps an endless answer in memory, 250 MB in half a second
/// as measured, and whoever sends it need not have shown a certificate yet (I-11).
/// </summary>
internal sealed class ServerStream(NetworkStream line) : Stream
{
    /// <summary>Bytes of all answers and of TLS around them.</summary>
    public const int AnswersAtMost = 1 << 20;

    private long received;

    public override bool CanRead => true;

    public override bool CanSeek => false;

    public override bool CanWrite => true;

    public override bool CanTimeout => true;

    public override int ReadTimeout
    {
        get => line.ReadTimeout;
        set => line.ReadTimeout = value;
    }

    public override int WriteTimeout
    {
        get => line.WriteTimeout;
        set => line.WriteTimeout = value;
    }

    public override long Length => throw new NotSupportedException();

    public override long Position
    {
        get => throw new NotSupportedException();
        set => throw new NotSupportedException();
    }

    /// <exception cref="SocketException">The server cannot be reached.</exception>
    public static async Task<ServerStream> Open(string host, int port, CancellationToken cancel)
    {
        var socket = new Socket(SocketType.Stream, ProtocolType.Tcp) { NoDelay = true };
        try
        {
            await socket.ConnectAsync(host, port, cancel);
            return new ServerStream(new NetworkStream(socket, ownsSocket: true));
        }
        catch
        {
            socket.Dispose();
            throw;
        }
    }

    public override int Read(byte[] buffer, int offset, int count) => Counted(line.Read(buffer, offset, count));

    public override async ValueTask<int> ReadAsync(Memory<byte> buffer, CancellationToken cancellationToken = default) =>
        Counted(await line.ReadAsync(buffer, cancellationToken));

    public override Task<int> ReadAsync(byte[] buffer, int offset, int count, CancellationToken cancellationToken) =>
        ReadAsync(buffer.AsMemory(offset, count), cancellationToken).AsTask();

    public override void Write(byte[] buffer, int offset, int count) => line.Write(buffer, offset, count);

    public override ValueTask WriteAsync(ReadOnlyMemory<byte> buffer, CancellationToken cancellationToken = default) =>
        line.WriteAsync(buffer, cancellationToken);

    public override Task WriteAsync(byte[] buffer, int offset, int count, CancellationToken cancellationToken) =>
        line.WriteAsync(buffer, offset, count, cancellationToken);

    public override void Flush() => line.Flush();

    public override long Seek(long offset, SeekOrigin origin) => throw new NotSupportedException();

    public override void SetLength(long value) => throw new NotSupportedException();

    protected override void Dispose(bool disposing)
    {
        if (disposing)
        {
            line.Dispose();
        }

        base.Dispose(disposing);
    }

    private int Counted(int bytes)
    {
        received += bytes;
        return received <= AnswersAtMost ? bytes : throw new IOException("the server's answers have no end");
    }
}
