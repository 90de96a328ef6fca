using NodaTime;

namespace LoadWatch.Storage.Activities;

/// <summary>What a look at an activity's row found.</summary>
/// <param name="Sha">The arrival of its winning recording.</param>
/// <param name="Checksum">As it is now, of what stands in the cells now.</param>
/// <param name="IsSound">Whether that is the one written with the row; null for a row of before checksums were kept.</param>
public sealed record CheckedActivity(string Key, string Person, LocalDate Date, string Sha, string Checksum, bool? IsSound);
