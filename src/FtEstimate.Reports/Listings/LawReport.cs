using System.Collections.Immutable;
using System.Globalization;
using FtEstimate.Noise;
using FtEstimate.Quantities;
using FtEstimate.Reports.Documents;
using FtEstimate.Simulation.Calibration;

namespace FtEstimate.Reports.Listings;

/// <summary>The fitted law as a page: its numbers, and how far it lies from each group of experiments.</summary>
public static class LawReport
{
    private static readonly ImmutableArray<string> WeightNames = [.. Enum.GetNames<NoiseWeight>()];

    /// <summary>The page.</summary>
    public static ReportDocument Of(FittedLaw law) => new(
        "The simulated law",
        [
            new ReportSection(
                "How to read this page",
                [
                    new Paragraph(
                        "The page is made by the command “calibrate” from the experiments in src/FtEstimate/Noise/simulated-cells.csv; a test fails when it is out of date. "
                        + "How the experiments are done stands in simulation.md."),
                    new Paragraph(
                        "Any logical error of one patch in one round is 1/2 [law(x_X) + law(x_Z)] with law(x) = Prefactor · x^(DistanceSlope · d − ExponentOffset). "
                        + "The strength x is the sum of weight times probability over all causes, in each basis. The uniform textbook circuit has x = p / UniformThreshold."),
                ]),
            new ReportSection("Shape", [Numbers(law, name => !WeightNames.Contains(name))]),
            new ReportSection(
                "Weights",
                [
                    Numbers(law, WeightNames.Contains),
                    new Paragraph(
                        "CzGate counts the Pauli probability of one gate for all four layers; the waiting weights likewise one layer's flips for all four. DataFlip counts flips that the basis can see. "
                        + "Losses are per atom and gate slot. “PerRound” weights add to the one above for every further round between two looks. Standard errors are those of the fit alone."),
                ]),
            new ReportSection(
                "How well it fits",
                [
                    Residuals(law, fitted: true),
                    new Paragraph(
                        "Deviations are ln(law/measured): 0.1 is 10 %. They contain the statistical error of the experiments, about 4 % each and more for rare failures."),
                ]),
            new ReportSection(
                "One cause alone, not fitted",
                [
                    Residuals(law, fitted: false),
                    new Paragraph("No machine has only one kind of error. These experiments are kept to see how far a sum of causes can be off at the extremes."),
                ]),
        ]);

    private static Table Numbers(FittedLaw law, Func<string, bool> belongs)
    {
        TableBuilder table = new(new Column("Number", Verbatim: true), new Column("Value", Align.Right), new Column("Standard error", Align.Right));
        foreach (FittedNumber number in law.Numbers)
        {
            if (belongs(number.Name))
            {
                table.Add(number.Name, Value(number.Value), number.StandardError > 0 ? Show.Significant(number.StandardError, 2) : "");
            }
        }

        return table.Build();
    }

    private static Table Residuals(FittedLaw law, bool fitted)
    {
        TableBuilder table = new(
            new Column("Mixture"), new Column("Experiments", Align.Right), new Column("Typical deviation", Align.Right), new Column("Mean", Align.Right), new Column("Largest"));
        foreach (IGrouping<string, FitResidual> group in law.Residuals.Where(residual => residual.Result.Cell.IsFitted == fitted).GroupBy(residual => residual.Result.Cell.Mix))
        {
            FitResidual worst = group.MaxBy(residual => Math.Abs(residual.LogRatio));
            table.Add(
                group.Key,
                Value(group.Count()),
                Deviation(Math.Sqrt(group.Average(residual => residual.LogRatio * residual.LogRatio))),
                Deviation(group.Average(residual => residual.LogRatio)),
                FormattableString.Invariant($"{Deviation(worst.LogRatio)} at d = {worst.Result.Cell.Distance}, {worst.Result.Cell.Basis}"));
        }

        return table.Build();
    }

    private static string Value(double value) =>
        value == Math.Floor(value) && value < 1e6 ? value.ToString("N0", CultureInfo.InvariantCulture) : Show.Significant(value, 4);

    private static string Deviation(double logRatio) => logRatio.ToString("0.00;−0.00;0.00", CultureInfo.InvariantCulture);
}
