using System.Collections.Immutable;

namespace FtEstimate.Files.Comparisons;

/// <summary>A published figure to hold ours against.</summary>
/// <param name="Topic">Heading it belongs to.</param>
/// <param name="Kind">How ours is computed: scenario, factory, distance, law, factoring, rotation or move.</param>
/// <param name="Subject">What is computed, in the notation of the kind.</param>
/// <param name="Figure">Which figure of it.</param>
/// <param name="Published">The published value, in SI units.</param>
/// <param name="AsPrinted">The published value with the digits it has in print.</param>
/// <param name="Source">First author, year, arXiv number.</param>
/// <param name="Remark">Why the two may differ; empty: no remark.</param>
public sealed record PublishedFigure(
    string Topic, string Kind, string Subject, string Figure, double Published, string AsPrinted, string Source, string Remark);

/// <summary>Our figure beside the published one.</summary>
/// <param name="Figure">The published figure.</param>
/// <param name="Ours">What the tool computes.</param>
public sealed record Comparison(PublishedFigure Figure, double Ours)
{
    /// <summary>Relative deviation of ours from the published one.</summary>
    public double Deviation => (Ours - Figure.Published) / Figure.Published;
}

/// <summary>The outcome of reading a table of published figures.</summary>
/// <param name="Comparisons">Our figures beside the published ones, in the order of the table.</param>
/// <param name="Faults">What is wrong with the table.</param>
public sealed record ComparisonReading(ImmutableArray<Comparison> Comparisons, ImmutableArray<Fault> Faults);
