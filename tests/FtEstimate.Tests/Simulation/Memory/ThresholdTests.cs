using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;
using FtEstimate.Tests.Simulation.Circuits;
using Xunit.Abstractions;

namespace FtEstimate.Tests.Simulation.Memory;

/// <summary>Thresholds where curves of different distances cross. Published ones are of large toric codes; ours have edges, which shift crossings.</summary>
public sealed class ThresholdTests(ITestOutputHelper output)
{
    // Wang 2003 (arXiv:quant-ph/0207088): 0.1031(1), toric
    [Fact]
    [Trait("Category", "Long")]
    public void Code_capacity_threshold_of_matching()
    {
        CrossingFit fit = Fit(TestCircuits.CodeCapacity, DecoderKind.Matching, [13, 17, 23, 31], [0.097, 0.100, 0.103, 0.106, 0.109], 0.103, 25_000);

        // edges shift the crossing of these distances: 0.1018(3) was found with more shots
        Assert.InRange(fit.Threshold, 0.103 - 0.003, 0.103 + 0.003);
        Assert.InRange(fit.StandardError, 0, 0.001);
    }

    // Delfosse 2021 (arXiv:1709.06218): 9.9 %, toric
    [Fact]
    [Trait("Category", "Long")]
    public void Code_capacity_threshold_of_union_find()
    {
        CrossingFit fit = Fit(TestCircuits.CodeCapacity, DecoderKind.UnionFind, [13, 17, 23, 31], [0.093, 0.096, 0.099, 0.102, 0.105], 0.099, 25_000);

        // edges again: 0.0978(3) was found with more shots
        Assert.InRange(fit.Threshold, 0.099 - 0.003, 0.099 + 0.003);
        Assert.InRange(fit.StandardError, 0, 0.001);
    }

    // Wang 2003 (arXiv:quant-ph/0207088): 0.0293(2), toric
    [Fact]
    [Trait("Category", "Long")]
    public void Phenomenological_threshold_of_matching()
    {
        CrossingFit fit = Fit(TestCircuits.Phenomenological, DecoderKind.Matching, [9, 11, 13, 17], [0.0265, 0.028, 0.0295, 0.031], 0.029, 20_000);

        // three times the largest standard error allowed below; 0.0290(1) was found with more shots
        Assert.InRange(fit.Threshold, 0.0293 - 0.0015, 0.0293 + 0.0015);
        Assert.InRange(fit.StandardError, 0, 0.0005);
    }

    // O'Rourke 2025 (arXiv:2409.14765): 0.5637(4) %, rotated code, failure per d rounds
    [Fact]
    [Trait("Category", "Long")]
    public void Circuit_threshold_of_matching()
    {
        CrossingFit fit = Fit(
            (distance, p) => TextbookCircuit.Of(distance, distance, PauliBasis.Z, UniformNoise.EveryPlace(p)),
            DecoderKind.Matching,
            [9, 11, 13, 15],
            [0.0051, 0.0054, 0.0057, 0.0060],
            0.0056,
            20_000);

        // three standard errors of these shots; 0.00567(4) was found with more. Distances up to 15 here, larger ones there
        Assert.InRange(fit.Threshold, 0.005637 - 0.0003, 0.005637 + 0.0003);
        Assert.InRange(fit.StandardError, 0, 0.0001);
    }

    // Stace 2009 (arXiv:0904.3556): one half. A set of erased atoms holds one logical operator or its complement holds the other, so on this patch every
    // distance fails with probability 1/4 at one half, exactly
    [Fact]
    [Trait("Category", "Long")]
    public void Erasure_threshold_of_matching()
    {
        CrossingFit fit = Fit(TestCircuits.Erasure, DecoderKind.Matching, [9, 13, 17, 23], [0.46, 0.48, 0.50, 0.52, 0.54], 0.5, 15_000);

        Assert.InRange(fit.Threshold, 0.49, 0.51);
        Assert.InRange(fit.StandardError, 0, 0.005);
    }

    // made up: points on exact curves with the scatter left out
    [Fact]
    public void A_fit_to_points_on_the_curve_finds_its_crossing()
    {
        const long Many = 1_000_000_000;
        List<CrossingPoint> points = [];
        foreach (int distance in (int[])[9, 13, 17])
        {
            foreach (double p in (double[])[0.08, 0.1, 0.12])
            {
                double x = (p - 0.101) * Math.Pow(distance, 1 / 1.5);
                points.Add(new CrossingPoint(distance, p, new ShotCount(Many, (long)(Many * (0.2 + x + (0.6 * x * x))))));
            }
        }

        CrossingFit fit = CrossingFit.Of(points, 0.095);

        Assert.Equal(0.101, fit.Threshold, 6);
        Assert.Equal(1.5, fit.Exponent, 4);
    }

    private CrossingFit Fit(Func<int, double, Circuit> circuit, DecoderKind decoder, int[] distances, double[] errors, double guess, long shots)
    {
        List<CrossingPoint> points = [];
        foreach (int distance in distances)
        {
            foreach (double error in errors)
            {
                points.Add(new CrossingPoint(distance, error, Shots.Run(circuit(distance, error), shots, decoder, 71)));
            }
        }

        CrossingFit fit = CrossingFit.Of(points, guess);
        output.WriteLine(FormattableString.Invariant(
            $"threshold {fit.Threshold:F6} ± {fit.StandardError:F6}, exponent {fit.Exponent:F2}, chi-square per degree of freedom {fit.ChiSquarePerFreedom:F2}"));
        return fit;
    }
}
