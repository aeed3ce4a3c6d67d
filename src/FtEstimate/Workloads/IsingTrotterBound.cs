namespace FtEstimate.Workloads;

/// <summary>
/// Worst-case error of a product formula for H = J Σ ZZ + g Σ X, with the bonds as the outer part of a symmetric step.
/// </summary>
/// <remarks>
/// Childs 2021 (arXiv:1912.08854), equations 120 and 121, with the commutator norms bounded bond by bond and site by site:
/// order 1: 2·|gJ|·B·t²/r; order 2: (4/3·g²·|J|·B + z²/6·|g|·J²·N)·t³/r². Spectral norm of the difference of the two
/// evolutions. Such bounds can lie far above what a local observable needs.
/// </remarks>
/// <param name="Sites">Sites N.</param>
/// <param name="Bonds">Bonds B.</param>
/// <param name="Coordination">Bonds z of a site, at most.</param>
/// <param name="Coupling">J.</param>
/// <param name="Field">g, in the unit of J.</param>
public sealed record IsingTrotterBound(double Sites, double Bonds, int Coordination, double Coupling, double Field)
{
    /// <summary>Largest error of r steps.</summary>
    /// <param name="order">1 or 2.</param>
    /// <param name="time">Evolution time in the inverse unit of J.</param>
    /// <param name="steps">Number of steps.</param>
    /// <exception cref="ArgumentOutOfRangeException">The order is neither 1 nor 2.</exception>
    public double Error(int order, double time, double steps) =>
        Weight(order) * time * Math.Pow(time / steps, order);

    /// <summary>Fewest steps, at least 1, whose bound is at most the error.</summary>
    /// <param name="order">1 or 2.</param>
    /// <param name="time">Evolution time in the inverse unit of J.</param>
    /// <param name="error">Error allowed, above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">The order is neither 1 nor 2.</exception>
    public double Steps(int order, double time, double error)
    {
        double exact = time * Math.Pow(Weight(order) * time / error, 1.0 / order);

        // a hair is taken off so that a whole number is not rounded up to the next
        return Math.Max(1, Math.Ceiling(exact * (1 - 1e-12)));
    }

    private double Weight(int order)
    {
        double coupling = Math.Abs(Coupling);
        double field = Math.Abs(Field);
        return order switch
        {
            1 => 2 * field * coupling * Bonds,
            2 => 4.0 / 3 * field * field * coupling * Bonds + Coordination * Coordination / 6.0 * field * coupling * coupling * Sites,
            _ => throw new ArgumentOutOfRangeException(nameof(order), order, "The order must be 1 or 2."),
        };
    }
}
