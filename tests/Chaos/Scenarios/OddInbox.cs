using System.Net.Sockets;
using LoadWatch.Chaos.Inputs;
using LoadWatch.Chaos.Places;
using LoadWatch.Chaos.Processes;
using NodaTime;

namespace LoadWatch.Chaos.Scenarios;

/// <summary>Fills an inbox with everything that is no plain good file, and with good files under every name.</summary>
internal sealed class OddInbox(Place place, Nights nights) : IDisposable
{
    private static readonly string[] Names =
    [
        "new\nline.fit", "\"quoted\" 'and' `ticks`.fit", "semi;colon $(id) & pipe|.fit", "right\u202Eto left.fit", "\u001b[31mred.fit", "tab\tand\rreturn.fit",
        new string('n', 251) + ".fit", "bike 🚴.fit", "caf\u00e9.fit", "cafe\u0301.fit", "A.FIT", "a.fit", "CON", "NUL.fit", "ends with a dot.", "ends with a space ",
        "-rf.fit", "%s%n{0}${jndi:x}.fit", "'; DROP TABLE activity; --.fit", "=cmd.fit", "back\\slash.fit", "back/slash.fit", "folder.fit/inside.fit",
    ];

    private static readonly string[] Unfinished =
        [".hidden.fit", "._ride.fit", ".DS_Store", "ride.fit.part", "ride.fit.crdownload", "ride.fit.tmp", "~$table.csv", ".folder/ride.fit"];

    /// <summary>A byte that no UTF-8 text holds; no name of .NET can say it.</summary>
    private const string NotText = "$1/anna/$(printf 'bad\\377.fit')";

    private readonly FreeSessions sessions = new(nights);
    private readonly List<string> passedOver = [];
    private readonly List<Socket> sockets = [];
    private readonly Random strangers = new(1);
    private TrueSession? stopped;

    public int Count { get; private set; }

    public void AddNames()
    {
        foreach (var name in Names)
        {
            Good("anna/" + name, Files.Fit(sessions.Next("anna")));
        }
    }

    /// <summary>Of no account: what counts is that they stand still.</summary>
    public void AddTimes()
    {
        foreach (var year in new[] { 1970, 2099 })
        {
            File.SetLastWriteTimeUtc(Good($"cara/written {year}.fit", Files.Fit(sessions.Next("cara"))), new DateTime(year, 1, 2, 0, 0, 0, DateTimeKind.Utc));
        }
    }

    /// <summary>Twice from devices and once as a table.</summary>
    public void AddSameSession()
    {
        var session = sessions.Next("bo");
        Good("bo/watch.fit", Files.Fit(session));
        Good("bo/again.fit", Files.Fit(session, product: 2));
        Good("bo/export.csv", Files.Csv(session));
    }

    public void AddEmpty()
    {
        Put("anna/empty.fit", nights.Truth.Must(Truth.Refused, []));
        Put("anna/one byte.csv", nights.Truth.Must(Truth.Refused, [(byte)'x']));
    }

    public void AddNoFiles()
    {
        var plain = Good("anna/plain.fit", Files.Fit(sessions.Next("anna")));
        place.Put("../elsewhere.fit", Files.Fit(NotCounted()));
        Link("anna/accounts.fit", "/etc/passwd");
        Link("anna/elsewhere.fit", place.At("elsewhere.fit"));
        Link("anna/around", "..");
        Link("anna/nowhere.fit", "/nowhere");
        Make("ln", plain, Path.Combine(place.Inbox, "anna/hard link.fit"));
        Make("mkfifo", PassedOver("anna/pipe.fit"));
        Make("mknod", PassedOver("anna/device.fit"), "c", "1", "5");
        Make("sh", "-c", $"cp \"$2\" \"{NotText}\"", "sh", place.Inbox, plain);
        var socket = new Socket(AddressFamily.Unix, SocketType.Stream, ProtocolType.Unspecified);
        socket.Bind(new UnixDomainSocketEndPoint(PassedOver("anna/socket.fit")));
        sockets.Add(socket);
        Count++;
    }

    /// <summary>Copies under way, and one that stopped.</summary>
    public void AddUnfinished()
    {
        foreach (var name in Unfinished)
        {
            Put("cara/" + name, Files.Fit(NotCounted()));
            passedOver.Add(Path.Combine(place.Inbox, "cara", name));
        }

        Put("cara/late.fit.tmp", Files.Fit(sessions.Next("cara")));
        Put("bo/changed.fit", Files.Fit(sessions.Next("bo")));
        Sets("sets.csv", 80);
        stopped = NotCounted();
        File.SetLastWriteTimeUtc(Put("anna/stopped.fit", Half(stopped)), place.Clock.Now.ToDateTimeUtc());
    }

    /// <summary>One copy gets its name, two files get another content, and the copy that stopped has stood still.</summary>
    public void Finish()
    {
        var late = Path.Combine(place.Inbox, "cara/late.fit");
        nights.Truth.Must(Truth.Stored, File.ReadAllBytes(late + ".tmp"));
        File.Move(late + ".tmp", late);
        Good("bo/changed.fit", Files.Fit(sessions.Next("bo")));
        Sets("sets.csv", 100);
        nights.Truth.Lifts("bo", place.Clock.Today.PlusDays(-1), 8 * 100);
        place.Put("anna/stopped.fit", nights.Truth.Must(Truth.Refused, Half(stopped!)));
    }

    public void RemoveWhatWasPassedOver()
    {
        passedOver.ForEach(File.Delete);
        RemoveUnreadable();
        passedOver.Clear();
    }

    public void Dispose()
    {
        sockets.ForEach(socket => socket.Dispose());
        RemoveUnreadable();
    }

    private static byte[] Half(TrueSession session) => Files.Fit(session) is var bytes ? bytes[..(bytes.Length / 2)] : [];

    private TrueSession NotCounted() =>
        TrueSession.Make("anna", place.Clock.Today.PlusDays(-40), LocalTime.Noon.PlusMinutes(10 * Count++), place.Clock.TimeZone, strangers);

    private void Sets(string path, int kilograms) => Put(path, Files.Text(
        $"date,person,exercise,set,repetitions,kilograms\n{NodaTime.Text.LocalDatePattern.Iso.Format(place.Clock.Today.PlusDays(-1))},bo,leg_press,1,8,{kilograms}\n"));

    private string Good(string path, byte[] bytes) => Put(path, nights.Truth.Must(Truth.Stored, bytes));

    private string Put(string path, byte[] bytes)
    {
        Count++;
        return place.Put(path, bytes);
    }

    private string PassedOver(string path)
    {
        var full = Path.Combine(place.Inbox, path);
        passedOver.Add(full);
        return full;
    }

    private void Link(string path, string to)
    {
        File.CreateSymbolicLink(PassedOver(path), to);
        Count++;
    }

    private void Make(string program, params IEnumerable<string> words) => Count += Tool.Run(program, words) ? 1 : 0;

    private void RemoveUnreadable() => Tool.Run("sh", "-c", $"rm -f \"{NotText}\"", "sh", place.Inbox);
}
