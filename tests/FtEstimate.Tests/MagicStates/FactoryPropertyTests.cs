using CsCheck;
using FtEstimate.MagicStates;

namespace FtEstimate.Tests.MagicStates;

public sealed class FactoryPropertyTests
{
    private static readonly Gen<FactoryDesign> Designs = Gen.Int[0, CatalogueGrid.Entries.Length - 1].Select(i => CatalogueGrid.Entries[i].Design);

    // A law A·x^((d+1)/2) from far below threshold to far above it, and any injected error.
    private static readonly Gen<(double Prefactor, double Strength, double Injected)> Laws = Gen.Select(
        Gen.Double[0.01, 0.5], Gen.Double[-2.5, 0.3].Select(e => Math.Pow(10, e)), Gen.Double[-7, -0.3].Select(e => Math.Pow(10, e)));

    [Fact]
    public void Worse_noise_never_gives_a_better_factory()
    {
        // noise grows by its own factor at every distance, and in the injected error
        Gen.Select(Designs, Laws, Gen.Double[0, 2], Gen.Double[0, 2], Gen.Int[0, 1000]).Sample((design, law, morePatch, moreInjected, seed) =>
        {
            double Patch(int d) => law.Prefactor * Math.Pow(law.Strength, (d + 1) / 2.0);
            double Growth(int d) => 1 + morePatch * ((d * 7919 + seed) % 101) / 100.0;
            Factory before = Factory.Of(design, new FactoryNoise(Patch, law.Injected));
            Factory after = Factory.Of(design, new FactoryNoise(d => Patch(d) * Growth(d), law.Injected * (1 + moreInjected)));

            // slack: rounding of a few hundred operations
            return after.OutputError >= before.OutputError * (1 - 1e-11)
                && after.RoundsPerOutput >= before.RoundsPerOutput * (1 - 1e-11)
                && after.Acceptance <= before.Acceptance * (1 + 1e-11);
        }, iter: 20_000);
    }

    [Fact]
    public void Results_are_proper_numbers_at_any_noise()
    {
        Gen<double> anything = Gen.OneOf(Gen.OneOf(0.0, 1e-300, 1e-30, 0.5, 1.0), Gen.Double[-40, 0].Select(e => Math.Pow(10, e)));
        Gen.Select(Designs, anything, anything).Sample((design, patch, injected) =>
        {
            Factory factory = Factory.Of(design, new FactoryNoise(_ => patch, injected));
            return factory.OutputError is >= 0 and <= 0.5 + 1e-12
                && factory.Acceptance is > 0 and <= 1
                && double.IsFinite(factory.RoundsPerOutput);
        }, iter: 5_000);
    }

    [Fact]
    public void Bounds_hold_for_every_design_and_noise()
    {
        Gen.Select(Gen.Int[0, CatalogueGrid.Entries.Length - 1], Laws).Sample((index, law) =>
        {
            GridEntry entry = CatalogueGrid.Entries[index];
            NoiseTable noise = new(new FactoryNoise(d => law.Prefactor * Math.Pow(law.Strength, (d + 1) / 2.0), law.Injected));
            FactoryBounds bounds = entry.FeederIndex < 0
                ? FactoryEvaluation.OneLevelBounds(entry.Design, noise)
                : FactoryEvaluation.TwoLevelBounds(
                    entry.Design, FactoryEvaluation.FirstLevel(CatalogueGrid.Feeders[entry.FeederIndex], noise), noise);
            Factory factory = FactoryEvaluation.Of(entry.Design, noise);
            return bounds.OutputError <= factory.OutputError
                && bounds.RoundsPerOutput <= factory.RoundsPerOutput
                && entry.LeastRounds <= factory.RoundsPerOutput;
        }, iter: 20_000);
    }

    [Fact]
    public void Perfect_gates_leave_ten_point_three_seven_cubes_of_the_injected_error()
    {
        // 35 (2p/3)³ = 10.37 p³, "lowest achievable" (Litinski 2019, arXiv:1905.06903)
        double p = 1e-6;
        Factory factory = Factory.Of(TestNoise.Design("15-to-1:17,7,7"), new FactoryNoise(_ => 0, p));
        Assert.Equal(10.37e-18, factory.OutputError, 0.005e-18);
    }

    [Theory]
    [InlineData(1e-6)]
    [InlineData(1e-3)]
    [InlineData(0.1)]
    public void Perfect_gates_leave_the_exact_polynomials(double p)
    {
        Factory factory = Factory.Of(TestNoise.Design("15-to-1:17,7,7"), new FactoryNoise(_ => 0, p));
        Assert.Equal(FifteenToOne.OutputError(2 * p / 3), factory.OutputError, 1e-12 * factory.OutputError);
        Assert.Equal(FifteenToOne.Acceptance(2 * p / 3), factory.Acceptance, 1e-12);
    }
}
