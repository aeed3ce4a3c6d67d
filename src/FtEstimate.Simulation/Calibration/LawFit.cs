using System.Collections.Immutable;
using FtEstimate.Noise;
using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.Optimization;

namespace FtEstimate.Simulation.Calibration;

/// <summary>A fitted number.</summary>
/// <param name="Name">Its name in the file of the law.</param>
/// <param name="Value">The value.</param>
/// <param name="StandardError">Its standard error from the fit; 0 where there is none.</param>
public readonly record struct FittedNumber(string Name, double Value, double StandardError);

/// <summary>How far the law lies from one experiment.</summary>
/// <param name="Result">The experiment.</param>
/// <param name="PerRound">Logical error of its basis per round as measured.</param>
/// <param name="ByLaw">The same by the law.</param>
public readonly record struct FitResidual(CalibrationResult Result, double PerRound, double ByLaw)
{
    /// <summary>ln(law/measured).</summary>
    public double LogRatio => Math.Log(ByLaw / PerRound);
}

/// <summary>What a fit gives.</summary>
/// <param name="Numbers">Shape of the law, weights, and how good and how wide the fit is, in the order of the file.</param>
/// <param name="Residuals">One for each experiment with enough failures, fitted or not.</param>
public sealed record FittedLaw(ImmutableArray<FittedNumber> Numbers, ImmutableArray<FitResidual> Residuals);

/// <summary>Fits the simulated law and the weights of all causes together: ½·A·x^(γd − δ) for each basis, with x the sum of weight times rate.</summary>
/// <remarks>
/// Least squares of ln(error per round); each experiment counts with its own statistical error and with 5 % for the law itself, so that the many exact ones
/// do not silence the rare ones. Levenberg and Marquardt's method of MathNet.Numerics; weights and scales enter by their logarithms, so none is negative.
/// </remarks>
public static class LawFit
{
    private const double ErrorOfLaw = 0.05;

    /// <summary>Fewer failures say next to nothing.</summary>
    private const int FewestFailures = 20;

    private const int MostIterations = 1000;

    /// <summary>As close to the best fit as the derivatives, which are differences, allow.</summary>
    private const double Tolerance = 1e-15;

    private static readonly ImmutableArray<string> ShapeNames = ["Prefactor", "DistanceSlope", "ExponentOffset", "UniformThreshold"];
    private static readonly double[] ShapeGuess = [Math.Log(0.07), 0.5, 0.5, Math.Log(0.0065)];
    private static readonly double[] WeightGuess = [65, 97, 70, 30, 18, 1.1, 5.8, 5.9, 5.8, 15, 5.7, 8, 64, 11, 20];

    /// <summary>The fit.</summary>
    public static FittedLaw Of(ImmutableArray<CalibrationResult> results)
    {
        FitRow[] rows = [.. results.Where(result => result.Count.Failures >= FewestFailures).Select(result => FitRow.Of(result, ErrorOfLaw))];
        FitRow[] fitted = [.. rows.Where(row => row.Result.Cell.IsFitted)];
        Vector<double> index = Vector<double>.Build.Dense(fitted.Length, i => i);
        Vector<double> measured = Vector<double>.Build.Dense(fitted.Length, i => fitted[i].LogPerRound);
        Vector<double> weight = Vector<double>.Build.Dense(fitted.Length, i => 1 / fitted[i].Variance);
        Vector<double> Model(Vector<double> parameters, Vector<double> _) => Vector<double>.Build.Dense(fitted.Length, i => fitted[i].LogByLaw(parameters));
        IObjectiveModel objective = ObjectiveFunction.NonlinearModel(Model, index, measured, weight);
        Vector<double> guess = Vector<double>.Build.DenseOfEnumerable(ShapeGuess.Concat(WeightGuess.Select(value => Math.Log(value))));
        NonlinearMinimizationResult fit = new LevenbergMarquardtMinimizer(
            gradientTolerance: Tolerance, stepTolerance: Tolerance, functionTolerance: Tolerance, maximumIterations: MostIterations).FindMinimum(objective, guess);
        Vector<double> best = fit.MinimizingPoint;
        ImmutableArray<FitResidual> residuals =
            [.. rows.Select(row => new FitResidual(row.Result, Math.Exp(row.LogPerRound) / 2, Math.Exp(row.LogByLaw(best)) / 2))];
        IEnumerable<FittedNumber> numbers = Enumerable.Range(0, best.Count).Select(parameter => Number(parameter, best[parameter], fit.StandardErrors[parameter]));
        return new FittedLaw([.. numbers, .. Quality(residuals, [.. fitted.Select(row => (row.Result.Cell.Distance, row.Strength(best)))])], residuals);
    }

    private static FittedNumber Number(int parameter, double value, double error)
    {
        string name = parameter < ShapeNames.Length ? ShapeNames[parameter] : ((NoiseWeight)(parameter - ShapeNames.Length)).ToString();
        bool isLogarithm = parameter is not (FitRow.DistanceSlope or FitRow.ExponentOffset);
        return isLogarithm ? new FittedNumber(name, Math.Exp(value), Math.Exp(value) * error) : new FittedNumber(name, value, error);
    }

    /// <summary>How good the fit is and how far its data reach.</summary>
    private static FittedNumber[] Quality(ImmutableArray<FitResidual> all, (int Distance, double Strength)[] points)
    {
        FitResidual[] fitted = [.. all.Where(residual => residual.Result.Cell.IsFitted)];
        return
        [
            new("TypicalResidual", Math.Sqrt(fitted.Average(residual => residual.LogRatio * residual.LogRatio)), 0),
            new("LargestResidual", fitted.Max(residual => Math.Abs(residual.LogRatio)), 0),
            new("Experiments", fitted.Length, 0),
            new("Shots", fitted.Sum(residual => (double)residual.Result.Count.Shots), 0),
            new("LargestDistance", fitted.Max(residual => residual.Result.Cell.Distance), 0),
            new("SmallestStrength", points.Min(point => point.Strength), 0),
            new("SmallestStrengthAtLargestDistance", points.Where(point => point.Distance == points.Max(other => other.Distance)).Min(point => point.Strength), 0),
            new("LargestStrength", points.Max(point => point.Strength), 0),
        ];
    }
}
