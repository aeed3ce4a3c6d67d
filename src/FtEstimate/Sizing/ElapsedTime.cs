using FtEstimate.Quantities;

namespace FtEstimate.Sizing;

/// <summary>What interrupts a run.</summary>
/// <param name="MeanSecondsBetweenStops">Mean time between unplanned stops, above 0; null: none.</param>
/// <param name="SecondsToRestart">Repair after a stop, 0 or more.</param>
/// <param name="StartSeconds">Preparation of each shot, 0 or more.</param>
/// <param name="CalibrationFraction">Share of the time spent calibrating, 0 up to but not including 1.</param>
public sealed record Interruptions(
    double? MeanSecondsBetweenStops,
    double SecondsToRestart,
    double StartSeconds,
    double CalibrationFraction)
{
    /// <summary>A machine that never stops and needs no care.</summary>
    public static Interruptions None { get; } = new(null, 0, 0, 0);
}

/// <summary>Expected time on the wall clock until all shots have succeeded.</summary>
/// <param name="Seconds">Expected elapsed seconds; null: the run does not finish.</param>
/// <param name="WorkingSeconds">One shot with its share of calibration.</param>
/// <param name="StopsPerShot">Mean number of stops within one uninterrupted shot, λ·T_w; 0 where there are none.</param>
public sealed record ElapsedTime(double? Seconds, double WorkingSeconds, double StopsPerShot)
{
    /// <summary>Above this a shot gets through in fewer than one of twenty tries.</summary>
    public const double MostStopsPerShot = 3;

    /// <summary>False where the expectation is infinite, or so many stops fall into a shot that nobody would wait.</summary>
    public bool FinishesInPractice => Seconds is not null && StopsPerShot <= MostStopsPerShot;

    /// <summary>Mean time between stops at which one stop falls into a shot; worth printing where the run does not finish in practice.</summary>
    public double NeededSecondsBetweenStops => WorkingSeconds;

    /// <summary>
    /// Expected elapsed time of a run that starts a shot from its beginning after each stop, and repeats failed shots.
    /// </summary>
    /// <remarks>
    /// With stops at exponential intervals of rate λ and repair time R a shot takes (e^(λT) − 1)(1/λ + R) on average, exact for
    /// stops that do not strike during repair; without stops it takes T. T is the run time over 1 − calibration.
    /// </remarks>
    /// <param name="shotSeconds">Run time of one shot, 0 or more.</param>
    /// <param name="shots">Shots that must succeed, above 0.</param>
    /// <param name="shotFailureProbability">Chance that a shot that ran to its end is wrong and is repeated, 0 to 1.</param>
    /// <param name="interruptions">What interrupts the run.</param>
    public static ElapsedTime Of(double shotSeconds, double shots, double shotFailureProbability, Interruptions interruptions)
    {
        double working = shotSeconds / (1 - interruptions.CalibrationFraction);
        double stops = interruptions.MeanSecondsBetweenStops is double mean ? Math.Min(working / mean, double.MaxValue) : 0;
        double shot = working;
        if (stops > 0)
        {
            // e^x − 1 over x is 1 in the limit, so the form is safe for very rare stops
            double growth = ElementaryFunctions.ExpMinusOne(stops) / stops;
            shot = growth * (working + stops * interruptions.SecondsToRestart);
        }

        double elapsed = shots * (shot + interruptions.StartSeconds) / (1 - shotFailureProbability);
        return new ElapsedTime(double.IsFinite(elapsed) ? elapsed : null, working, stops);
    }
}
