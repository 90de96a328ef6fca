using LoadWatch.Service.Pipeline;

namespace LoadWatch.Service.Tests.Pipeline;

/// <summary>Says of one object that the child died of it, so many times when it was tried alone.</summary>
public sealed class DyingProbe(string sha, int deaths) : IDecodeProbe
{
    public int Deaths { get; private set; }

    /// <summary>How many objects were tried, each time.</summary>
    public List<int> Tried { get; } = [];

    public bool Survives(IReadOnlyList<string> paths, long bytes)
    {
        Tried.Add(paths.Count);
        var dies = paths.Any(path => Path.GetFileName(path) == sha) && Deaths < deaths;
        Deaths += dies && paths.Count == 1 ? 1 : 0;
        return !dies;
    }
}
