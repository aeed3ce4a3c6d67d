using System.Collections.Immutable;
using FtEstimate.Reports.Documents;
using FtEstimate.Scenarios;

namespace FtEstimate.Reports.Estimate;

/// <summary>Every input with its source, and the derivation of generated counts.</summary>
internal static class InputsSection
{
    /// <summary>The section.</summary>
    public static ReportSection Of(Scenario scenario)
    {
        var blocks = ImmutableArray.CreateBuilder<Block>();
        if (scenario.Inputs.InOrder.Length > 0)
        {
            blocks.Add(Inputs(scenario.Inputs));
        }
        else
        {
            blocks.Add(new Paragraph("The inputs were not recorded."));
        }

        if (!scenario.Workload.Derivations.IsDefaultOrEmpty)
        {
            blocks.Add(new Paragraph("How the size of the algorithm was worked out:"));
            blocks.Add(DerivationTable.Of(scenario.Workload.Derivations));
        }

        return new ReportSection("Inputs and sources", blocks.ToImmutable());
    }

    private static Table Inputs(InputSet inputs)
    {
        TableBuilder table = new(
            new Column("Input", Verbatim: true), new Column("Value"), new Column("Range"), new Column("Source"));
        foreach (Input input in inputs.InOrder)
        {
            table.Add(input.Path, InputText.Value(input), InputText.Range(input), InputText.Source(input));
        }

        return table.Build();
    }
}
