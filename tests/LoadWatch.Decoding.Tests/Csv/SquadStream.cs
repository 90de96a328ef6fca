using System.Text;

namespace LoadWatch.Decoding.Tests.Csv;

/// <summary>
/// A CSV of any size that is made while it is read: a squad's session of ten minutes a day at ten rows a second, day after day. Nothing of it is held but
/// one session.
/// </summary>
internal sealed class SquadStream(int people, int days) : Stream
{
    public const string Header = "player,time,speed,heart rate\n";
    public const int RowsOfSession = 6000;

    private static readonly DateTime FirstDay = new(2020, 1, 1, 0, 0, 0, DateTimeKind.Utc);

    private readonly byte[] session = Session(people);
    private long position;
    private int written = -1;

    public override bool CanRead => true;

    public override bool CanSeek => true;

    public override bool CanWrite => false;

    public override long Length => Header.Length + ((long)session.Length * days);

    public override long Position
    {
        get => position;
        set => position = value;
    }

    public override int Read(Span<byte> buffer)
    {
        if (position < Header.Length)
        {
            return Copy(Encoding.ASCII.GetBytes(Header).AsSpan((int)position), buffer);
        }

        var (day, at) = Math.DivRem(position - Header.Length, session.Length);
        if (day >= days)
        {
            return 0;
        }

        Date((int)day);
        return Copy(session.AsSpan((int)at), buffer);
    }

    public override int Read(byte[] buffer, int offset, int count) => Read(buffer.AsSpan(offset, count));

    public override long Seek(long offset, SeekOrigin origin) => throw new NotSupportedException();

    public override void SetLength(long value) => throw new NotSupportedException();

    public override void Write(byte[] buffer, int offset, int count) => throw new NotSupportedException();

    public override void Flush()
    {
    }

    private int Copy(ReadOnlySpan<byte> from, Span<byte> buffer)
    {
        var count = Math.Min(from.Length, buffer.Length);
        from[..count].CopyTo(buffer);
        position += count;
        return count;
    }

    /// <summary>Every row has the same length, so the date stands at the same place in each.</summary>
    private void Date(int day)
    {
        if (day == written)
        {
            return;
        }

        var date = Encoding.ASCII.GetBytes(FirstDay.AddDays(day).ToString("yyyy-MM-dd"));
        var row = session.Length / (people * RowsOfSession);
        for (var at = "Pod 01,".Length; at < session.Length; at += row)
        {
            date.CopyTo(session, at);
        }

        written = day;
    }

    private static byte[] Session(int people)
    {
        var text = new StringBuilder();
        for (var row = 0; row < RowsOfSession; row++)
        {
            for (var person = 1; person <= people; person++)
            {
                text.Append($"Pod {person:00},2020-01-01T18:{row / 600:00}:{row / 10 % 60:00}.{row % 10}Z,{row % 70 / 10.0:0.00},{120 + (row % 50):000}\n");
            }
        }

        return Encoding.ASCII.GetBytes(text.ToString());
    }
}
