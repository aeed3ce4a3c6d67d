using FtEstimate.Machines;

namespace FtEstimate.Cycles;

/// <summary>What one look at a check atom gives.</summary>
/// <param name="ExposureSeconds">Time the camera looks.</param>
/// <param name="Threshold">Counts from which the check is called bright; null when the flips are stated.</param>
/// <param name="DarkFlip">Probability that a dark check is called bright.</param>
/// <param name="BrightFlip">Probability that a bright check is called dark.</param>
/// <param name="LossPerLook">Probability to lose an atom in the look.</param>
public sealed record CheckReading(
    double ExposureSeconds,
    int? Threshold,
    double DarkFlip,
    double BrightFlip,
    double LossPerLook)
{
    /// <summary>Mean of the two flips: checks are bright and dark equally often.</summary>
    public double Flip => (DarkFlip + BrightFlip) / 2;

    /// <summary>The reading a detector gives at an exposure.</summary>
    /// <param name="detector">How the atom is seen.</param>
    /// <param name="atomsPerCheck">Atoms that make up the check.</param>
    /// <param name="exposureSeconds">Time the camera looks; ignored by a detector with stated flips.</param>
    public static CheckReading Of(Detector detector, int atomsPerCheck, double exposureSeconds) => detector switch
    {
        StatedReadout stated => new(
            stated.StatedExposureSeconds, null, stated.DarkFlip, stated.BrightFlip, stated.LossPerLook),
        PhotonCounting counting => PhotonStatistics.Read(counting, atomsPerCheck, exposureSeconds),
        _ => throw new ArgumentOutOfRangeException(nameof(detector)),
    };
}
