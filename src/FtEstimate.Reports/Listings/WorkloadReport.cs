using System.Collections.Immutable;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Estimate;
using FtEstimate.Workloads;

namespace FtEstimate.Reports.Listings;

/// <summary>The logical size of an algorithm, with the formulas behind it.</summary>
public static class WorkloadReport
{
    /// <summary>The report.</summary>
    public static ReportDocument Of(Workload workload)
    {
        var sections = ImmutableArray.CreateBuilder<ReportSection>();
        sections.Add(new ReportSection("Size of the algorithm", [FigureTable.Of(WorkloadCounts.Of(workload))]));
        if (SynthesisCost.Of(workload) is { Length: > 0 } costs)
        {
            sections.Add(Rotations(workload, costs));
        }

        sections.Add(new ReportSection(
            "Where the numbers come from",
            workload.Derivations.IsDefaultOrEmpty
                ? [new Paragraph("All counts are stated in the file.")]
                : [DerivationTable.Of(workload.Derivations)]));
        return new ReportDocument(workload.Name, sections.ToImmutable());
    }

    private static ReportSection Rotations(Workload workload, ImmutableArray<SynthesisCost> costs)
    {
        string basis = workload.RotationError is null
            ? $"Compared at an error of {Show.Percent(SynthesisCost.ComparedAt)} for all rotations together, {Show.Probability(costs[0].RotationError)} each; a sizing chooses it."
            : $"At the stated error of {Show.Probability(costs[0].RotationError)} per rotation.";
        TableBuilder table = new(
            new Column("Method"), new Column("T states per rotation", Align.Right), new Column("T states in all", Align.Right), new Column("Source"));
        foreach (SynthesisCost cost in costs)
        {
            table.Add(cost.Method.Name, Show.Significant(cost.TPerRotation, 3), Show.Significant(cost.TStates, 3), cost.Method.Source);
        }

        return new ReportSection(
            "Rotations as T states",
            [new Paragraph($"A rotation by an arbitrary angle is built from T gates, each of which uses up one T state. {basis}"), table.Build()]);
    }
}
