using System.Globalization;
using System.Text;
using LoadWatch.Notices;

namespace LoadWatch.Delivery.Log;

/// <summary>
/// Notices as lines of one file a month, <c>notices-2026-03.txt</c>. It only grows; a notice that it holds whole is not written again.
/// </summary>
public sealed class NoticeFile(string folder) : INoticeChannel
{
    public string Name => "log";

    public ChannelOutcome Deliver(Notice notice, string recipient) => Append(folder, notice);

    public static ChannelOutcome Append(string folder, Notice notice) =>
        PrivateFolder.Use(folder, () => AppendTo(Path.Combine(folder, NameOf(notice)), notice));

    private static string NameOf(Notice notice) => $"notices-{notice.Date.ToString("uuuu-MM", CultureInfo.InvariantCulture)}.txt";

    private static void AppendTo(string path, Notice notice)
    {
        using var file = new FileStream(path, PrivateFolder.Options(FileMode.OpenOrCreate, FileAccess.ReadWrite));
        var bytes = ReadAll(file);
        var text = Encoding.UTF8.GetString(bytes);
        if (NoticeLines.Hold(EndedLines(text), notice))
        {
            // The flush of the attempt that wrote it may have failed. The system then takes what it could not write for written, and a flush alone would say
            // yes to that: the same bytes once more, so that there is something to write.
            file.Seek(0, SeekOrigin.Begin);
            file.Write(bytes);
        }
        else
        {
            file.Seek(0, SeekOrigin.End);
            file.Write(Encoding.UTF8.GetBytes(Block(text, notice)));
        }

        file.Flush(flushToDisk: true);
    }

    private static byte[] ReadAll(FileStream file)
    {
        var bytes = new byte[file.Length];
        file.ReadExactly(bytes);
        return bytes;
    }

    /// <summary>Lines with their end; a last one without may be cut.</summary>
    private static string[] EndedLines(string text) => text.ReplaceLineEndings("\n").Split('\n')[..^1];

    private static string Block(string text, Notice notice)
    {
        var start = text.Length == 0 || text[^1] == '\n' ? "" : "\n";
        return start + string.Join('\n', NoticeLines.Of(notice)) + "\n";
    }
}
