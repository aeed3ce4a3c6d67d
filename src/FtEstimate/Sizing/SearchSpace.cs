using System.Collections.Immutable;
using FtEstimate.Cycles;
using FtEstimate.Machines;
using FtEstimate.Noise;
using FtEstimate.Scenarios;
using FtEstimate.SurfaceCode;
using FtEstimate.Workloads;

namespace FtEstimate.Sizing;

/// <summary>Everything a search chooses from, prepared once per scenario.</summary>
/// <param name="Scenario">The question.</param>
/// <param name="Law">The scaling law in use.</param>
/// <param name="Patch">Atoms per tile.</param>
/// <param name="Synthesis">How rotations are made of T gates.</param>
/// <param name="Points">Ways to run the machine: readout and exposure.</param>
/// <param name="Layouts">Ways to do logic.</param>
public sealed record SearchSpace(
    Scenario Scenario,
    IScalingLaw Law,
    PatchLayout Patch,
    RotationSynthesis Synthesis,
    ImmutableArray<OperatingPoint> Points,
    ImmutableArray<LogicLayout> Layouts)
{
    /// <summary>Largest code distance considered.</summary>
    public const int LargestDistance = 99;

    /// <summary>Exposures that shorten the round by less are not tried: the resolution of the search in time.</summary>
    public const double WorthwhileShortening = 0.02;

    /// <summary>The space a scenario leaves open, with the readout in use.</summary>
    /// <param name="scenario">The question; names of law, patch and synthesis are known to exist.</param>
    public static SearchSpace Of(Scenario scenario)
    {
        IScalingLaw law = ScalingLaws.Named(scenario.Method.Law) ?? ScalingLaws.Simulated;
        PatchLayout patch = PatchLayout.Named(scenario.Method.Patch) ?? PatchLayout.Bare;
        RotationSynthesis synthesis = RotationSynthesis.Named(scenario.Method.Synthesis) ?? RotationSynthesis.RepeatUntilSuccess;
        bool movesAtoms = scenario.Machine.Apparatus is AtomArray { Reach: MovedAtoms };
        ImmutableArray<LogicLayout> layouts = LogicLayout.ToTry(scenario.Workload, scenario.Method, synthesis, movesAtoms);
        return new SearchSpace(
            scenario, law, patch, synthesis, PointsOf(scenario.Machine, law, TypicalLoad(layouts, patch)), layouts);
    }

    /// <summary>A distance at which studies of large algorithms arrive: where the growth of the round with the machine is looked at before it is sized.</summary>
    public const int TypicalDistance = 25;

    /// <summary>The load of the tiles of the first layout at the typical distance.</summary>
    public MachineLoad AtTypicalSize => TypicalLoad(Layouts, Patch);

    private static MachineLoad TypicalLoad(ImmutableArray<LogicLayout> layouts, PatchLayout patch) =>
        MachineLoad.Of(layouts[0].Tiles * patch.AtomsPerTile(TypicalDistance), TypicalDistance);

    /// <summary>
    /// The operating points: one per exposure tried, least noise first. An exposure that another beats in round time and in noise is dropped.
    /// </summary>
    private static ImmutableArray<OperatingPoint> PointsOf(Machine machine, IScalingLaw law, MachineLoad load)
    {
        if (machine.Apparatus is not AtomArray array)
        {
            return [new AbstractOperatingPoint((AbstractApparatus)machine.Apparatus, law.Threshold)];
        }

        ChannelWeights weights = ChannelWeights.For(law.Threshold);
        var tried = new List<TriedPoint>();
        foreach (double exposure in Exposures.ToTry(array.Readout))
        {
            var noise = new AtomNoise(array, SyndromeCycle.Of(array, array.Readout, exposure), weights);
            var point = new AtomOperatingPoint(noise, machine.Control);
            tried.Add(new TriedPoint(point, point.At(load)));
        }

        return WorthTrying(tried);
    }

    /// <summary>
    /// From the quietest point to shorter and shorter rounds: each kept point shortens the round at the typical size by at least
    /// <see cref="WorthwhileShortening"/>, and is the quietest that does. A longer round at more noise is beaten outright.
    /// </summary>
    private static ImmutableArray<OperatingPoint> WorthTrying(List<TriedPoint> tried)
    {
        tried.Sort((a, b) => a.State.Strength.Mean.CompareTo(b.State.Strength.Mean));
        var kept = ImmutableArray.CreateBuilder<OperatingPoint>();
        double shortest = double.PositiveInfinity;
        foreach (TriedPoint candidate in tried)
        {
            double round = candidate.State.Times.RoundSeconds;
            if (round <= (1 - WorthwhileShortening) * shortest)
            {
                shortest = round;
                kept.Add(candidate.Point);
            }
        }

        return kept.ToImmutable();
    }

    /// <summary>An operating point with what it gives a machine of the typical size.</summary>
    private sealed record TriedPoint(OperatingPoint Point, OperatingState State);
}
