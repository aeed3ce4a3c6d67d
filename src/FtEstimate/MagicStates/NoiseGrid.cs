namespace FtEstimate.MagicStates;

/// <summary>A geometric grid of probabilities or noise strengths in steps of 2 %; values are rounded up, so estimates stay safe.</summary>
public static class NoiseGrid
{
    /// <summary>The bin of the value zero.</summary>
    public const int ZeroBin = int.MinValue;

    /// <summary>Ratio of neighbouring values.</summary>
    public const double Ratio = 1.02;

    private static readonly double LogRatio = Math.Log(Ratio);

    /// <summary>The lowest bin whose value is not below the given one.</summary>
    /// <param name="value">Finite and not negative.</param>
    /// <exception cref="ArgumentOutOfRangeException">The value is negative or not finite.</exception>
    public static int BinAbove(double value)
    {
        if (!double.IsFinite(value) || value < 0)
        {
            throw new ArgumentOutOfRangeException(nameof(value), value, "A probability or noise strength is finite and not negative.");
        }

        if (value == 0)
        {
            return ZeroBin;
        }

        // the logarithm may land one bin off
        int bin = (int)Math.Round(Math.Log(value) / LogRatio) - 1;
        while (ValueOf(bin) < value)
        {
            bin++;
        }

        return bin;
    }

    /// <summary>The value of a bin, 1.02 to the power of its number.</summary>
    public static double ValueOf(int bin) => bin == ZeroBin ? 0 : Math.Pow(Ratio, bin);

    /// <summary>A value rounded up to the grid.</summary>
    /// <param name="value">Finite and not negative.</param>
    /// <exception cref="ArgumentOutOfRangeException">The value is negative or not finite.</exception>
    public static double RoundUp(double value) => ValueOf(BinAbove(value));
}
