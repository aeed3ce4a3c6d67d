using System.Globalization;

namespace FtEstimate.Reports.Figures;

/// <summary>Rounds the lines of a ledger so that they add up to the rounded total as printed.</summary>
internal static class Apportion
{
    /// <summary>Whole numbers whose sum is the rounded sum: each is the step of the rounded running sum.</summary>
    public static double[] ToWhole(ReadOnlySpan<double> parts) => ToMultiples(parts, 1);

    /// <summary>Tenths of a per cent of a total of 1: "12.3 %", "less than 0.1 %" where nothing is left of it.</summary>
    public static string[] ToPercent(ReadOnlySpan<double> shares)
    {
        double[] tenths = LargestRemainders(shares, 1000);
        string[] shown = new string[shares.Length];
        for (int i = 0; i < shown.Length; i++)
        {
            shown[i] = tenths[i] == 0 && shares[i] > 0
                ? "< 0.1 %"
                : (tenths[i] / 10).ToString("F1", CultureInfo.InvariantCulture) + " %";
        }

        return shown;
    }

    /// <summary>Small numbers to three digits of their sum, with the sum last; all with the same decimals and the same power of ten.</summary>
    public static string[] ToSmallNumbers(ReadOnlySpan<double> parts)
    {
        const int decimalsOfPowers = 2;
        double sum = 0;
        foreach (double part in parts)
        {
            sum += part;
        }

        string[] shown = new string[parts.Length + 1];
        if (!(sum > double.Epsilon))
        {
            Array.Fill(shown, "0");
            return shown;
        }

        int exponent = (int)Math.Floor(Math.Log10(sum));
        bool asPower = exponent < -3;
        double unit = asPower ? Math.Pow(10, exponent) : 1;
        int decimals = asPower ? decimalsOfPowers : Math.Max(0, decimalsOfPowers - exponent);
        double step = Math.Pow(10, -decimals);
        string format = "F" + decimals.ToString(CultureInfo.InvariantCulture);
        string ending = asPower ? "e" + exponent.ToString(CultureInfo.InvariantCulture) : "";
        double before = 0;
        double running = 0;
        for (int i = 0; i < parts.Length; i++)
        {
            running += parts[i];
            double until = Math.Round(running / unit / step);
            shown[i] = ((until - before) * step).ToString(format, CultureInfo.InvariantCulture) + ending;
            before = until;
        }

        shown[^1] = (before * step).ToString(format, CultureInfo.InvariantCulture) + ending;
        return shown;
    }

    /// <summary>Multiples of a step whose sum is the sum rounded to that step, in the order of a running sum.</summary>
    public static double[] ToMultiples(ReadOnlySpan<double> parts, double step)
    {
        double[] rounded = new double[parts.Length];
        double sum = 0;
        double before = 0;
        for (int i = 0; i < rounded.Length; i++)
        {
            sum += parts[i];
            double until = Math.Round(sum / step);
            rounded[i] = (until - before) * step;
            before = until;
        }

        return rounded;
    }

    /// <summary>Largest remainders: every share is rounded down, and the units left go to those that lost most.</summary>
    private static double[] LargestRemainders(ReadOnlySpan<double> shares, double units)
    {
        double[] whole = new double[shares.Length];
        double left = 0;
        for (int i = 0; i < whole.Length; i++)
        {
            whole[i] = Math.Floor(shares[i] * units);
            left += (shares[i] * units) - whole[i];
        }

        for (int given = (int)Math.Round(left); given > 0; given--)
        {
            int neediest = 0;
            for (int i = 1; i < whole.Length; i++)
            {
                if ((shares[i] * units) - whole[i] > (shares[neediest] * units) - whole[neediest])
                {
                    neediest = i;
                }
            }

            whole[neediest]++;
        }

        return whole;
    }
}
