using LoadWatch.Service.Arrivals;

namespace LoadWatch.Service.Pipeline;

/// <param name="Origin">The file of this sweep that it came in, or null when it was read back from the archive.</param>
public sealed record SeenContent(ArrivalContent Content, TakenFile? Origin);
