using System.Diagnostics;
using System.Globalization;
using System.Net.Sockets;
using System.Text;
using LoadWatch.Service.Tests.Pipeline;

namespace LoadWatch.Service.Tests.Health;

/// <summary>
/// <c>loadwatch run</c> as systemd starts it, without systemd: its parent is a shell that calls itself <c>systemd</c>, and a socket listens to what it
/// notifies. The runtime looks at the parent's name, not only at the variable.
/// </summary>
internal sealed class SupervisedService : IDisposable
{
    private const string Parent = """
        printf systemd >"/proc/$$/comm" || exit 99
        "$@" >/dev/null 2>&1 &
        echo $!
        wait $!
        echo $?
        """;

    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(90);

    private readonly Socket socket = new(AddressFamily.Unix, SocketType.Dgram, ProtocolType.Unspecified);
    private readonly CancellationTokenSource patience = CancellationTokenSource.CreateLinkedTokenSource(TestContext.Current.CancellationToken);
    private readonly Process parent;

    /// <param name="folder">A working folder; the socket comes to lie in it.</param>
    /// <param name="watchdog">How long this systemd waits for a ping.</param>
    public SupervisedService(string folder, TimeSpan watchdog)
    {
        patience.CancelAfter(Patience);
        var path = Path.Combine(folder, "notify");
        socket.Bind(new UnixDomainSocketEndPoint(path));
        string[] words = ["-c", Parent, "systemd", .. Loadwatch.Program, "run", "--config", Path.Combine(folder, "loadwatch.json")];
        var start = new ProcessStartInfo("bash", words) { UseShellExecute = false, RedirectStandardOutput = true };
        start.Environment["NOTIFY_SOCKET"] = path;
        start.Environment["WATCHDOG_USEC"] = watchdog.TotalMicroseconds.ToString(CultureInfo.InvariantCulture);
        parent = Process.Start(start)!;
    }

    public static bool IsPossible => OperatingSystem.IsLinux() && Tool.IsThere("bash") && Tool.IsThere("dotnet") && File.Exists("/proc/self/comm");

    /// <summary>Waits for a message; others that come before it are passed over.</summary>
    public async Task Hears(string wanted)
    {
        var heard = new List<string>();
        var buffer = new byte[4096];
        try
        {
            do
            {
                heard.Add(Encoding.UTF8.GetString(buffer, 0, await socket.ReceiveAsync(buffer, patience.Token)));
            }
            while (!heard[^1].Split('\n').Contains(wanted, StringComparer.Ordinal));
        }
        catch (OperationCanceledException)
        {
            Assert.Fail($"{wanted} did not come, but: {string.Join(", ", heard)}");
        }
    }

    /// <summary>Process id of the service.</summary>
    public async Task<int> Id() => int.Parse((await parent.StandardOutput.ReadLineAsync(patience.Token))!, CultureInfo.InvariantCulture);

    /// <summary>Waits for the end of the service.</summary>
    public async Task<int> ExitCode() => int.Parse((await parent.StandardOutput.ReadLineAsync(patience.Token))!, CultureInfo.InvariantCulture);

    public void Dispose()
    {
        if (!parent.HasExited)
        {
            parent.Kill(entireProcessTree: true);
        }

        parent.Dispose();
        socket.Dispose();
        patience.Dispose();
    }
}
