using System.Collections.Immutable;
using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;
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

/// <summary>
/// Fits the simulated law and the weights of all causes together: ½·A·x^(γd − δ + η/d) for each basis, with x the sum of weight times rate.
/// </summary>
/// <remarks>
/// Least squares of ln(error per round); each experiment counts with its own statistical error and with 5 % for the law itself, so that the many exact ones
/// do not silence the rare ones. Levenberg and Marquardt's method of MathNet.Numerics; weights and scales enter by their logarithms, so none is negative.
/// </remarks>
public static class LawFit
{
    private const double ErrorOfLaw = 0.05;

    /// <summary>Fewer failures say next to nothing.</summary>
    private const int FewestFailures = 10;

    private static readonly ImmutableArray<string> ShapeNames = ["Prefactor", "DistanceSlope", "ExponentOffset", "InverseDistance", "UniformThreshold"];
    private static readonly double[] ShapeGuess = [Math.Log(0.05), 0.53, 0.2, 0.1, Math.Log(0.0062)];
    private static readonly double[] WeightGuess = [92, 107, 107, 34, 22, 5, 13, 5.5, 5, 22, 4, 22, 92, 34, 92];

    /// <summary>The fit.</summary>
    public static FittedLaw Of(ImmutableArray<CalibrationResult> results)
    {
        Row[] rows = [.. results.Where(result => result.Count.Failures >= FewestFailures).Select(result => Row.Of(result))];
        Vector<double> index = Vector<double>.Build.Dense(rows.Length, i => i);
        Vector<double> measured = Vector<double>.Build.Dense(rows.Length, i => rows[i].LogPerRound);
        Vector<double> weight = Vector<double>.Build.Dense(rows.Length, i => 1 / rows[i].Variance);
        Vector<double> Model(Vector<double> parameters, Vector<double> _) => Vector<double>.Build.Dense(rows.Length, i => rows[i].LogByLaw(parameters));
        IObjectiveModel objective = ObjectiveFunction.NonlinearModel(Model, index, measured, weight);
        Vector<double> guess = Vector<double>.Build.DenseOfEnumerable(ShapeGuess.Concat(WeightGuess.Select(weight => Math.Log(weight))));
        NonlinearMinimizationResult fit = new LevenbergMarquardtMinimizer(maximumIterations: 500).FindMinimum(objective, guess);
        Vector<double> best = fit.MinimizingPoint;
        return new FittedLaw(
            [.. Enumerable.Range(0, best.Count).Select(parameter => Number(parameter, best[parameter], fit.StandardErrors[parameter]))],
            [.. rows.Select(row => new FitResidual(row.Result, Math.Exp(row.LogPerRound) / 2, Math.Exp(row.LogByLaw(best)) / 2))]);
    }

    private static FittedNumber Number(int parameter, double value, double error)
    {
        string name = parameter < ShapeNames.Length ? ShapeNames[parameter] : ((NoiseWeight)(parameter - ShapeNames.Length)).ToString();
        bool isLogarithm = parameter is not (1 or 2 or 3);
        return isLogarithm ? new FittedNumber(name, Math.Exp(value), Math.Exp(value) * error) : new FittedNumber(name, value, error);
    }

    /// <summary>One experiment, with what each weight would contribute if it were 1.</summary>
    private sealed record Row(CalibrationResult Result, double LogPerRound, double Variance, double[] PerWeight)
    {
        public static Row Of(CalibrationResult result)
        {
            double perRound = ErrorEstimate.PerShot(result.Count).PerRound(result.Cell.Rounds).Value;
            return new Row(
                result,
                Math.Log(2 * perRound),
                (1.0 / result.Count.Failures) + (ErrorOfLaw * ErrorOfLaw),
                [.. Enum.GetValues<NoiseWeight>().Select(weight => Contribution(result.Cell, weight))]);
        }

        public double LogByLaw(Vector<double> parameters)
        {
            double x = Result.Cell.UniformError / Math.Exp(parameters[4]);
            for (int weight = 0; weight < PerWeight.Length; weight++)
            {
                x += PerWeight[weight] * Math.Exp(parameters[ShapeNames.Length + weight]);
            }

            int distance = Result.Cell.Distance;
            return parameters[0] + (((parameters[1] * distance) - parameters[2] + (parameters[3] / distance)) * Math.Log(x));
        }

        private static double Contribution(CalibrationCell cell, NoiseWeight weight)
        {
            double[] unit = new double[Enum.GetValues<NoiseWeight>().Length];
            unit[(int)weight] = 1;
            NoiseStrength strength = cell.Errors.Strength(new ChannelWeights([.. unit]));
            return cell.Basis == PauliBasis.X ? strength.X : strength.Z;
        }
    }
}
