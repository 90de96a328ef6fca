using LoadWatch.Decoding.Fit;
using LoadWatch.Recordings;

namespace LoadWatch.Decoding.Tests.Limits;

/// <summary>
/// The files of <see cref="WorstFits"/> are the worst as long as they are accepted and a few more of the same are refused, or fill the file. <see cref="MemoryTests"/> reads them.
/// </summary>
public class WorstFitTests
{
    private const int Bytes = 8 << 20;

    [Fact]
    public void TheyAreAcceptedAndAlmostRefused()
    {
        Assert.All(WorstFits.All, worst => Assert.True(IsAccepted(worst.Make(Bytes, WorstFits.Full)), worst.Name));
        Assert.Equal(WorstFits.LimitedBySize, WorstFits.All.Where(worst => IsAccepted(worst.Make(Bytes, 1.04))).Select(worst => worst.Name));
    }

    private static bool IsAccepted(byte[] file) => FitDecoder.Decode(file).Problems.All(problem => problem.Severity != ProblemSeverity.Error);
}
