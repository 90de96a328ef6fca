using LoadWatch.Storage.Archives;
using LoadWatch.Storage.Files;

namespace LoadWatch.Service.Arrivals;

/// <summary>A file read whole into the archive's staging, with the stamp that it had while it was read.</summary>
public sealed record TakenFile(FoundFile File, FileStamp Stamp, StagedCopy Copy);
