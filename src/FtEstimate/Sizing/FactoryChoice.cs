using System.Collections.Immutable;
using FtEstimate.MagicStates;
using FtEstimate.Noise;
using FtEstimate.SurfaceCode;

namespace FtEstimate.Sizing;

/// <summary>The factories a search may use at a given noise: the whole catalogue, or the one the scenario fixes.</summary>
/// <param name="space">The search space.</param>
/// <param name="catalogue">The catalogue, which remembers what it has evaluated.</param>
internal sealed class FactoryChoice(SearchSpace space, FactoryCatalogue catalogue)
{
    private readonly FactoryDesign? _design =
        FactoryDesign.TryParse(space.Scenario.Method.Factory, out FactoryDesign? design, out _) ? design : null;

    /// <summary>Whether factories are tiles of the data distance, whose logical errors count with those of all tiles.</summary>
    public bool CountsAsTiles => space.Scenario.Method.Factory == TileFactory.ScenarioName;

    /// <summary>Tiles whose logical errors count towards the failure: those of the layout, and of tile factories.</summary>
    public double TilesThatCount(LogicLayout layout, int factoryCount) => layout.Tiles + (CountsAsTiles ? TileFactory.Tiles * factoryCount : 0);

    /// <summary>Factories at the noise rounded up to the catalogue's grid, so that neighbouring sizes share an evaluation.</summary>
    /// <param name="point">Readout and exposure.</param>
    /// <param name="state">Times and noise.</param>
    /// <param name="distance">Code distance of the tiles.</param>
    /// <param name="errorAtMost">No state may err more.</param>
    public ImmutableArray<Factory> At(OperatingPoint point, in OperatingState state, int distance, double errorAtMost)
    {
        double injected = Injected(point, state);
        if (CountsAsTiles)
        {
            return [TileFactory.Of(distance, space.Patch.AtomsPerTile(distance), injected)];
        }

        RoundedNoise noise = RoundedNoise.Of(space.Law, state.Strength, injected);
        return _design is { } fixedDesign
            ? [Factory.Of(fixedDesign, noise.Noise(space.Law))]
            : catalogue.Undominated(noise.Key, () => noise.Noise(space.Law), errorAtMost);
    }

    /// <summary>One factory at the exact noise, for the report.</summary>
    public Factory Exactly(Factory factory, OperatingPoint point, in OperatingState state)
    {
        if (factory.Design is not { } chosen)
        {
            return factory;
        }

        NoiseStrength strength = state.Strength;
        return Factory.Of(chosen, new FactoryNoise(d => PatchError.PerRound(space.Law, strength, d), Injected(point, state)));
    }

    /// <summary>Pauli probability of an injected T state, as the scenario or the machine has it.</summary>
    public double Injected(OperatingPoint point, in OperatingState state) =>
        space.Scenario.Method.InjectedError ?? point.InjectedError(state);
}

/// <summary>A noise rounded up to the grid of the catalogue in every respect.</summary>
/// <param name="Key">Its place on the grid; the law is part of it.</param>
/// <param name="Strength">Noise strength there.</param>
/// <param name="InjectedError">Injected error there.</param>
internal readonly record struct RoundedNoise(NoiseKey Key, NoiseStrength Strength, double InjectedError)
{
    /// <summary>The grid point at or above a noise.</summary>
    public static RoundedNoise Of(IScalingLaw law, NoiseStrength strength, double injectedError)
    {
        int x = NoiseGrid.BinAbove(strength.X);
        int z = NoiseGrid.BinAbove(strength.Z);
        int injected = NoiseGrid.BinAbove(injectedError);
        return new RoundedNoise(
            new NoiseKey(x, z, injected, ScalingLaws.All.IndexOf(law)),
            new NoiseStrength(NoiseGrid.ValueOf(x), NoiseGrid.ValueOf(z)),
            Math.Min(NoiseGrid.ValueOf(injected), 0.5));
    }

    /// <summary>The noise a factory sees.</summary>
    public FactoryNoise Noise(IScalingLaw law)
    {
        NoiseStrength strength = Strength;
        return new FactoryNoise(d => PatchError.PerRound(law, strength, d), InjectedError);
    }
}
