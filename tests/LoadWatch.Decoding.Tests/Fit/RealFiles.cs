using System.Globalization;
using NodaTime;
using NodaTime.Text;

namespace LoadWatch.Decoding.Fit;

/// <summary>
/// Recordings of real devices, published as test data of FIT libraries, with the values an independent decoder (fitdecode, MIT) gives. They are not
/// part of the project: a folder named by LOADWATCH_REAL_FIT, or ../shared/fit beside the repository, may hold them.
/// </summary>
internal static class RealFiles
{
    private static readonly string? Folder = Find();

    private static readonly Dictionary<string, RealFile> Known = Folder is null ? [] : Read(Path.Combine(Folder, "expected.csv"));

    /// <summary>One row without a file where there are none, so that the tests are seen to be skipped.</summary>
    public static TheoryData<string> Names(Func<RealFile, bool> wanted) =>
        Known.Count == 0 ? ["absent"] : [.. Known.Values.Where(wanted).Select(file => file.Name)];

    public static RealFile Get(string name)
    {
        Assert.SkipWhen(Folder is null, $"real FIT files are not on this machine ({name})");
        return Known[name];
    }

    /// <summary>Full paths of all files; empty where there are none.</summary>
    public static IReadOnlyList<string> Paths => [.. Known.Keys.Order(StringComparer.Ordinal).Select(name => Path.Combine(Folder!, "files", name))];

    public static byte[] Bytes(string name) => File.ReadAllBytes(Path.Combine(Folder!, "files", name));

    private static string? Find()
    {
        if (Environment.GetEnvironmentVariable("LOADWATCH_REAL_FIT") is { Length: > 0 } stated)
            return stated;

        for (var folder = new DirectoryInfo(AppContext.BaseDirectory); folder is not null; folder = folder.Parent)
        {
            var beside = Path.Combine(folder.FullName, "..", "shared", "fit");
            if (File.Exists(Path.Combine(folder.FullName, "LoadWatch.sln")) && File.Exists(Path.Combine(beside, "expected.csv")))
                return beside;
        }

        return null;
    }

    private static Dictionary<string, RealFile> Read(string path)
    {
        var lines = File.ReadAllLines(path);
        var header = Cells(lines[0]);
        return lines.Skip(1)
            .Select(line => new RealFile(header.Zip(Cells(line)).ToDictionary(cell => cell.First, cell => cell.Second, StringComparer.Ordinal)))
            .ToDictionary(file => file.Name, StringComparer.Ordinal);
    }

    /// <summary>Only commas outside quotes separate: every second piece between quotes is inside them.</summary>
    private static string[] Cells(string line) =>
        string.Concat(line.Split('"').Select((piece, i) => i % 2 == 0 ? piece.Replace(',', '\n') : piece)).Split('\n');
}

internal sealed class RealFile(Dictionary<string, string> row)
{
    public string Name => row["file"];

    public string FileType => row["file_type"];

    /// <summary>Sports in the order of their sessions, each once, in lower case without separators: <c>swimming/openwater</c>.</summary>
    public IEnumerable<string> Sports => row["sport"].Split('|', StringSplitOptions.RemoveEmptyEntries).Select(sport => sport.ToLowerInvariant());

    public bool IsReference => row["reference"] == "reads it";

    public Instant? FirstRecord => InstantOf("first_record");

    public Instant? LastRecord => InstantOf("last_record");

    public int Int(string column) => int.Parse(row[column], CultureInfo.InvariantCulture);

    public double? Number(string column) => row[column].Length == 0 ? null : double.Parse(row[column], CultureInfo.InvariantCulture);

    private Instant? InstantOf(string column) =>
        row[column].Length == 0 ? null : OffsetDateTimePattern.ExtendedIso.Parse(row[column]).Value.ToInstant();
}
