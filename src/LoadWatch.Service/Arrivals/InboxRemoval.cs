using LoadWatch.Storage.Files;

namespace LoadWatch.Service.Arrivals;

/// <summary>Takes a file out of an inbox that says <c>take: move</c>, once its effects are durable: rename aside, compare with what was read, unlink, or put back.</summary>
public static class InboxRemoval
{
    /// <returns>False when the file was changed or replaced since it was read; it then stands where it stood and is taken by a later sweep.</returns>
    public static bool Remove(TakenFile file)
    {
        var folder = Path.GetDirectoryName(file.File.FullPath)!;
        var aside = Path.Combine(folder, $".loadwatch-{file.Copy.Sha[..12]}");
        try
        {
            if (!DurableFile.RenameWithoutOverwrite(file.File.FullPath, aside))
            {
                return false;
            }

            if (SafeFile.StampOf(aside) == file.Stamp)
            {
                File.Delete(aside);
                return true;
            }

            DurableFile.RenameWithoutOverwrite(aside, file.File.FullPath);
            return false;
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            return false;
        }
    }
}
