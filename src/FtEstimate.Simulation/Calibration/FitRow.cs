using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;
using MathNet.Numerics.LinearAlgebra;

namespace FtEstimate.Simulation.Calibration;

/// <summary>One experiment as the fit sees it: its error, and what each weight would contribute to its strength if it were 1.</summary>
/// <param name="Result">The experiment.</param>
/// <param name="LogPerRound">ln of twice its logical error per round: both observables as if both bases were alike.</param>
/// <param name="Variance">Of that logarithm.</param>
/// <param name="PerWeight">Strength per unit weight, one for each <see cref="NoiseWeight"/>.</param>
internal sealed record FitRow(CalibrationResult Result, double LogPerRound, double Variance, double[] PerWeight)
{
    /// <summary>Places of the shape among the parameters; the weights' logarithms follow.</summary>
    public const int LogPrefactor = 0;

    /// <summary>γ.</summary>
    public const int DistanceSlope = 1;

    /// <summary>δ.</summary>
    public const int ExponentOffset = 2;

    /// <summary>ln of the uniform error at which the strength of the textbook circuit is 1.</summary>
    public const int LogUniformThreshold = 3;

    private const int FirstWeight = 4;

    /// <summary>Prepares an experiment.</summary>
    /// <param name="result">At least one failure.</param>
    /// <param name="errorOfLaw">Relative error granted to the law itself.</param>
    public static FitRow Of(CalibrationResult result, double errorOfLaw)
    {
        double perRound = ErrorEstimate.PerShot(result.Count).PerRound(result.Cell.Rounds).Value;
        return new FitRow(
            result,
            Math.Log(2 * perRound),
            (1.0 / result.Count.Failures) + (errorOfLaw * errorOfLaw),
            [.. Enum.GetValues<NoiseWeight>().Select(weight => Contribution(result.Cell, weight))]);
    }

    /// <summary>Strength for given parameters.</summary>
    public double Strength(Vector<double> parameters)
    {
        double x = Result.Cell.UniformError / Math.Exp(parameters[LogUniformThreshold]);
        for (int weight = 0; weight < PerWeight.Length; weight++)
        {
            x += PerWeight[weight] * Math.Exp(parameters[FirstWeight + weight]);
        }

        return x;
    }

    /// <summary>What the law says for given parameters.</summary>
    public double LogByLaw(Vector<double> parameters) =>
        parameters[LogPrefactor]
        + (((parameters[DistanceSlope] * Result.Cell.Distance) - parameters[ExponentOffset]) * Math.Log(Strength(parameters)));

    private static double Contribution(CalibrationCell cell, NoiseWeight weight)
    {
        double[] unit = new double[Enum.GetValues<NoiseWeight>().Length];
        unit[(int)weight] = 1;
        NoiseStrength strength = cell.Errors.Strength(new ChannelWeights([.. unit]));
        return cell.Basis == PauliBasis.X ? strength.X : strength.Z;
    }
}
