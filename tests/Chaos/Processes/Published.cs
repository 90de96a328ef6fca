namespace LoadWatch.Chaos.Processes;

/// <summary>The executable that was named, or one published for this run into a temporary folder.</summary>
internal sealed class Published : IDisposable
{
    private readonly DirectoryInfo? folder;

    public Published(string? named)
    {
        if ((named ?? Environment.GetEnvironmentVariable(Binary.Variable)) is { Length: > 0 } executable)
        {
            Binary = Binary.At(executable);
        }
        else
        {
            folder = Directory.CreateTempSubdirectory("loadwatch-published-");
            Binary = Binary.Publish(Repository(), folder.FullName);
        }
    }

    public Binary Binary { get; }

    public void Dispose() => folder?.Delete(recursive: true);

    private static string Repository()
    {
        var at = new DirectoryInfo(AppContext.BaseDirectory);
        while (at is not null && !File.Exists(Path.Combine(at.FullName, "LoadWatch.sln")))
        {
            at = at.Parent;
        }

        return at?.FullName ?? throw new ChaosFailureException("the sources are not above this program: name an executable with --binary");
    }
}
