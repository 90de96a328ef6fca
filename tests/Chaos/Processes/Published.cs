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
            Binary = Binary.Publish(Repository.Root ?? throw new ChaosFailureException("the sources are not above this program: name an executable with --binary"), folder.FullName);
        }
    }

    public Binary Binary { get; }

    public void Dispose() => folder?.Delete(recursive: true);
}
