using System.Collections.Immutable;
using FtEstimate.Cycles;
using FtEstimate.MagicStates;
using FtEstimate.Noise;
using FtEstimate.SurfaceCode;

namespace FtEstimate.Sizing;

/// <summary>The noise a catalogue of factories is worked out for.</summary>
/// <param name="Law">Scaling law.</param>
/// <param name="Strength">Noise strength per basis.</param>
/// <param name="InjectedError">Pauli probability of an injected state.</param>
/// <param name="ErrorAtMost">Largest output error that is of use to the workload; null: no workload stands behind the question.</param>
public sealed record CatalogueNoise(IScalingLaw Law, NoiseStrength Strength, double InjectedError, double? ErrorAtMost = null)
{
    /// <summary>The noise of a sized machine; where there is none, of a single patch under the quietest readout.</summary>
    public static CatalogueNoise Of(SizingResult result)
    {
        SearchSpace space = result.Space;
        OperatingPoint point = result.Best?.Point ?? space.Points[0];
        OperatingState state = point.At(result.Best is { } machine
            ? MachineLoad.Of(machine.Atoms.Sites, machine.Distance)
            : MachineLoad.SinglePatch);
        return new CatalogueNoise(
            space.Law,
            state.Strength,
            space.Scenario.Method.InjectedError ?? point.InjectedError(state),
            result.Best is { Demand.TStates: > 0 } sized ? SearchLimits.Of(space.Scenario).FaultsAtMost / sized.Demand.TStates : null);
    }

    /// <summary>Every location at one error rate, with the textbook law, as in the literature.</summary>
    /// <param name="error">Pauli probability, greater than 0.</param>
    public static CatalogueNoise Uniform(double error) =>
        new(ScalingLaws.Textbook, PatchError.Uniform(ScalingLaws.Textbook, error), error);

    /// <summary>The factories: those of use that no other beats, the whole grid, or one design held against the grid.</summary>
    /// <param name="design">The one design; null: the grid.</param>
    /// <param name="beatenToo">Whether beaten ones are listed.</param>
    public ImmutableArray<CatalogueEntry> Entries(FactoryDesign? design, bool beatenToo)
    {
        FactoryNoise noise = new(d => PatchError.PerRound(Law, Strength, d), Math.Min(InjectedError, 0.5));
        if (design is null && !beatenToo && ErrorAtMost is { } errorAtMost)
        {
            return [.. FactoryCatalogue.Undominated(noise, errorAtMost).Select(factory => new CatalogueEntry(factory, false))];
        }

        ImmutableArray<CatalogueEntry> grid = FactoryCatalogue.All(noise);
        if (design is not null)
        {
            Factory one = Factory.Of(design, noise);
            return [new CatalogueEntry(one, grid.Any(entry => Beats(entry.Factory, one)))];
        }

        return beatenToo ? grid : [.. grid.Where(entry => !entry.Dominated && entry.Factory.OutputError < InjectedError)];
    }

    private static bool Beats(Factory one, Factory other) =>
        one.Atoms <= other.Atoms && one.RoundsPerOutput <= other.RoundsPerOutput && one.OutputError <= other.OutputError
        && (one.Atoms < other.Atoms || one.RoundsPerOutput < other.RoundsPerOutput || one.OutputError < other.OutputError);
}
