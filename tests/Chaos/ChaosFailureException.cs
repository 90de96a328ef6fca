namespace LoadWatch.Chaos;

/// <summary>A promise that did not hold, in one sentence with what was seen.</summary>
public sealed class ChaosFailureException(string sentence) : Exception(sentence);
