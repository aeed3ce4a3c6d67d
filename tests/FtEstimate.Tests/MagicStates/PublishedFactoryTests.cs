using FtEstimate.MagicStates;

namespace FtEstimate.Tests.MagicStates;

/// <summary>Every one-level and two-level 15-to-1 row of Table 1 of Litinski 2019, arXiv:1905.06903.</summary>
public sealed class PublishedFactoryTests
{
    public static TheoryData<string> Designs => [.. PublishedFactory.All.Select(row => row.Design)];

    [Theory, MemberData(nameof(Designs))]
    public void Atoms_match_the_published_row(string design)
    {
        (PublishedFactory row, Factory factory) = Evaluate(design);
        Assert.Equal(row.Atoms, factory.Atoms);
    }

    [Theory, MemberData(nameof(Designs))]
    public void Rounds_per_state_match_the_published_row(string design)
    {
        // the last digit of the column, at most 0.01 %
        (PublishedFactory row, Factory factory) = Evaluate(design);
        Assert.Equal(row.RoundsPerOutput, factory.RoundsPerOutput, 1e-4 * row.RoundsPerOutput);
    }

    [Theory, MemberData(nameof(Designs))]
    public void Output_error_matches_the_published_row(string design)
    {
        // the twirl of P_{±π/4} errors moves it by 0.2 % at one level and 0.6 % at two
        (PublishedFactory row, Factory factory) = Evaluate(design);
        Assert.Equal(row.OutputError, factory.OutputError, 0.006 * row.OutputError + row.HalfLastDigit);
    }

    [Theory, MemberData(nameof(Designs))]
    public void Rejection_matches_the_published_row(string design)
    {
        // two rows are known to two or three digits
        (PublishedFactory row, Factory factory) = Evaluate(design);
        Assert.Equal(row.Rejection, 1 - factory.Acceptance, 0.01 * row.Rejection);
    }

    [Theory, MemberData(nameof(Designs))]
    public void Catalogue_contains_the_published_row(string design) =>
        Assert.Contains(FactoryCatalogue.All(TestNoise.Textbook(1e-3)), entry => entry.Factory.Name == design);

    private static (PublishedFactory Row, Factory Factory) Evaluate(string design)
    {
        PublishedFactory row = PublishedFactory.All.Single(candidate => candidate.Design == design);
        return (row, Factory.Of(TestNoise.Design(design), TestNoise.Textbook(row.PhysicalError)));
    }
}
