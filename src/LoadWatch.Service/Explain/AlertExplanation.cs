using System.Globalization;
using System.Text;
using LoadWatch.Alerts;
using LoadWatch.Findings;
using LoadWatch.Service.Export;
using LoadWatch.Storage;
using LoadWatch.Storage.Decisions;

namespace LoadWatch.Service.Explain;

/// <summary>An alert's life with the evidence of every change.</summary>
public static class AlertExplanation
{
    /// <summary>Null where there is no alert of that id.</summary>
    public static string? Of(StoreSession session, string id)
    {
        var person = id.Split('|')[0];
        return session.Alerts.All(person).FirstOrDefault(alert => alert.Id == id) is { } known ? Write(known, session.Alerts.Changes.Of(id), session.Decisions.OfAlert(id)) : null;
    }

    private static string Write(Alert alert, IReadOnlyList<AlertChange> changes, IReadOnlyList<Decision> decisions)
    {
        var text = new StringBuilder();
        text.AppendLine(CultureInfo.InvariantCulture, $"{OneLine.Of(alert.Text)}");
        text.AppendLine(CultureInfo.InvariantCulture, $"{Words.Of(alert.Severity)}, {Words.Of(alert.State)}{AlertWords.Aside(alert)}, {AlertWords.Since(alert)}");
        foreach (var decision in decisions)
        {
            text.AppendLine(CultureInfo.InvariantCulture, $"{DecisionText.Sentence(decision, decisions)}");
        }

        foreach (var change in changes)
        {
            text.AppendLine();
            text.AppendLine(CultureInfo.InvariantCulture, $"{Words.Date(change.Date)}  {Words.Of(change.Reason)}: {Words.Of(change.From)} -> {Words.Of(change.To)}");
            text.AppendLine(CultureInfo.InvariantCulture, $"    {OneLine.Of(change.Text)}");
            Append(text, change.Evidence);
        }

        return text.ToString();
    }

    /// <summary>Formula, source and inputs, a line each.</summary>
    public static void Append(StringBuilder text, Evidence? evidence)
    {
        if (evidence is null)
        {
            return;
        }

        text.AppendLine(CultureInfo.InvariantCulture, $"    formula  {evidence.Formula}");
        text.AppendLine(CultureInfo.InvariantCulture, $"    source   {evidence.Source}");
        foreach (var input in evidence.Inputs)
        {
            var value = input.Value is { } number ? number.ToString("0.######", CultureInfo.InvariantCulture) : "unknown";
            var note = input.Note is { } words ? $"  ({words})" : "";
            text.AppendLine(CultureInfo.InvariantCulture, $"    {input.Name} = {value} {input.Unit}{note}");
        }
    }
}
