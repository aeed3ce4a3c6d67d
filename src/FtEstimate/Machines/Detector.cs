namespace FtEstimate.Machines;

/// <summary>How a check atom is seen.</summary>
/// <param name="ExposureSeconds">Time the camera looks; null: chosen by the sizing.</param>
/// <param name="TransferSeconds">From the end of the exposure to the counts in the computer.</param>
/// <param name="TellsLoss">Whether the readout tells a lost atom from a dark one.</param>
public abstract record Detector(double? ExposureSeconds, double TransferSeconds, bool TellsLoss);

/// <summary>A detector known by its photon counts.</summary>
/// <param name="SignalPerSecond">Detected photons of one bright atom.</param>
/// <param name="BackgroundPerSecond">Detected counts without an atom.</param>
/// <param name="DepumpPerSecond">Rate at which a bright atom turns dark.</param>
/// <param name="LossPerSecond">Rate at which a bright atom is lost.</param>
/// <param name="BrightenPerSecond">Rate at which a dark atom turns bright.</param>
/// <param name="ExposureSeconds">See <see cref="Detector"/>.</param>
/// <param name="TransferSeconds">See <see cref="Detector"/>.</param>
/// <param name="TellsLoss">See <see cref="Detector"/>.</param>
public sealed record PhotonCounting(
    double SignalPerSecond,
    double BackgroundPerSecond,
    double DepumpPerSecond,
    double LossPerSecond,
    double BrightenPerSecond,
    double? ExposureSeconds,
    double TransferSeconds,
    bool TellsLoss) : Detector(ExposureSeconds, TransferSeconds, TellsLoss);

/// <summary>A detector known by its measured error at a fixed exposure.</summary>
/// <param name="DarkFlip">Probability that a dark atom is called bright.</param>
/// <param name="BrightFlip">Probability that a bright atom is called dark.</param>
/// <param name="LossPerLook">Probability to lose the atom in one look.</param>
/// <param name="StatedExposureSeconds">The exposure the figures hold for.</param>
/// <param name="TransferSeconds">See <see cref="Detector"/>.</param>
/// <param name="TellsLoss">See <see cref="Detector"/>.</param>
public sealed record StatedReadout(
    double DarkFlip,
    double BrightFlip,
    double LossPerLook,
    double StatedExposureSeconds,
    double TransferSeconds,
    bool TellsLoss) : Detector(StatedExposureSeconds, TransferSeconds, TellsLoss);
