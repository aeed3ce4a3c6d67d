using System.Collections.Immutable;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Figures;
using FtEstimate.Workloads;

namespace FtEstimate.Reports.Estimate;

/// <summary>How generated counts came about.</summary>
internal static class DerivationTable
{
    /// <summary>One row per count.</summary>
    public static Table Of(ImmutableArray<Derivation> derivations)
    {
        TableBuilder table = new(
            new Column("Quantity"), new Column("Value", Align.Right), new Column("Formula", Verbatim: true), new Column("Source"));
        foreach (Derivation derivation in derivations)
        {
            table.Add(derivation.Quantity, WholeNumbers.ShowCount(derivation.Value), derivation.Formula, derivation.Source);
        }

        return table.Build();
    }
}
