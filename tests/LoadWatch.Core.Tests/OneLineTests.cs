namespace LoadWatch.Tests;

public sealed class OneLineTests
{
    [Theory]
    [InlineData("Håkon  Öhlund ", "Håkon Öhlund")]
    [InlineData("a\r\nSubject: b", "a Subject: b")]
    [InlineData("a\u001b[31mb\u0000", "a [31mb")]
    [InlineData("a\u202Eb\u2066c\uFEFF", "a b c")]
    [InlineData("a\u2028b\u0085c", "a b c")]
    [InlineData("\t", "")]
    [InlineData("A\u200Bn\u2060n\u00AD", "Ann")]
    [InlineData("\u06CC\u200C\u06A9", "\u06CC\u200C\u06A9")] // Persian parts its letters by a joiner.
    public void NothingInANameStartsALineOrTurnsIt(string name, string expected) => Assert.Equal(expected, OneLine.Of(name));

    [Fact]
    public void HalfACharacterIsReplaced() => Assert.Equal("a\uFFFDb", OneLine.Of("a\uD800b"));

    [Theory]
    [InlineData("load is up", "Load is up.")]
    [InlineData("Why?", "Why?")]
    [InlineData("", "")]
    public void ASentenceBeginsAndEndsAsOne(string text, string expected) => Assert.Equal(expected, OneLine.Sentence(text));
}
