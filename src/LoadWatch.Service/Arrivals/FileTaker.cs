using LoadWatch.Decoding;
using LoadWatch.Notices;
using LoadWatch.Service.Configuration;
using LoadWatch.Service.Pipeline;
using LoadWatch.Storage.Archives;
using LoadWatch.Storage.Files;
using NodaTime;

namespace LoadWatch.Service.Arrivals;

/// <summary>Reads one file whole into the archive's staging, or says why not yet.</summary>
public sealed class FileTaker(WorkingConfiguration configuration, Archive archive, DecoderSet decoders, Instant now, SweepReport report)
{
    /// <summary>The file with a durable copy of its bytes, or null when it is left for a later sweep; the report says why.</summary>
    public TakenFile? Take(FoundFile file)
    {
        report.Advanced();
        switch (SafeFile.Open(file.FullPath))
        {
            case OpenedFile opened:
                using (opened)
                {
                    return TakeReadable(file, opened);
                }

            case UnopenedFile { Trouble: not FileTrouble.Missing } unopened:
                report.Unreadable.Add(new BriefLine(file.Path, unopened.Reason));
                return null;
            default:
                return null; // Gone since it was listed.
        }
    }

    private TakenFile? TakeReadable(FoundFile file, OpenedFile opened)
    {
        try
        {
            return Take(file, opened);
        }
        catch (SourceUnreadableException e)
        {
            report.Unreadable.Add(new BriefLine(file.Path, e.Message));
            return null;
        }
    }

    private TakenFile? Take(FoundFile file, OpenedFile opened)
    {
        if (opened.Stamp.Size > configuration.LargestFileBytes)
        {
            report.Unreadable.Add(new BriefLine(file.Path, $"larger than {configuration.LargestFileBytes / (1024 * 1024)} MB"));
            return null;
        }

        var settled = SettledFiles.IsSettled(opened.Stamp, now, configuration.Settle);
        if (!settled && !ShowsItsEnd(opened.Stream))
        {
            report.Settling++;
            return null;
        }

        switch (archive.Stage(opened.Stream, configuration.LargestFileBytes))
        {
            case StagedCopy copy when SafeFile.StampOf(file.FullPath) != opened.Stamp:
                // Written to while it was read: the next sweep reads what it has become.
                Archive.Discard(copy);
                report.Settling++;
                return null;
            case StagedCopy copy when !settled && decoders.CheckCompleteness(copy.Bytes) != Completeness.Complete:
                Archive.Discard(copy);
                report.Settling++;
                return null;
            case StagedCopy copy:
                return new TakenFile(file, opened.Stamp, copy);
            default:
                report.Settling++; // It grew past the limit while it was read.
                return null;
        }
    }

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
