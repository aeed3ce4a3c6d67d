using System.Collections.Immutable;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Scenarios;
using FtEstimate.Sizing;
using FtEstimate.SurfaceCode;

namespace FtEstimate.Reports.Estimate;

/// <summary>Which law, what is extrapolated, what is assumed, what is left out.</summary>
internal static class MethodSection
{
    /// <summary>The section.</summary>
    public static ReportSection Of(Subject subject)
    {
        var blocks = ImmutableArray.CreateBuilder<Block>();
        blocks.Add(new Paragraph("The law from physical to logical errors:"));
        blocks.Add(new BulletList(Law(subject)));
        if (subject.Machine is { } machine)
        {
            blocks.Add(LawTable(subject.Space.Law, machine));
        }

        blocks.Add(new Paragraph("Conventions and assumptions:"));
        blocks.Add(new BulletList(Conventions(subject)));
        blocks.Add(new Paragraph("Left out:"));
        blocks.Add(new BulletList(
        [
            new Bullet("Noise", "Errors are taken as independent. Drifts, correlated errors, leakage other than loss, and heating over many rounds are not modelled."),
            new Bullet("Space", "Room for moves, zones and packing losses of the array is not counted, nor is any link between optical fields."),
            new Bullet("Magic states", "Factories are 15-to-1 distillation in one or two levels. Other protocols and cultivation are not offered, so better ones may exist."),
        ]));
        blocks.Add(new Paragraph("This is a planning estimate. It is not a forecast, and it is not a safety document."));
        return new ReportSection("Method and limits", blocks.ToImmutable());
    }

    private static ImmutableArray<Bullet> Law(Subject subject)
    {
        IScalingLaw law = subject.Space.Law;
        var bullets = ImmutableArray.CreateBuilder<Bullet>();
        bullets.Add(new Bullet("In use", $"{law.Name}. {law.Source}"));
        if (subject.Machine is { } machine)
        {
            LawReach reach = law.Reach(machine.Strength.Worse, machine.Distance);
            bullets.Add(new Bullet(
                reach.Inside ? "Here it rests on data" : "Here it is extrapolated",
                $"Distance {machine.Distance}, as strong as a uniform error of {Show.Probability(machine.Strength.Mean * law.Threshold)}. {reach.Sentence}"));
        }

        return bullets.ToImmutable();
    }

    private static Table LawTable(IScalingLaw law, SizedMachine machine)
    {
        ImmutableArray<LawComparison> others = LawComparison.Of(law, machine.Strength, machine.Distance);
        TableBuilder table = new(
            new Column($"Logical error of one patch per round, distance {machine.Distance}"), new Column("Probability", Align.Right), new Column("Law in use is higher by", Align.Right));
        table.AddStanding($"{law.Name} (in use)", Show.Probability(others[0].InUsePerRound), "");
        foreach (LawComparison other in others)
        {
            table.Add(
                $"{other.Other.Name}, for the same noise (uniform error {Show.Probability(other.UniformError)})",
                Show.Probability(other.OtherPerRound),
                other.Ratio is { } ratio ? $"× {Show.Significant(ratio, 2)}" : Figures.Figure.Missing);
        }

        return table.Build();
    }

    private static ImmutableArray<Bullet> Conventions(Subject subject)
    {
        Scenario scenario = subject.Space.Scenario;
        var bullets = ImmutableArray.CreateBuilder<Bullet>();
        if (subject.Cycle.IsPhysical)
        {
            bullets.Add(new Bullet(
                "Weights of errors and losses",
                "First order: each cause counts in proportion to its probability. Fitted to own Monte Carlo of the CZ-native circuit together with the law; "
                + "`memory` simulates this machine itself, without weights."));
        }

        bullets.Add(new Bullet("Atoms of a patch", $"{subject.Space.Patch.Name} at code distance d."));
        bullets.Add(new Bullet(
            "Failure", scenario.Method.FailureSplit == "each"
                ? "Patches, magic states and rotations may each use the whole allowed probability, as some papers count."
                : "Patches, magic states and rotations share the allowed probability; the search decides how."));
        if (scenario.Workload.Rotations > 0)
        {
            bullets.Add(new Bullet("Rotations", $"{subject.Space.Synthesis.Name}. {subject.Space.Synthesis.Source}."));
        }

        AddStyle(bullets, subject);
        AddFixed(bullets, scenario.Method);
        return bullets.ToImmutable();
    }

    private static void AddStyle(ImmutableArray<Bullet>.Builder bullets, Subject subject)
    {
        if (subject.Machine is not { } machine)
        {
            return;
        }

        if (machine.Layout.Style == LogicStyle.LatticeSurgery)
        {
            bullets.Add(new Bullet(
                "Lattice surgery", "Floor plans of Litinski 2019 (arXiv:1808.02892). A T gate that depends on another waits for the longer of its steps and a reaction, " +
                "which takes choices prepared before they are known."));
            return;
        }

        bullets.Add(new Bullet(
            "Transversal gates",
            $"Each gate per round raises the noise by {Show.Percent(LogicLayout.NoisePerTransversalGate)} (Zhou 2025, arXiv:2505.15907; from memory). " +
            $"Routing patches: {Show.Percent(subject.Space.Scenario.Method.RoutingFraction)} of the logical ones."));
        if (subject.Space.Scenario.Workload.LogicalLayers is null)
        {
            bullets.Add(new Bullet(
                "Layers of logical gates", $"Not stated; {Show.Significant(TStateDemand.AssumedLayersPerReaction, 2)} per dependent magic state are assumed."));
        }
    }

    private static void AddFixed(ImmutableArray<Bullet>.Builder bullets, Method method)
    {
        var given = new List<string>();
        AddIf(given, "style", method.Style);
        AddIf(given, "floor plan", method.Block);
        AddIf(given, "factory", method.Factory);
        AddIf(given, "number of factories", method.FactoryCount is { } count ? Words.Whole(count) : null);
        AddIf(given, "patches", method.Patches is { } patches ? Words.Whole(patches) : null);
        AddIf(given, "error of an injected state", method.InjectedError is { } injected ? Show.Probability(injected) : null);
        AddIf(given, "transversal gates per round", method.GatesPerRound is { } gates ? Show.Significant(gates, 2) : null);
        if (given.Count > 0)
        {
            bullets.Add(new Bullet("Fixed by the scenario, not searched", string.Join("; ", given) + "."));
        }
    }

    private static void AddIf(List<string> given, string what, string? value)
    {
        if (value is not null)
        {
            given.Add($"{what}: {value}");
        }
    }
}
