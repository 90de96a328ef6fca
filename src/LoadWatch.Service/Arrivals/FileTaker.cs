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
        if (opened.Stamp.Size > configuration.LargestFileBytes)
        {
            return Unreadable(file, $"larger than {configuration.LargestFileBytes / (1024 * 1024)} MB");
        }

        var settled = SettledFiles.IsSettled(opened.Stamp, now, configuration.Settle);
        if (!settled && !ShowsItsEnd(opened.Stream))
        {
            return new Taking.Settling();
        }

        // Where nothing was staged it grew past the limit while it was read.
        return archive.Stage(opened.Stream, configuration.LargestFileBytes) is StagedCopy copy ? Take(file, opened, settled, copy) : new Taking.Settling();
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
    private static bool ShowsItsEnd(FileStream stream)
    {
        var head = new byte[DecoderSet.HeadLength];
        var length = ReadHead(stream, head);
        stream.Position = 0;
        return DecoderSet.Recognise(head.AsSpan(0, length)) is ContentKind.Fit or ContentKind.Gzip or ContentKind.Zip;
    }

    private static int ReadHead(FileStream stream, byte[] head)
    {
        try
        {
            return stream.ReadAtLeast(head, head.Length, throwOnEndOfStream: false);
        }
        catch (IOException error)
        {
            throw new SourceUnreadableException(error);
        }
    }
}
