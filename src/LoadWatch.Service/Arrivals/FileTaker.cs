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

        switch (archive.Stage(opened.Stream, configuration.LargestFileBytes))
        {
            case StagedCopy copy when SafeFile.StampOf(file.FullPath) != opened.Stamp:
                // Written to while it was read: the next sweep reads what it has become.
                Archive.Discard(copy);
                return new Taking.Settling();
            case StagedCopy copy when !settled && decoders.CheckCompleteness(copy.Bytes) != Completeness.Complete:
                Archive.Discard(copy);
                return new Taking.Settling();
            case StagedCopy copy:
                return new Taking.Taken(new TakenFile(file, opened.Stamp, copy));
            default:
                return new Taking.Settling(); // It grew past the limit while it was read.
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
