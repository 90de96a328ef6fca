namespace LoadWatch.Chaos.Scenarios;

/// <summary>
/// Every scenario there is, in the order in which all of them run. A scenario makes its nights (<see cref="Inputs.Nights"/> keeps the truth), prepares a place
/// (<see cref="Trial.Prepared"/>), disturbs a copy of it, and ends with <see cref="Trial.MustConverge"/> against <see cref="Trial.Undisturbed"/>, or, where the
/// night itself is another one, with <see cref="Trial.Sound"/>. It counts what was survived by <see cref="Trial.Survived"/>. Files alone: the fixed clock;
/// mail and <c>run</c>: the machine's, which is a morning in its zone. A new file of scenarios is one line here; the tests run whatever stands here.
/// </summary>
public static class Catalogue
{
    public static IReadOnlyList<Scenario> All { get; } =
    [
        .. NamedKills.All,
        .. RandomKills.All,
        .. FailingCalls.All,
        .. RunningService.All,
        .. MailFaults.All,
        .. Arriving.All,
        .. OddFiles.All,
        .. Folders.All,
        .. Packed.All,
        .. Strangers.All,
        .. Clocks.All,
        .. FullDisks.All,
        .. Databases.All,
        .. Scarcity.All,
        .. LongMorning.All,
        .. Edits.All,
    ];

    /// <exception cref="ArgumentException">There is none of that name.</exception>
    public static Scenario Find(string id) =>
        All.FirstOrDefault(scenario => scenario.Id == id) ?? throw new ArgumentException($"there is no scenario \"{id}\"; chaos list names them", nameof(id));
}
