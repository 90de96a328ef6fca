using System.Text.Json;
using LoadWatch.Service.Tests.Pipeline;
using WorkingFolder = LoadWatch.Service.Tests.Pipeline.WorkingFolder;

namespace LoadWatch.Service.Tests.Commands;

public sealed class LayoutCommandTests : IDisposable
{
    private static readonly byte[] Ride = "Zeit;Puls;Tempo (km/h)\n31.03.2026 17:30:00;112;24,5\n31.03.2026 17:30:01;113;24,9\n"u8.ToArray();

    private readonly WorkingFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void ADraftIsRefusedByCheckUntilWhatIsOpenIsFilledIn()
    {
        var draft = Loadwatch.Run("layout", folder.Put("anna/ride.csv", Ride));

        Assert.Equal((0, ""), (draft.Code, draft.Errors));
        Assert.Contains("//   1. time.zone: 'Zeit' has no offset", draft.Output, StringComparison.Ordinal);
        var open = CheckWith(draft.Output);
        Assert.Equal(78, open.Code);
        Assert.Contains("time.zone '?' is not an IANA zone", open.Errors, StringComparison.Ordinal);
        Assert.Equal(0, CheckWith(draft.Output.Replace("\"?\"", "\"Europe/Vienna\"", StringComparison.Ordinal)).Code);
    }

    [Fact]
    public void ADraftNamesOnlyKeysThatDifferFromTheirDefaults()
    {
        var draft = Loadwatch.Run("layout", folder.Put("anna/ride.csv", Ride), "--name", "track");

        var layout = JsonDocument.Parse(draft.Output, new JsonDocumentOptions { CommentHandling = JsonCommentHandling.Skip }).RootElement;
        Assert.Equal(["name", "header", "delimiter", "decimal", "time", "columns"], layout.EnumerateObject().Select(property => property.Name));
        Assert.Equal("track", layout.GetProperty("name").GetString());
        Assert.Equal(["column", "format", "zone"], layout.GetProperty("time").EnumerateObject().Select(property => property.Name));
    }

    [Fact]
    public void ProgramsGetTheDraftAndTheDoubtsApart()
    {
        var draft = JsonDocument.Parse(Loadwatch.Run("layout", folder.Put("anna/ride.csv", Ride), "--json").Output).RootElement;

        Assert.Equal(["layout", "found", "unsure"], draft.EnumerateObject().Select(property => property.Name));
        Assert.Equal("ride", draft.GetProperty("layout").GetProperty("name").GetString());
        Assert.Equal(2, draft.GetProperty("unsure").GetArrayLength());
    }

    [Fact]
    public void WhatIsNoCsvEndsWithTheReason()
    {
        var fit = Loadwatch.Run("layout", folder.Put("anna/ride.fit", Some.Fit(Some.Yesterday)));
        var packed = Loadwatch.Run("layout", folder.Put("anna/ride.csv.gz", Some.Gzip(Ride)));
        var single = Loadwatch.Run("layout", folder.Put("anna/one.csv", "1\n2\n"u8.ToArray()));
        var missing = Loadwatch.Run("layout", Path.Combine(folder.Inbox, "missing.csv"));

        Assert.Equal([65, 65, 65, 74], new[] { fit, packed, single, missing }.Select(ended => ended.Code));
        Assert.Contains("it needs no layout", fit.Errors, StringComparison.Ordinal);
        Assert.Contains("unpack it first", packed.Errors, StringComparison.Ordinal);
        Assert.Contains("no mark parts the rows into columns", single.Errors, StringComparison.Ordinal);
    }

    private Ended CheckWith(string layout)
    {
        var text = File.ReadAllText(folder.ConfigPath);
        var changed = Path.Combine(folder.Root, "changed.json");
        File.WriteAllText(changed, $"{text[..text.LastIndexOf('}')].TrimEnd().TrimEnd(',')},\n\"layouts\": [\n{layout}]\n}}\n");
        return Loadwatch.Run("check", "--config", changed);
    }
}
