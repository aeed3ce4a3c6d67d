using System.Collections.Immutable;
using BenchmarkDotNet.Attributes;
using FtEstimate.MagicStates;

namespace FtEstimate.Benchmarks;

/// <summary>How long magic-state factories take to evaluate and to choose from.</summary>
[MemoryDiagnoser]
public class FactoryBenchmarks
{
    private readonly FactoryDesign _oneLevel = FactoryDesign.OneLevel(new PatchDistances(17, 7, 7));

    private readonly FactoryDesign _twoLevels =
        FactoryDesign.TwoLevels(new PatchDistances(17, 7, 7), 6, new PatchDistances(41, 17, 17));

    private readonly FactoryNoise _noise = new(d => 0.1 * Math.Pow(0.1, (d + 1) / 2.0), 1e-3);

    [Benchmark]
    public Factory OneLevel() => Factory.Of(_oneLevel, _noise);

    [Benchmark]
    public Factory TwoLevels() => Factory.Of(_twoLevels, _noise);

    [Benchmark]
    public ImmutableArray<Factory> UndominatedForUnseenNoise() => FactoryCatalogue.Undominated(_noise, 1e-10);

    [Benchmark]
    public ImmutableArray<CatalogueEntry> WholeGrid() => FactoryCatalogue.All(_noise);
}
