using FtEstimate.Machines;
using FtEstimate.Quantities;

namespace FtEstimate.Cycles;

/// <summary>
/// Photon counts of a check and the threshold that tells bright from dark.
/// A bright atom counts at its signal rate until it turns dark (depump or loss): a Poisson law with an exponential cut, closed form
/// (the model of Manetsch 2025, arXiv:2403.12021, with the rates as parameters); atoms of an ensemble jump independently.
/// </summary>
public static class PhotonStatistics
{
    /// <summary>Counts beyond which a Poisson law is never found: mean plus this many standard deviations and a margin.</summary>
    private const double TailDeviations = 9;

    private const int TailMargin = 25;

    /// <summary>The reading at the threshold with the smallest mean error.</summary>
    /// <param name="detector">Rates in counts or events per second.</param>
    /// <param name="atoms">Atoms in the check, at least 1.</param>
    /// <param name="exposureSeconds">Exposure, greater than 0.</param>
    public static CheckReading Read(PhotonCounting detector, int atoms, double exposureSeconds)
    {
        int length = HistogramLength(detector, atoms, exposureSeconds);
        double[] bright = BrightCounts(detector, atoms, exposureSeconds, length);
        double[] dark = DarkCounts(detector, atoms, exposureSeconds, length);

        int best = 0;
        double darkFlip = 1;
        double brightFlip = 0;
        double darkAbove = 1;
        double brightBelow = 0;
        for (int k = 1; k < length; k++)
        {
            darkAbove -= dark[k - 1];
            brightBelow += bright[k - 1];
            if (darkAbove + brightBelow < darkFlip + brightFlip)
            {
                (best, darkFlip, brightFlip) = (k, Math.Max(darkAbove, 0), brightBelow);
            }
        }

        double lossPerLook = -ElementaryFunctions.ExpMinusOne(-detector.LossPerSecond * exposureSeconds);
        return new CheckReading(exposureSeconds, best, darkFlip, Math.Min(brightFlip, 1), lossPerLook);
    }

    /// <summary>Probability of 0, 1, … counts from a bright check, background included; the array ends where the dark check is never found.</summary>
    public static double[] BrightCounts(PhotonCounting detector, int atoms, double exposureSeconds, int length)
    {
        double jump = detector.DepumpPerSecond + detector.LossPerSecond;
        double[] one = CountsUntilJump(detector.SignalPerSecond, jump, exposureSeconds, length);
        return Convolve(Power(one, atoms), Poisson(detector.BackgroundPerSecond * exposureSeconds, length));
    }

    /// <summary>Probability of 0, 1, … counts from a dark check, background included.</summary>
    public static double[] DarkCounts(PhotonCounting detector, int atoms, double exposureSeconds, int length)
    {
        double[] background = Poisson(detector.BackgroundPerSecond * exposureSeconds, length);
        if (detector.BrightenPerSecond <= 0 || detector.SignalPerSecond <= 0)
        {
            return background;
        }

        double[] one = CountsAfterJump(detector.SignalPerSecond, detector.BrightenPerSecond, exposureSeconds, length);
        return Convolve(Power(one, atoms), background);
    }

    /// <summary>Length of the histograms that decides every threshold worth trying.</summary>
    public static int HistogramLength(PhotonCounting detector, int atoms, double exposureSeconds)
    {
        double dark = detector.BackgroundPerSecond * exposureSeconds;
        double cut = UpperEnd(dark);
        if (detector.BrightenPerSecond > 0)
        {
            cut = Math.Max(cut, dark + (atoms * detector.SignalPerSecond * exposureSeconds));
        }

        return (int)Math.Min(cut, 5_000) + 1;
    }

    /// <summary>Counts that a Poisson law of this mean practically never exceeds.</summary>
    private static int UpperEnd(double mean) => (int)(mean + (TailDeviations * Math.Sqrt(mean)) + TailMargin);

    /// <summary>Poisson probabilities of 0 … length−1.</summary>
    public static double[] Poisson(double mean, int length)
    {
        double[] p = new double[length];
        double logMean = Math.Log(Math.Max(mean, double.Epsilon));
        double logFactorial = 0;
        for (int n = 0; n < length; n++)
        {
            logFactorial += n > 1 ? Math.Log(n) : 0;
            p[n] = mean <= 0 ? (n == 0 ? 1 : 0) : Math.Exp((n * logMean) - mean - logFactorial);
        }

        return p;
    }

    /// <summary>P₁(n) = e^{−Γt} Pois(n; st) + Γ/(s+Γ) (s/(s+Γ))ⁿ P(n+1, (s+Γ)t).</summary>
    private static double[] CountsUntilJump(double signal, double jump, double seconds, int length)
    {
        double[] counts = Poisson(signal * seconds, length);
        if (jump <= 0)
        {
            return counts;
        }

        double stays = Math.Exp(-jump * seconds);
        double total = signal + jump;
        double[] reached = PoissonAbove(total * seconds, length);
        double weight = jump / total;
        for (int n = 0; n < length; n++)
        {
            counts[n] = (stays * counts[n]) + (weight * reached[n]);
            weight *= signal / total;
        }

        return counts;
    }

    /// <summary>
    /// The mirror image: a dark atom that turns bright at rate γ, e^{−γt}[n=0] + J(n), J(n) = ∫γe^{−γ(t−u)} Pois(n; su) du. Integrating by parts gives
    /// s·J(n−1) = (s−γ)·J(n) + γ·Pois(n; st), which loses no digits downwards; upwards, and in the closed form by gamma functions, it does as γ nears s.
    /// An atom that brightens faster than it counts is as good as bright: γ is cut off at s.
    /// </summary>
    private static double[] CountsAfterJump(double signal, double brighten, double seconds, int length)
    {
        double[] counts = new double[length];
        double bright = signal * seconds;
        double rate = Math.Min(brighten, signal);
        double[] poisson = Poisson(bright, Math.Max(length, UpperEnd(bright)) + 1);
        double after = 0;
        for (int n = poisson.Length - 1; n > 0; n--)
        {
            after = ((1 - (rate / signal)) * after) + (rate / signal * poisson[n]);
            if (n <= length)
            {
                counts[n - 1] = after;
            }
        }

        counts[0] += Math.Exp(-rate * seconds);
        return counts;
    }

    /// <summary>Pr[Poisson(mean) > n] = P(n+1, mean), the regularised lower incomplete gamma function at whole arguments.</summary>
    private static double[] PoissonAbove(double mean, int length)
    {
        double[] above = Poisson(mean, length);
        double below = 0;
        for (int n = 0; n < length; n++)
        {
            below += above[n];
            above[n] = Math.Max(1 - below, 0);
        }

        return above;
    }

    private static double[] Power(double[] one, int times)
    {
        double[] result = one;
        for (int i = 1; i < times; i++)
        {
            result = Convolve(result, one);
        }

        return result;
    }

    private static double[] Convolve(double[] a, double[] b)
    {
        double[] c = new double[a.Length];
        for (int i = 0; i < a.Length; i++)
        {
            if (a[i] <= 0)
            {
                continue;
            }

            for (int j = 0; j < c.Length - i; j++)
            {
                c[i + j] += a[i] * b[j];
            }
        }

        return c;
    }
}
