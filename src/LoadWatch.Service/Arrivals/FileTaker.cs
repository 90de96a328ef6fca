using LoadWatch.Decoding;
using LoadWatch.Notices;
using LoadWatch.Service.Configuration;
using LoadWatch.Storage.Archives;
using LoadWatch.Storage.Files;
using NodaTime;

namespace LoadWatch.Service.Arrivals;

/// <summary>Reads one file whole into the archive's staging, or says why not yet. Safe to use from several threads.</summary>
public sealed class FileTaker(WorkingConfiguration configuration, Archive archive, DecoderSet decoders, Instant now)
{
    // No limit can be set lower: of a file that stands still nothing has to be known before it is read.
    private const long AlwaysTakenBytes = 1024 * 1024;

    public Taking Take(FoundFile file)
    {
        switch (SafeFile.Open(file.FullPath))
        {
            case OpenedFile opened:
                using (opened)
                {
                    return TakeReadable(file, opened);
                }

            case UnopenedFile { Trouble: not FileTrouble.Missing } unopened:
                return Unreadable(file, unopened.Reason);
            default:
                return new Taking.Gone(); // Since it was listed.
        }
    }

    private Taking TakeReadable(FoundFile file, OpenedFile opened)
    {
        try
        {
            return Take(file, opened);
        }
        catch (SourceUnreadableException e)
        {
            return Unreadable(file, e.Message);
        }
    }

    private Taking Take(FoundFile file, OpenedFile opened)
    {
        var size = opened.Stamp.Size;
        var settled = SettledFiles.IsSettled(opened.Stamp, now, configuration.Settle);
        var kind = settled && size <= AlwaysTakenBytes ? (ContentKind?)null : KindOf(opened.Stream);
        var largest = kind == ContentKind.Text ? configuration.LargestCsvBytes : configuration.LargestFileBytes;
        if (size > largest)
        {
            return Unreadable(file, $"larger than {largest / (1024 * 1024)} MB");
        }

        if (!settled && !ShowsItsEnd(kind))
        {
            return new Taking.Settling();
        }

        // Where nothing was staged it grew past the limit while it was read; what is held may not grow to what could not be.
        var isHeld = !LargeText.Is(kind, size);
        var limit = isHeld ? Math.Min(largest, Math.Max(configuration.LargestFileBytes, LargeText.HeldBytes)) : largest;
        return archive.Stage(opened.Stream, limit, isHeld) is StagedCopy copy ? Take(file, opened, settled, copy) : new Taking.Settling();
    }

    private Taking Take(FoundFile file, OpenedFile opened, bool settled, StagedCopy copy)
    {
        var isKept = false;
        try
        {
            // Written to while it was read: the next sweep reads what it has become.
            isKept = SafeFile.StampOf(file.FullPath) == opened.Stamp && (settled || decoders.CheckCompleteness(copy.Bytes) == Completeness.Complete);
            return isKept ? new Taking.Taken(new TakenFile(file, opened.Stamp, copy)) : new Taking.Settling();
        }
        finally
        {
            if (!isKept)
            {
                Archive.Discard(copy);
            }
        }
    }

    private static Taking.Unreadable Unreadable(FoundFile file, string reason) => new(new BriefLine(file.Path, reason));

    /// <summary>FIT, gzip and zip show by their content whether they are whole; text never does.</summary>
    private static bool ShowsItsEnd(ContentKind? kind) => kind is ContentKind.Fit or ContentKind.Gzip or ContentKind.Zip;

    private static ContentKind KindOf(FileStream stream)
    {
        try
        {
            return LargeText.KindOf(stream);
        }
        catch (IOException error)
        {
            throw new SourceUnreadableException(error);
        }
    }
}
