using System.Collections.Immutable;

namespace FtEstimate.Noise;

/// <summary>What a weight belongs to.</summary>
public enum NoiseWeight
{
    /// <summary>CZ gates of all four layers, per Pauli probability of one gate.</summary>
    CzGate,

    /// <summary>Bit flips (X or Y) of every atom in each of the four CZ layers.</summary>
    WaitingBitFlip,

    /// <summary>Phase flips (Z or Y) of every atom in each of the four CZ layers.</summary>
    WaitingPhaseFlip,

    /// <summary>One flip per round on each data atom that the basis can see.</summary>
    DataFlip,

    /// <summary>One-qubit gates on data, per Pauli probability and gate.</summary>
    GateOnData,

    /// <summary>Errors of checks before or after their layers, per Pauli probability and time.</summary>
    CheckOutsideLayers,

    /// <summary>Errors of checks at their moves, per Pauli probability and time.</summary>
    CheckBetweenLayers,

    /// <summary>Checks read wrongly.</summary>
    CheckFlip,

    /// <summary>Checks reset wrongly.</summary>
    CheckReset,

    /// <summary>Data atoms lost per gate slot, looked at in every round.</summary>
    ToldLossOfData,

    /// <summary>More for every further round between two looks.</summary>
    ToldLossOfDataPerRound,

    /// <summary>Checks lost per gate slot, told by their readout.</summary>
    ToldLossOfChecks,

    /// <summary>Data atoms lost per gate slot, replaced in every round, untold.</summary>
    UntoldLossOfData,

    /// <summary>More for every further round until they are replaced.</summary>
    UntoldLossOfDataPerRound,

    /// <summary>Checks lost per gate slot, untold.</summary>
    UntoldLossOfChecks,
}

/// <summary>
/// How strongly each kind of error counts towards the noise strength x, per unit probability, first order. Fitted to this project's own Monte Carlo of the
/// CZ-native memory circuit together with the simulated law (docs/method.md); for another law they scale with its threshold.
/// </summary>
/// <param name="Values">One weight for each <see cref="NoiseWeight"/>, in that order.</param>
public sealed record ChannelWeights(ImmutableArray<double> Values)
{
    /// <summary>Share of the errors of a pair that strike one of its atoms: 12 of 15.</summary>
    private const double PairErrorsOnOneAtom = 0.8;

    /// <summary>The fitted weights, for the simulated law.</summary>
    public static ChannelWeights Fitted { get; } = new([.. Enum.GetValues<NoiseWeight>().Select(weight => FittedNumbers.Value(weight.ToString()))]);

    /// <summary>The weight of a kind.</summary>
    public double this[NoiseWeight weight] => Values[(int)weight];

    /// <summary>The fitted weights for a law with the given threshold of the uniform textbook circuit.</summary>
    public static ChannelWeights For(double threshold)
    {
        double scale = FittedNumbers.UniformThreshold / threshold;
        return new([.. Fitted.Values.Select(value => value * scale)]);
    }

    /// <summary>Strength of one cause.</summary>
    /// <param name="source">The cause.</param>
    /// <param name="roundsBetweenLooks">Rounds between two looks at a data atom, at least 1; matters for losses only.</param>
    public NoiseStrength Of(in ErrorSource source, double roundsBetweenLooks)
    {
        double p = source.Probability;
        double times = source.TimesPerRound;
        double moreRounds = roundsBetweenLooks - 1;
        return source.Location switch
        {
            ErrorLocation.CzGate => Even(NoiseWeight.CzGate, p),
            ErrorLocation.ExtraCzLayer => OnData(PauliChannel.Depolarising(PairErrorsOnOneAtom * p)) * times,
            ErrorLocation.WaitingInLayer => Waiting(source.Channel),
            ErrorLocation.GateOnData => Even(NoiseWeight.GateOnData, p * times),
            ErrorLocation.DataAtom => OnData(source.Channel) * times,
            ErrorLocation.CheckOutsideLayers => Even(NoiseWeight.CheckOutsideLayers, p * times),
            ErrorLocation.CheckBetweenLayers => Even(NoiseWeight.CheckBetweenLayers, p * times),
            ErrorLocation.CheckFlip => Even(NoiseWeight.CheckFlip, p * times),
            ErrorLocation.CheckReset => Even(NoiseWeight.CheckReset, p * times),
            ErrorLocation.ToldLossOfData => Even(NoiseWeight.ToldLossOfData, p) + Even(NoiseWeight.ToldLossOfDataPerRound, p * moreRounds),
            ErrorLocation.ToldLossOfChecks => Even(NoiseWeight.ToldLossOfChecks, p),
            ErrorLocation.UntoldLossOfData => Even(NoiseWeight.UntoldLossOfData, p) + Even(NoiseWeight.UntoldLossOfDataPerRound, p * moreRounds),
            ErrorLocation.UntoldLossOfChecks => Even(NoiseWeight.UntoldLossOfChecks, p),
            _ => throw new ArgumentOutOfRangeException(nameof(source)),
        };
    }

    /// <summary>Data atoms sit half the time in the Hadamard frame, so both bases suffer from either flip; the weights hold what they see of it.</summary>
    private NoiseStrength Waiting(PauliChannel channel) =>
        Even(NoiseWeight.WaitingBitFlip, channel.X + channel.Y) + Even(NoiseWeight.WaitingPhaseFlip, channel.Z + channel.Y);

    /// <summary>Z and Y errors flip logical X, X and Y errors flip logical Z.</summary>
    private NoiseStrength OnData(PauliChannel channel)
    {
        double weight = this[NoiseWeight.DataFlip];
        return new(weight * (channel.Z + channel.Y), weight * (channel.X + channel.Y));
    }

    private NoiseStrength Even(NoiseWeight weight, double probability) => NoiseStrength.Even(this[weight] * probability);
}
