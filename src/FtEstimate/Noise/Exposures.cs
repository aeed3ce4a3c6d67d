using FtEstimate.Cycles;
using FtEstimate.Machines;

namespace FtEstimate.Noise;

/// <summary>The exposures a sizing tries.</summary>
public static class Exposures
{
    /// <summary>Points per decade of the exposure grid, which does not depend on the machine.</summary>
    public const int PerDecade = 24;

    private const double ShortestSeconds = 1e-7;

    private const double LongestSeconds = 1;

    /// <summary>Background beyond which histograms would be cut: no camera is run there.</summary>
    private const double MostBackgroundCounts = 1_000;

    /// <summary>
    /// The stated exposure; or, when it is left to the sizing, the points of a fixed grid from a hundredth of the exposure with the fewest flips
    /// up to that one: a longer look flips more and waits longer.
    /// </summary>
    public static IReadOnlyList<double> ToTry(ReadoutScheme scheme)
    {
        if (scheme.Detector is not PhotonCounting counting)
        {
            return [((StatedReadout)scheme.Detector).StatedExposureSeconds];
        }

        if (counting.ExposureSeconds is { } stated)
        {
            return [stated];
        }

        int last = FewestFlips(counting, scheme.AtomsPerCheck);
        int first = Math.Max(0, last - (2 * PerDecade));
        double[] seconds = new double[last - first + 1];
        for (int i = 0; i < seconds.Length; i++)
        {
            seconds[i] = Grid(first + i);
        }

        return seconds;
    }

    private static double Grid(int index) => ShortestSeconds * Math.Pow(10, (double)index / PerDecade);

    /// <summary>Grid point with the fewest flips; beyond it depumping and background win, or nothing is left to gain.</summary>
    private static int FewestFlips(PhotonCounting counting, int atoms)
    {
        const double nothingToGain = 1e-8;
        int best = 0;
        double fewest = 1;
        for (int i = 0; Grid(i) <= LongestSeconds; i++)
        {
            if (i > 0 && counting.BackgroundPerSecond * Grid(i) > MostBackgroundCounts)
            {
                break;
            }

            double flip = PhotonStatistics.Read(counting, atoms, Grid(i)).Flip;
            if (flip < fewest)
            {
                (best, fewest) = (i, flip);
            }

            bool pastBest = i > best + PerDecade && fewest < 0.4;
            if (fewest < nothingToGain || pastBest)
            {
                break;
            }
        }

        return best;
    }
}
