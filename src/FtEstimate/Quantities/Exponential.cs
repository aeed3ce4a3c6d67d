namespace FtEstimate.Quantities;

/// <summary>Exponentials of small arguments without loss of digits.</summary>
public static class Exponential
{
    /// <summary>e^x − 1, to 13 digits relative for every x.</summary>
    public static double MinusOne(double x)
    {
        if (Math.Abs(x) > 1e-2)
        {
            return Math.Exp(x) - 1;
        }

        // Taylor to fifth order: the next term is below 2e-13 of the first
        return x * (1 + (x / 2 * (1 + (x / 3 * (1 + (x / 4 * (1 + (x / 5))))))));
    }
}
