using System.Collections.Immutable;

namespace FtEstimate.Scenarios.Keys;

/// <summary>How a check atom is seen: by its photon counts, or by a measured error at a fixed exposure.</summary>
public static class DetectionKeys
{
    /// <summary>Signal.</summary>
    public static readonly KeyDefinition Signal = new(
        "signal_counts_per_ms", ValueKind.Positive, "Detected photons of one bright atom.", ToSi: Units.PerMillisecond, Better: BetterWhen.Larger);

    /// <summary>Background.</summary>
    public static readonly KeyDefinition Background = new(
        "background_counts_per_ms", ValueKind.NotNegative, "Detected counts without an atom.", ToSi: Units.PerMillisecond, Better: BetterWhen.Smaller);

    /// <summary>Depumping.</summary>
    public static readonly KeyDefinition Depump = new(
        "depump_per_ms", ValueKind.NotNegative, "Rate at which a bright atom turns dark.", ToSi: Units.PerMillisecond, Better: BetterWhen.Smaller);

    /// <summary>Loss under the light.</summary>
    public static readonly KeyDefinition Loss = new(
        "loss_per_ms", ValueKind.NotNegative, "Rate at which a bright atom is lost.", ToSi: Units.PerMillisecond, Better: BetterWhen.Smaller);

    /// <summary>Brightening.</summary>
    public static readonly KeyDefinition Brighten = new(
        "brighten_per_ms", ValueKind.NotNegative, "Rate at which a dark atom turns bright; 0 when absent.", ToSi: Units.PerMillisecond, Better: BetterWhen.Smaller);

    /// <summary>Mean flip.</summary>
    public static readonly KeyDefinition FlipError = new(
        "flip_error", ValueKind.Probability, "Measured probability to call an atom wrongly, the mean of dark and bright.", High: 0.5, Better: BetterWhen.Smaller);

    /// <summary>Dark flip.</summary>
    public static readonly KeyDefinition DarkFlip = new(
        "dark_flip", ValueKind.Probability, "Measured probability that a dark atom is called bright; with bright_flip, in place of flip_error.", High: 0.5, Better: BetterWhen.Smaller);

    /// <summary>Bright flip.</summary>
    public static readonly KeyDefinition BrightFlip = new(
        "bright_flip", ValueKind.Probability, "Measured probability that a bright atom is called dark.", High: 0.5, Better: BetterWhen.Smaller);

    /// <summary>Loss per look.</summary>
    public static readonly KeyDefinition LossPerLook = new(
        "loss_per_look", ValueKind.Probability, "Measured probability to lose the atom in one look; goes with flip_error.", High: 0.5, Better: BetterWhen.Smaller);

    /// <summary>Exposure.</summary>
    public static readonly KeyDefinition Exposure = new(
        "exposure_us", ValueKind.PositiveOrBest, "Time the camera looks; \"best\" leaves it to the search (photon counts only, and then the value when absent).", ToSi: Units.Micro);

    /// <summary>Image transfer.</summary>
    public static readonly KeyDefinition ImageTransfer = new(
        "image_transfer_us", ValueKind.NotNegative, "From the end of the exposure to the counts in the computer; 0 when absent.", ToSi: Units.Micro, Better: BetterWhen.Smaller);

    /// <summary>Whether loss is told.</summary>
    public static readonly KeyDefinition TellsLoss = new(
        "tells_loss", ValueKind.Flag, "Whether the readout tells a lost atom from a dark one; false when absent.");

    /// <summary>Keys of a detector that counts photons.</summary>
    public static ImmutableArray<KeyDefinition> Counting { get; } = [Signal, Background, Depump, Loss, Brighten];

    /// <summary>Keys of a detector known by its measured error.</summary>
    public static ImmutableArray<KeyDefinition> Stated { get; } = [FlipError, DarkFlip, BrightFlip, LossPerLook];

    /// <summary>All keys; each readout scheme may repeat them.</summary>
    public static ImmutableArray<KeyDefinition> All { get; } = [.. Counting, .. Stated, Exposure, ImageTransfer, TellsLoss];

    /// <summary>[detection].</summary>
    public static readonly TableDefinition Detection = new(
        "machine.detection",
        "How a check atom is seen, for every readout scheme that does not say otherwise. Either photon counts (signal, background, depump and loss), or "
        + "a measured flip_error (or dark_flip and bright_flip) with loss_per_look at a stated exposure_us.",
        All);

    /// <summary>The table.</summary>
    public static ImmutableArray<TableDefinition> Tables => [Detection];
}
