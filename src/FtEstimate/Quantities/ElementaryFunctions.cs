namespace FtEstimate.Quantities;

/// <summary>
/// ln(1 + x) and eˣ − 1 that keep all their digits for small x, which the library's own
/// <c>double.LogP1</c> and <c>double.ExpM1</c> do not.
/// </summary>
/// <remarks>Kahan's correction by the rounding error of 1 + x and of eˣ; good to about four units in the last place.</remarks>
public static class ElementaryFunctions
{
    /// <summary>ln(1 + x), for x ≥ −1; minus infinity at −1.</summary>
    public static double LogOnePlus(double x)
    {
        double sum = 1 + x;
        return sum == 1 || double.IsPositiveInfinity(sum) ? x
            : sum == 0 ? double.NegativeInfinity
            : Math.Log(sum) * (x / (sum - 1));
    }

    /// <summary>eˣ − 1, for any x; infinity where eˣ overflows.</summary>
    public static double ExpMinusOne(double x)
    {
        if (Math.Abs(x) > 0.5)
        {
            return Math.Exp(x) - 1;
        }

        if (Math.Abs(x) < 1e-3)
        {
            // waiting errors ask for this case a million times; the next term is below 2e-18 of the first
            return x * (1 + (x / 2 * (1 + (x / 3 * (1 + (x / 4 * (1 + (x / 5))))))));
        }

        double power = Math.Exp(x);
        return power == 1 ? x : (power - 1) * (x / Math.Log(power));
    }
}
