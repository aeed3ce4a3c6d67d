using System.Collections.Immutable;
using FtEstimate.Files.Calibration;
using FtEstimate.Noise;
using FtEstimate.Reports.Listings;
using FtEstimate.Reports.Writers;
using FtEstimate.Simulation.Calibration;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Simulation.Calibration;

public sealed class LawFitTests
{
    private static readonly string CellsPath = RepositoryFiles.At("src", "FtEstimate", "Noise", CalibrationTable.FileName);

    private static readonly ImmutableArray<CalibrationResult> Results = CalibrationTable.ReadFile(CellsPath).Results;

    [Fact]
    public void The_committed_table_holds_every_experiment_of_the_grid()
    {
        CalibrationReading reading = CalibrationTable.ReadFile(CellsPath);

        Assert.Empty(reading.Faults);
        Assert.Equal(CalibrationGrid.Cells.Length, reading.Results.Length);
    }

    // four digits are written; another processor may round the last one differently
    [Fact]
    public void The_law_in_use_is_the_fit_of_the_committed_experiments() => Assert.All(
        LawFit.Of(Results).Numbers,
        number => Assert.Equal(1, FittedNumbers.Value(number.Name) / number.Value, 2e-3));

    [Fact]
    public void The_page_of_the_law_is_up_to_date() => Assert.Equal(
        File.ReadAllText(RepositoryFiles.At("docs", "simulated-law.md")).ReplaceLineEndings("\n"),
        MarkdownWriter.Write(LawReport.Of(LawFit.Of(Results))).ReplaceLineEndings("\n"));

    [Theory]
    [InlineData(3)]
    [InlineData(5)]
    public void An_experiment_run_again_with_its_seed_gives_the_same_counts(int distance)
    {
        int index = Cheapest(distance);

        Assert.Equal(Results[index], CalibrationRun.Run(index, 2, CancellationToken.None), CompareCounts);
    }

    // 4 combined standard errors: one false alarm in 16,000
    [Theory]
    [InlineData(3)]
    [InlineData(5)]
    [InlineData(7)]
    public void An_experiment_run_again_with_another_seed_agrees_within_its_error(int distance)
    {
        CalibrationResult before = Results[Cheapest(distance)];

        ShotCount again = MemoryRun.Run(
            before.Cell.Experiment(), CalibrationRun.PlanOf(before.Cell, before.Seed + 1_000_000), default, 2, null, CancellationToken.None).Count;

        double logRatio = Math.Log((double)again.Failures / again.Shots * before.Count.Shots / before.Count.Failures);
        Assert.InRange(Math.Abs(logRatio), 0, 4 * Math.Sqrt((1.0 / again.Failures) + (1.0 / before.Count.Failures)));
    }

    // counts made from a known law must give that law back; they are rounded to whole failures, hence 1 %
    [Fact]
    public void The_fit_finds_the_law_that_made_the_data()
    {
        double[] weights = [.. Enum.GetValues<NoiseWeight>().Select(weight => ChannelWeights.Fitted[weight] * ((int)weight % 2 == 0 ? 1.1 : 0.8))];
        ImmutableArray<CalibrationResult> made = [.. CalibrationGrid.Cells.Select(cell => Made(cell, new ChannelWeights([.. weights])))];

        FittedLaw law = LawFit.Of(made);

        Assert.All(Enum.GetValues<NoiseWeight>(), weight => Assert.Equal(1, law.Numbers.Single(number => number.Name == weight.ToString()).Value / weights[(int)weight], 0.01));
        Assert.Equal(0.55, law.Numbers.Single(number => number.Name == "DistanceSlope").Value, 0.005);
        Assert.Equal(0.006, law.Numbers.Single(number => number.Name == "UniformThreshold").Value, 6e-5);
    }

    private static CalibrationResult Made(CalibrationCell cell, ChannelWeights weights)
    {
        NoiseStrength strength = cell.Errors.Strength(weights) + NoiseStrength.Even(cell.UniformError / 0.006);
        double x = cell.Basis == PauliBasis.X ? strength.X : strength.Z;
        double perRound = 0.5 * 0.06 * Math.Pow(x, (0.55 * cell.Distance) - 0.3);
        double perShot = FtEstimate.SurfaceCode.MemoryError.AfterRounds(Math.Min(perRound, 0.4), cell.Rounds);
        const long shots = 1_000_000_000_000_000;
        return new CalibrationResult(cell, 1, new ShotCount(shots, (long)(perShot * shots)));
    }

    private static int Cheapest(int distance) => Enumerable.Range(0, Results.Length)
        .Where(index => Results[index].Cell.Distance == distance)
        .MinBy(index => Results[index].Count.Shots);

    private static bool CompareCounts(CalibrationResult a, CalibrationResult b) => a.Count == b.Count && a.Seed == b.Seed;
}
