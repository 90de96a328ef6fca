using LoadWatch.Service.Configuration;
using LoadWatch.Storage.Files;

namespace LoadWatch.Service.Arrivals;

/// <summary>Takes a file out of an inbox that says <c>take: move</c>, once its effects are durable: rename aside, compare with what was read, unlink, or put back.</summary>
public static class InboxRemoval
{
    /// <summary>Begins the name of a file between its rename and its removal; the rest is the name that it had.</summary>
    private const string Aside = ".loadwatch-aside-";

    private static readonly EnumerationOptions EverySubfolder = new()
    {
        RecurseSubdirectories = true,
        MaxRecursionDepth = 16,
        IgnoreInaccessible = true,
        AttributesToSkip = FileAttributes.ReparsePoint,
    };

    /// <summary>Gives files back their names where an earlier run ended between rename and removal; the scan then finds them like any other.</summary>
    public static void PutBack(Inbox inbox)
    {
        if (inbox.Take != TakeMode.Move)
        {
            return;
        }

        try
        {
            foreach (var aside in Directory.EnumerateFiles(inbox.Path, Aside + "*", EverySubfolder).ToList())
            {
                DurableFile.RenameWithoutOverwrite(aside, Path.Combine(Path.GetDirectoryName(aside)!, Path.GetFileName(aside)[Aside.Length..]));
            }
        }
        catch (Exception e) when (e is IOException or UnauthorizedAccessException)
        {
            // The share is read-only or away just now; the next sweep tries again.
        }
    }

    /// <returns>False when the file was changed or replaced since it was read; it then stands where it stood and is taken by a later sweep.</returns>
    public static bool Remove(TakenFile file)
    {
        var folder = Path.GetDirectoryName(file.File.FullPath)!;
        var aside = Path.Combine(folder, Aside + Path.GetFileName(file.File.FullPath));
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
