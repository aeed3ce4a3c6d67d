using BenchmarkDotNet.Attributes;
using FtEstimate.Files.Scenarios;
using FtEstimate.MagicStates;
using FtEstimate.Noise;
using FtEstimate.Scenarios;
using FtEstimate.Sizing;
using FtEstimate.SurfaceCode;

namespace FtEstimate.Benchmarks;

/// <summary>One sizing of the first scenario, against one evaluation of the scaling law.</summary>
[MemoryDiagnoser]
public class SizingBenchmarks
{
    private readonly MachineSizing _warm = new(new FactoryCatalogue());
    private readonly NoiseStrength _strength = new(0.25, 0.24);
    private Scenario _surgery = null!;
    private Scenario _bothStyles = null!;

    /// <summary>Reads the scenario and fills the catalogue's memory.</summary>
    [GlobalSetup]
    public void ReadScenario()
    {
        _surgery = Read("first-report.toml");
        _bothStyles = _surgery with { Method = _surgery.Method with { Style = null } };
        _ = _warm.Find(_surgery);
        _ = _warm.Find(_bothStyles);
    }

    /// <summary>The yardstick.</summary>
    [Benchmark(Baseline = true)]
    public double OneLawEvaluation() => PatchError.PerRound(ScalingLaws.PublishedFit, _strength, 29);

    /// <summary>All blocks of lattice surgery, factories remembered.</summary>
    [Benchmark]
    public SizingResult SurgeryWarm() => _warm.Find(_surgery);

    /// <summary>Both styles, factories remembered.</summary>
    [Benchmark]
    public SizingResult BothStylesWarm() => _warm.Find(_bothStyles);

    /// <summary>All blocks of lattice surgery, noise never seen.</summary>
    [Benchmark]
    public SizingResult SurgeryUnseenNoise() => new MachineSizing(new FactoryCatalogue()).Find(_surgery);

    /// <summary>Both styles, noise never seen.</summary>
    [Benchmark]
    public SizingResult BothStylesUnseenNoise() => new MachineSizing(new FactoryCatalogue()).Find(_bothStyles);

    private static Scenario Read(string name)
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "FtEstimate.sln")))
        {
            folder = folder.Parent;
        }

        string path = Path.Combine(folder?.FullName ?? ".", "scenarios", name);
        return ScenarioReader.Read(path, []).Scenario ?? throw new InvalidOperationException($"{path} cannot be read");
    }
}
