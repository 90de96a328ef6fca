using System.Text;
using NodaTime;

namespace LoadWatch.Service.Demo;

/// <summary>Tables as text.</summary>
internal static class DemoTable
{
    public static byte[] Bytes(string header, IEnumerable<string> lines) => Encoding.UTF8.GetBytes(string.Join('\n', lines.Prepend(header)) + "\n");

    /// <summary>A version of a table, written in the night before a morning.</summary>
    public static DemoFile File(string path, string header, IEnumerable<string> lines, LocalDate morning) =>
        new(path, Bytes(header, lines), DemoCalendar.Written(morning));
}
