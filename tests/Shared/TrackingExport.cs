using System.Globalization;
using System.Text;

namespace LoadWatch;

/// <summary>The export of a tracking system after a team session: ten rows a second of every player, made from formulas, so that all of it is known.</summary>
/// <param name="Players">1 to 99.</param>
/// <param name="Seconds">Length of the session.</param>
internal sealed record TrackingExport(int Players, int Seconds)
{
    public const string Header = "player,time,speed,distance,heart rate,satellites";

    /// <summary>False: the rows of one moment stand together; true: those of one player.</summary>
    public bool InBlocks { get; init; }

    /// <summary>This one's pod writes kilometres an hour, from 0; null for nobody's.</summary>
    public int? WrongUnitPlayer { get; init; }

    public int RowsOfOne => Seconds * 10;

    public static string Name(int player) => string.Create(CultureInfo.InvariantCulture, $"Pod {player + 1:00}");

    /// <summary>A minute of standing, walking, jogging and one sprint, m/s with two digits; every player is elsewhere in it.</summary>
    public static double Speed(int player, int row) => Math.Round(
        ((row + (player * 70)) % 600) switch
        {
            < 150 => 0,
            < 400 and var walk => 1.2 + (0.3 * Math.Sin(walk / 20.0)),
            < 540 and var jog => 3 + (0.5 * Math.Sin(jog / 15.0)),
            var sprint => 4 + ((sprint - 540) * 0.06),
        },
        2);

    public static int HeartRate(int player, int row) => 120 + player + (row / 100 % 40);

    /// <summary>Fewer than six in every twentieth row.</summary>
    public static int Satellites(int player, int row) => (row + player) % 20 == 0 ? 4 : 11;

    public byte[] Text()
    {
        var text = new StringBuilder(Header).Append('\n');
        var metres = new double[Players];
        for (var line = 0; line < Players * RowsOfOne; line++)
        {
            var (player, row) = InBlocks ? (line / RowsOfOne, line % RowsOfOne) : (line % Players, line / Players);
            metres[player] += Speed(player, row) / 10;
            AppendRow(text, player, row, metres[player]);
        }

        return Encoding.UTF8.GetBytes(text.ToString());
    }

    private void AppendRow(StringBuilder text, int player, int row, double metres)
    {
        var factor = player == WrongUnitPlayer ? 3.6 : 1;
        var time = TimeSpan.FromMilliseconds(64_800_000 + (row * 100L));
        text.Append(
            CultureInfo.InvariantCulture,
            $"{Name(player)},05.10.2026 {time:hh\\:mm\\:ss\\.f},{Speed(player, row) * factor:0.00},{metres:0.00},{HeartRate(player, row)},{Satellites(player, row)}\n");
    }
}
