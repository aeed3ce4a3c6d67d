using FtEstimate.Simulation.Memory;
using MathNet.Numerics.LinearAlgebra;

namespace FtEstimate.Tests.Simulation.Memory;

/// <summary>One measured failure rate near a threshold.</summary>
/// <param name="Distance">Code distance.</param>
/// <param name="Error">Physical error rate.</param>
/// <param name="Count">Shots and failures.</param>
internal readonly record struct CrossingPoint(int Distance, double Error, ShotCount Count);

/// <summary>
/// Where the curves of different distances cross: P = A + Bx + Cx² with x = (p − p_th) d^{1/ν} (Wang 2003, arXiv:quant-ph/0207088), by weighted least squares
/// with Gauss-Newton steps.
/// </summary>
/// <param name="Threshold">p_th.</param>
/// <param name="StandardError">Of p_th; widened where the fit is worse than the shots allow.</param>
/// <param name="Exponent">ν.</param>
/// <param name="ChiSquarePerFreedom">Near 1 for a good fit.</param>
internal readonly record struct CrossingFit(double Threshold, double StandardError, double Exponent, double ChiSquarePerFreedom)
{
    private const int Parameters = 5;

    public static CrossingFit Of(IReadOnlyList<CrossingPoint> points, double guess)
    {
        // p_th, 1/ν and, linear given these, A, B, C
        Vector<double> fitted = Vector<double>.Build.Dense([guess, 0.7, 0, 0, 0]);
        SolveLinearPart(points, fitted);
        Matrix<double> normal = Matrix<double>.Build.Dense(Parameters, Parameters);
        double square = 0;
        for (int step = 0; step < 100; step++)
        {
            (Matrix<double> slopes, Vector<double> residuals) = Linearise(points, fitted);
            normal = slopes.TransposeThisAndMultiply(slopes);
            square = residuals * residuals;
            Vector<double> change = normal.Solve(slopes.TransposeThisAndMultiply(residuals));
            double damping = Math.Min(1, 0.2 * guess / Math.Max(Math.Abs(change[0]), 1e-12));
            fitted += damping * change;
            SolveLinearPart(points, fitted);
        }

        double perFreedom = square / (points.Count - Parameters);
        return new CrossingFit(
            fitted[0], Math.Sqrt(normal.Inverse()[0, 0] * Math.Max(perFreedom, 1)), 1 / fitted[1], perFreedom);
    }

    private static (Matrix<double> Slopes, Vector<double> Residuals) Linearise(IReadOnlyList<CrossingPoint> points, Vector<double> at)
    {
        Matrix<double> slopes = Matrix<double>.Build.Dense(points.Count, Parameters);
        Vector<double> residuals = Vector<double>.Build.Dense(points.Count);
        for (int row = 0; row < points.Count; row++)
        {
            CrossingPoint point = points[row];
            double sigma = point.Count.StandardError();
            double stretch = Math.Pow(point.Distance, at[1]);
            double x = (point.Error - at[0]) * stretch;
            double slope = at[3] + (2 * at[4] * x);
            residuals[row] = (point.Count.Rate() - at[2] - (at[3] * x) - (at[4] * x * x)) / sigma;
            slopes.SetRow(row, [-slope * stretch / sigma, slope * x * Math.Log(point.Distance) / sigma, 1 / sigma, x / sigma, x * x / sigma]);
        }

        return (slopes, residuals);
    }

    private static void SolveLinearPart(IReadOnlyList<CrossingPoint> points, Vector<double> fitted)
    {
        fitted.SetSubVector(2, 3, Vector<double>.Build.Dense(3));
        (Matrix<double> slopes, Vector<double> residuals) = Linearise(points, fitted);
        Matrix<double> linear = slopes.SubMatrix(0, points.Count, 2, 3);
        fitted.SetSubVector(2, 3, linear.QR().Solve(residuals));
    }
}
