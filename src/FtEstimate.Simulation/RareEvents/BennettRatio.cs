namespace FtEstimate.Simulation.RareEvents;

/// <summary>The ratio of two sums of weights from samples of both (Bennett 1976; with g(x) = 1/(1+x) as Bravyi 2013, arXiv:1308.6270).</summary>
internal static class BennettRatio
{
    private const int MostIterations = 200;
    private const double CloseEnough = 1e-10;

    /// <summary>ln(Z′/Z), where samples come from π/Z and π′/Z′.</summary>
    /// <param name="upper">ln(π′/π) of each sample from π; not empty.</param>
    /// <param name="lower">ln(π′/π) of each sample from π′; not empty.</param>
    public static double LogOf(ReadOnlySpan<double> upper, ReadOnlySpan<double> lower)
    {
        double log = 0;
        foreach (double weight in upper)
        {
            log += weight / upper.Length;
        }

        for (int iteration = 0; iteration < MostIterations; iteration++)
        {
            double above = 0;
            foreach (double weight in upper)
            {
                above += 1 / (1 + Math.Exp(log - weight));
            }

            double below = 0;
            foreach (double weight in lower)
            {
                below += 1 / (1 + Math.Exp(weight - log));
            }

            double step = Math.Log(above / upper.Length) - Math.Log(below / lower.Length);
            log += step;
            if (Math.Abs(step) < CloseEnough)
            {
                break;
            }
        }

        return log;
    }

    /// <summary>ln(Z′/Z) from samples of π alone: ln⟨π′/π⟩, without bias before the logarithm.</summary>
    public static double LogForward(ReadOnlySpan<double> upper)
    {
        double largest = double.NegativeInfinity;
        foreach (double weight in upper)
        {
            largest = Math.Max(largest, weight);
        }

        double sum = 0;
        foreach (double weight in upper)
        {
            sum += Math.Exp(weight - largest);
        }

        return largest + Math.Log(sum / upper.Length);
    }
}
