namespace FtEstimate.Noise;

/// <summary>
/// How strongly each kind of error counts towards the noise strength x, per unit probability, first order.
/// Interim values from a Monte Carlo of distances 5 and 7 that is not part of this repository (within 9 % in Λ on eight noise mixes; not published),
/// for a law whose threshold is <see cref="ReferenceThreshold"/>; they scale with the threshold of the law in use.
/// </summary>
/// <param name="Scale">Reference threshold over the threshold of the law in use.</param>
public readonly record struct ChannelWeights(double Scale)
{
    /// <summary>Threshold of the uniform circuit that the weights refer to.</summary>
    public const double ReferenceThreshold = 0.0056;

    private const double CzWeight = 92;
    private const double WaitingPerLayerWeight = 143;
    private const double DataEventWeight = 23;
    private const double CheckFlipWeight = 5.5;
    private const double CheckResetWeight = 5;
    private const double CheckGateWeight = 5;

    // what waiting of every atom costs beyond the four data events of the layers falls on the checks
    private const double CheckInSequenceWeight = (WaitingPerLayerWeight - (4 * DataEventWeight)) / 4;

    /// <summary>Weights for a law with the given threshold.</summary>
    public static ChannelWeights For(double threshold) => new(ReferenceThreshold / threshold);

    /// <summary>Strength of one cause.</summary>
    /// <param name="source">The cause.</param>
    /// <param name="roundsBetweenLooks">Rounds between two looks at a data atom, at least 1; matters for losses only.</param>
    public NoiseStrength Of(in ErrorSource source, double roundsBetweenLooks)
    {
        double p = source.Probability;
        double times = source.TimesPerRound;
        return source.Location switch
        {
            ErrorLocation.CzGate => Cz(p),
            ErrorLocation.ExtraCzLayer => ExtraCzLayer(p) * times,
            ErrorLocation.WaitingInLayer => WaitingPerLayer(source.Channel),
            ErrorLocation.GateOnData or ErrorLocation.DataAtom => DataEvent(source.Channel) * times,
            ErrorLocation.CheckOutsideLayers => CheckGate(p) * times,
            ErrorLocation.CheckBetweenLayers => CheckInSequence(p) * times,
            ErrorLocation.CheckFlip => CheckFlip(p) * times,
            ErrorLocation.CheckReset => CheckReset(p) * times,
            ErrorLocation.ToldLossOfData => LossWeights.Told(p, roundsBetweenLooks),
            ErrorLocation.ToldLossOfChecks => LossWeights.Told(p, 1),
            ErrorLocation.UntoldLossOfData => UntoldLossOfData(p, roundsBetweenLooks),
            ErrorLocation.UntoldLossOfChecks => Cz(p),
            _ => throw new ArgumentOutOfRangeException(nameof(source)),
        };
    }

    /// <summary>A lost atom counts as an error of its gate, and as a random qubit in the rounds until it is replaced.</summary>
    private NoiseStrength UntoldLossOfData(double probability, double roundsBetweenLooks)
    {
        double roundsUntilReplaced = (roundsBetweenLooks - 1) / 2;
        double perRound = 4 * probability;
        return Cz(probability) + DataEvent(PauliChannel.Depolarising(0.75 * perRound * roundsUntilReplaced));
    }

    /// <summary>CZ gates, all four layers.</summary>
    public NoiseStrength Cz(double probability) => NoiseStrength.Even(Scale * CzWeight * probability);

    /// <summary>One more CZ layer.</summary>
    public NoiseStrength ExtraCzLayer(double probability) => Cz(probability / 4);

    /// <summary>Waiting of every atom in each CZ layer; data atoms sit half the time in the Hadamard frame.</summary>
    public NoiseStrength WaitingPerLayer(PauliChannel channel) =>
        NoiseStrength.Even(Scale * WaitingPerLayerWeight * 0.75 * (channel.X + channel.Z + (2 * channel.Y)));

    /// <summary>One event on each data atom per round; Z and Y errors flip logical X, X and Y errors flip logical Z.</summary>
    public NoiseStrength DataEvent(PauliChannel channel) => new(
        Scale * DataEventWeight * 1.5 * (channel.Z + channel.Y),
        Scale * DataEventWeight * 1.5 * (channel.X + channel.Y));

    /// <summary>A check read wrongly.</summary>
    public NoiseStrength CheckFlip(double probability) => NoiseStrength.Even(Scale * CheckFlipWeight * probability);

    /// <summary>A check that starts in the wrong state.</summary>
    public NoiseStrength CheckReset(double probability) => NoiseStrength.Even(Scale * CheckResetWeight * probability);

    /// <summary>A gate on each check before or after its CZ layers.</summary>
    public NoiseStrength CheckGate(double probability) => NoiseStrength.Even(Scale * CheckGateWeight * probability);

    /// <summary>An error on each check between its CZ layers.</summary>
    public NoiseStrength CheckInSequence(double probability) => NoiseStrength.Even(Scale * CheckInSequenceWeight * probability);

    /// <summary>
    /// The uniform textbook circuit at one rate p for every location: CZ; the 2d−1 atoms without a gate in each layer; three waits of each data atom (two
    /// Hadamard layers, measure and reset); flips; Hadamards on half of the checks, twice.
    /// </summary>
    public NoiseStrength Uniform(double probability, int distance)
    {
        double idle = ((2.0 * distance) - 1) / ((2.0 * distance * distance) - 1);
        PauliChannel event1 = PauliChannel.Depolarising(probability);
        return Cz(probability)
            + WaitingPerLayer(PauliChannel.Depolarising(probability * idle))
            + (DataEvent(event1) * 3)
            + CheckFlip(probability)
            + CheckReset(probability)
            + CheckGate(probability);
    }
}
