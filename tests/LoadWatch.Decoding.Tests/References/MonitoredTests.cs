using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;
using static LoadWatch.Decoding.Fit.FitBaseType;

namespace LoadWatch.Decoding.References;

/// <summary>fit-file-parser reads the same logs of a day: heart rate and steps of each minute of a walk are equal. It counts cycles of two steps, as cadence does.</summary>
public class MonitoredTests
{
    private const int Days = 40;
    private const int Start = Parts.Base + 800;
    private const int Walking = 6;

    [Fact]
    public void ItReadsHeartRateAndStepsOfEachMinuteAlike()
    {
        FileParser.SkipUnlessThere();
        var days = Enumerable.Range(0, Days).Select(Walk).ToList();
        foreach (var (day, theirs) in days.Zip(FileParser.Read(days)))
        {
            Assert.Null(theirs.Error);
            var ours = Assert.Single(FitDecoder.Decode(day).Recordings);
            var counts = theirs.Monitored.Where(entry => entry.Kind == "walking").ToList();
            var rates = theirs.Monitored.Where(entry => entry.HeartRate is not null).ToDictionary(entry => entry.Time!.Value, entry => entry.HeartRate!.Value);
            Assert.Equal(ours.ElapsedSeconds, (counts.Count - 1) * 60);
            foreach (var ((before, entry), minute) in counts.Zip(counts.Skip(1)).Select((pair, minute) => (pair, minute)))
            {
                Assert.Equal(entry.Time - 60_000, ours.Samples.UnixMilliseconds[minute * 6]);
                Assert.Equal(entry.Cycles - before.Cycles, ours.Samples[Channel.Cadence][minute * 6]);
                Assert.Equal(rates[entry.Time!.Value], ours.Samples[Channel.HeartRate][minute * 6]);
            }
        }
    }

    /// <summary>A counter and a heart rate a minute: full times every so often, between them the low 16 bits.</summary>
    private static byte[] Walk(int number)
    {
        var random = new Random(number);
        var part = new FitPartWriter();
        part.Define(0, new(0, new(0, Enumeration), new(4, Unsigned32))).Message(0, 32, Start)
            .Define(1, new(55, new(253, Unsigned32), new(5, Enumeration), new(3, Unsigned32)) { BigEndian = number % 2 == 0 })
            .Define(2, new(55, new(26, Unsigned16), new(5, Enumeration), new(3, Unsigned32)))
            .Define(3, new(55, new(26, Unsigned16), new(27, Unsigned8)));
        var steps = random.Next(10_000);
        var from = Start + (60 * random.Next(1000));
        part.Message(1, from, Walking, steps);
        for (var minute = 1; minute <= 10 + random.Next(60); minute++)
        {
            var time = from + (60 * minute);
            steps += random.Next(60, 220);
            if (random.Next(8) == 0)
                part.Message(1, time, Walking, steps);
            else
                part.Message(2, time & 0xFFFF, Walking, steps);

            part.Message(3, time & 0xFFFF, random.Next(40, 200));
        }

        return part.ToBytes();
    }
}
