using LoadWatch.Service.Commands;

namespace LoadWatch.Service.Tests.Conventions;

/// <summary>Exit codes are a contract with service managers and scripts; the numbers are those of BSD's sysexits, and 128 + 2 for an interrupt.</summary>
public sealed class ExitCodeTests
{
    private const string Accepted = """
        0 Ok
        64 Usage
        65 Data
        69 Unavailable
        70 Software
        73 CannotCreate
        74 InputOutput
        75 TryLater
        77 NoPermission
        78 Configuration
        130 Interrupted
        """;

    [Fact]
    public void TheExitCodesAreTheAcceptedOnes() => Assert.Equal(Accepted, Listed(typeof(ExitCode)), ignoreLineEndingDifferences: true);

    [Fact]
    public void TheListShowsWhatIsThere() => Assert.Equal("7 Odd", Listed(typeof(BadCodes)));

    private static string Listed(Type codes) => string.Join(
        '\n',
        codes.GetFields().Select(field => (Code: (int)field.GetRawConstantValue()!, field.Name)).OrderBy(code => code.Code).Select(code => $"{code.Code} {code.Name}"));

    private static class BadCodes
    {
        public const int Odd = 7;
    }
}
