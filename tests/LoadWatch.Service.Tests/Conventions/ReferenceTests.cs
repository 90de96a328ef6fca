using LoadWatch.Decoding;
using LoadWatch.Delivery;
using LoadWatch.Service.Commands;
using LoadWatch.Storage;

namespace LoadWatch.Service.Tests.Conventions;

/// <summary>The package references are the diagram: a pure core, edges that know only it.</summary>
public sealed class ReferenceTests
{
    [Fact]
    public void CoreKnowsNothingButTheRuntimeAndNodaTime() => Assert.Empty(Convention.ForeignReferences(typeof(Significant).Assembly, "System", "NodaTime"));

    [Fact]
    public void EdgesDoNotKnowEachOther() =>
        Assert.Empty(Convention.MutualReferences(typeof(DecoderSet).Assembly, typeof(Store).Assembly, typeof(INoticeChannel).Assembly));

    [Fact]
    public void NoEdgeKnowsTheService()
    {
        var service = typeof(CommandLine).Assembly.GetName().Name!;
        foreach (var edge in new[] { typeof(DecoderSet), typeof(Store), typeof(INoticeChannel) })
        {
            Assert.DoesNotContain(service, edge.Assembly.GetReferencedAssemblies().Select(reference => reference.Name));
        }
    }

    [Fact]
    public void TheCheckOfForeignReferencesFindsThose() =>
        Assert.Contains("CsvHelper", Convention.ForeignReferences(typeof(DecoderSet).Assembly, "System", "NodaTime"));

    [Fact]
    public void ABeginningOfANameIsNoReferenceToIt() =>
        Assert.Contains("System.Runtime", Convention.ForeignReferences(typeof(Significant).Assembly, "Sys", "NodaTime"));

    [Fact]
    public void TheCheckOfMutualReferencesFindsOne() => Assert.Equal(
        ["LoadWatch.Decoding -> LoadWatch.Core"], Convention.MutualReferences(typeof(DecoderSet).Assembly, typeof(Significant).Assembly));
}
