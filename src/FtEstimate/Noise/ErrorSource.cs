namespace FtEstimate.Noise;

/// <summary>Where in a round an error strikes: what decides how much it counts.</summary>
public enum ErrorLocation
{
    /// <summary>Every pair of a CZ layer.</summary>
    CzGate,

    /// <summary>Every pair of one more layer that looks for lost atoms.</summary>
    ExtraCzLayer,

    /// <summary>Every atom during a CZ layer; data atoms sit half the time in the Hadamard frame.</summary>
    WaitingInLayer,

    /// <summary>A one-qubit gate of the round on a data atom.</summary>
    GateOnData,

    /// <summary>Anything else that strikes each data atom between the gates of two rounds.</summary>
    DataAtom,

    /// <summary>Each check before or after its CZ layers.</summary>
    CheckOutsideLayers,

    /// <summary>Each check between its CZ layers.</summary>
    CheckBetweenLayers,

    /// <summary>A check read wrongly.</summary>
    CheckFlip,

    /// <summary>A check that starts in the wrong state.</summary>
    CheckReset,

    /// <summary>A data atom lost, per gate slot; the decoder is told at the next look.</summary>
    ToldLossOfData,

    /// <summary>A data atom lost, per gate slot; nobody tells.</summary>
    UntoldLossOfData,

    /// <summary>A check lost, per gate slot; its readout tells.</summary>
    ToldLossOfChecks,

    /// <summary>A check lost, per gate slot; its result is random and nobody tells.</summary>
    UntoldLossOfChecks,
}

/// <summary>One cause of error: where it strikes, how likely, how often.</summary>
/// <param name="Location">Where.</param>
/// <param name="Channel">Probabilities each time; spread evenly over X, Y and Z where only their sum has a meaning.</param>
/// <param name="TimesPerRound">How often per round and atom (or pair).</param>
public readonly record struct ErrorSource(ErrorLocation Location, PauliChannel Channel, double TimesPerRound)
{
    /// <summary>A cause of which only the probability has a meaning.</summary>
    public static ErrorSource Of(ErrorLocation location, double probability, double timesPerRound) =>
        new(location, PauliChannel.Depolarising(probability), timesPerRound);

    /// <summary>Probability each time.</summary>
    public double Probability => Channel.Total;
}
