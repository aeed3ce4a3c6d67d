using System.Collections.Immutable;
using FtEstimate.MagicStates;

namespace FtEstimate.Tests.MagicStates;

public sealed class FactoryCatalogueTests
{
    [Theory]
    [InlineData(1e-4, 1e-10)]
    [InlineData(1e-4, 1e-15)]
    [InlineData(1e-3, 1e-7)]
    [InlineData(1e-3, 1e-11)]
    [InlineData(1e-3, 1e-19)]
    [InlineData(3e-3, 1e-10)]
    [InlineData(4e-3, 1e-6)]
    public void Skipping_designs_changes_nothing(double p, double errorAtMost)
    {
        // the definition, applied to all pairs of the whole grid
        Factory[] goodEnough = [.. FactoryCatalogue.All(TestNoise.Textbook(p)).Select(e => e.Factory).Where(f => f.OutputError <= errorAtMost)];
        double floor = 1e-2 * errorAtMost;
        string[] expected = [.. goodEnough.Where((factory, i) => !goodEnough.Where((other, j) => i != j && Beats(other, factory, floor, j < i)).Any())
            .Select(factory => factory.Name)];

        Assert.NotEmpty(expected);
        Assert.Equal(expected, FactoryCatalogue.Undominated(TestNoise.Textbook(p), errorAtMost).Select(factory => factory.Name));
    }

    [Fact]
    public void The_whole_grid_marks_what_another_design_beats()
    {
        ImmutableArray<CatalogueEntry> all = FactoryCatalogue.All(TestNoise.Textbook(1e-3));
        for (int i = 0; i < all.Length; i++)
        {
            bool beaten = all.Where((other, j) => i != j && Beats(other.Factory, all[i].Factory, 0, j < i)).Any();
            Assert.Equal(beaten, all[i].Dominated);
        }
    }

    [Fact]
    public void The_grid_has_no_design_twice_and_no_more_than_2500()
    {
        string[] names = [.. CatalogueGrid.Entries.Select(entry => entry.Design.ToString())];
        Assert.InRange(names.Length, 1000, 2500);
        Assert.Equal(names.Length, names.Distinct().Count());
    }

    [Fact]
    public void No_design_is_good_enough_above_threshold() =>
        Assert.Empty(FactoryCatalogue.Undominated(TestNoise.Textbook(0.02), 1e-6));

    [Fact]
    public void A_known_noise_is_not_evaluated_again()
    {
        FactoryCatalogue catalogue = new();
        NoiseKey key = new(1, 2, 3, 4);
        ImmutableArray<Factory> first = catalogue.Undominated(key, () => TestNoise.Textbook(1e-3), 8e-11);
        ImmutableArray<Factory> second = catalogue.Undominated(key, () => throw new InvalidOperationException("asked again"), 9e-11);
        Assert.Equal(first, second);
    }

    [Fact]
    public void The_error_asked_for_is_rounded_up_to_an_eighth_of_a_decade()
    {
        FactoryCatalogue catalogue = new();
        foreach (double errorAtMost in new[] { 1e-10, 0.76e-10, 0.9e-10 })
        {
            Assert.Equal(
                FactoryCatalogue.Undominated(TestNoise.Textbook(1e-3), 1e-10).AsEnumerable(),
                catalogue.Undominated(default, () => TestNoise.Textbook(1e-3), errorAtMost).AsEnumerable());
        }
    }

    [Fact]
    public void Several_threads_find_the_same()
    {
        FactoryCatalogue catalogue = new();
        string[][] found = new string[16][];
        Parallel.For(0, found.Length, i => found[i] = [.. catalogue
            .Undominated(new NoiseKey(i % 2, 0, 0, 0), () => TestNoise.Textbook(i % 2 == 0 ? 1e-3 : 1e-4), 1e-12)
            .Select(factory => factory.ToString())]);
        for (int i = 2; i < found.Length; i++)
        {
            Assert.Equal(found[i - 2], found[i]);
        }
    }

    private static bool Beats(Factory other, Factory factory, double floor, bool listedEarlier)
    {
        double otherError = Math.Max(other.OutputError, floor);
        double error = Math.Max(factory.OutputError, floor);
        bool noWorse = other.Atoms <= factory.Atoms && other.RoundsPerOutput <= factory.RoundsPerOutput && otherError <= error;
        bool better = other.Atoms < factory.Atoms || other.RoundsPerOutput < factory.RoundsPerOutput || otherError < error;
        return noWorse && (better || listedEarlier);
    }
}
