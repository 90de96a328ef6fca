namespace LoadWatch.Service.Commands;

/// <summary>How this program is called where it was started, so that a line shown can be pasted.</summary>
public static class Self
{
    /// <summary>The path of the executable, as short as the working folder allows; <c>loadwatch</c> where it is on the path.</summary>
    public static string Name
    {
        get
        {
            if (Environment.ProcessPath is not { } path || Path.GetFileNameWithoutExtension(path) != "loadwatch")
            {
                return $"dotnet {Shorter(typeof(Self).Assembly.Location)}";
            }

            var onPath = (Environment.GetEnvironmentVariable("PATH") ?? "").Split(Path.PathSeparator);
            return onPath.Contains(Path.GetDirectoryName(path)) ? "loadwatch" : Shorter(path);
        }
    }

    private static string Shorter(string path)
    {
        var relative = Path.GetRelativePath(Environment.CurrentDirectory, path);
        return relative.Length >= path.Length ? path : relative.Contains(Path.DirectorySeparatorChar) ? relative : Path.Combine(".", relative);
    }
}
