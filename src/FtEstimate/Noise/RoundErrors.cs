namespace FtEstimate.Noise;

/// <summary>The errors of one round of the CZ-native circuit, place by place.</summary>
public sealed record RoundErrors
{
    /// <summary>Moves of a check in a round.</summary>
    internal const double MovesPerCheck = 5;

    /// <summary>Pauli probability of a CZ gate, spread evenly over its 15 errors.</summary>
    public double CzGate { get; init; }

    /// <summary>Pauli probability of a one-qubit gate on a data atom.</summary>
    public double GateOnData { get; init; }

    /// <summary>Every atom during one CZ layer.</summary>
    public PauliChannel WaitingInLayer { get; init; }

    /// <summary>Each data atom once per round, after the gates.</summary>
    public PauliChannel OnData { get; init; }

    /// <summary>Each check once before and once after its CZ layers.</summary>
    public PauliChannel OnCheckOutsideLayers { get; init; }

    /// <summary>Each check at each of the five moves: before every layer and after the last.</summary>
    public PauliChannel OnCheckBetweenLayers { get; init; }

    /// <summary>A check read wrongly.</summary>
    public double CheckFlip { get; init; }

    /// <summary>A check that starts in the wrong state.</summary>
    public double CheckReset { get; init; }

    /// <summary>A data atom lost, per gate slot, four slots a round.</summary>
    public double DataLossPerSlot { get; init; }

    /// <summary>A check lost, per gate slot, four slots a round.</summary>
    public double CheckLossPerSlot { get; init; }

    /// <summary>Whether the decoder is told of lost data atoms when they are looked at.</summary>
    public bool DataLossTold { get; init; }

    /// <summary>Whether the readout of a check tells that it is lost.</summary>
    public bool CheckLossTold { get; init; }

    /// <summary>Rounds between two looks at the data atoms, at least 1.</summary>
    public int RoundsBetweenLooks { get; init; } = 1;

    /// <summary>The strength of these errors.</summary>
    public NoiseStrength Strength(ChannelWeights weights)
    {
        NoiseStrength sum = default;
        foreach (ErrorSource source in Sources())
        {
            sum += weights.Of(source, RoundsBetweenLooks);
        }

        return sum;
    }

    private ErrorSource[] Sources() =>
    [
        ErrorSource.Of(ErrorLocation.CzGate, CzGate, 4),
        new(ErrorLocation.WaitingInLayer, WaitingInLayer, 4),
        ErrorSource.Of(ErrorLocation.GateOnData, GateOnData, 3),
        new(ErrorLocation.DataAtom, OnData, 1),
        new(ErrorLocation.CheckOutsideLayers, OnCheckOutsideLayers, 2),
        new(ErrorLocation.CheckBetweenLayers, OnCheckBetweenLayers, MovesPerCheck),
        ErrorSource.Of(ErrorLocation.CheckFlip, CheckFlip, 1),
        ErrorSource.Of(ErrorLocation.CheckReset, CheckReset, 1),
        ErrorSource.Of(DataLossTold ? ErrorLocation.ToldLossOfData : ErrorLocation.UntoldLossOfData, DataLossPerSlot, 4),
        ErrorSource.Of(CheckLossTold ? ErrorLocation.ToldLossOfChecks : ErrorLocation.UntoldLossOfChecks, CheckLossPerSlot, 4),
    ];
}

/// <summary>Puts the causes of error at their places.</summary>
internal struct RoundErrorSum(double roundsBetweenLooks) : IErrorSink
{
    /// <summary>The errors so far.</summary>
    public RoundErrors Errors { get; private set; } = new() { RoundsBetweenLooks = Math.Max(1, (int)Math.Round(roundsBetweenLooks)) };

    /// <inheritdoc/>
    public void Add(string name, in ErrorSource source)
    {
        PauliChannel perRound = source.Channel.Times(source.TimesPerRound);
        double probability = source.Probability;
        Errors = source.Location switch
        {
            ErrorLocation.CzGate => Errors with { CzGate = probability },
            ErrorLocation.WaitingInLayer => Errors with { WaitingInLayer = source.Channel },
            ErrorLocation.GateOnData => Errors with { GateOnData = probability },
            ErrorLocation.DataAtom => Errors with { OnData = Errors.OnData.Then(perRound) },

            // of the errors of a pair four fifths strike the data atom
            ErrorLocation.ExtraCzLayer => Errors with { OnData = Errors.OnData.Then(perRound.Times(0.8)) },
            ErrorLocation.CheckOutsideLayers => Errors with { OnCheckOutsideLayers = Errors.OnCheckOutsideLayers.Then(perRound.Times(0.5)) },
            ErrorLocation.CheckBetweenLayers => Errors with { OnCheckBetweenLayers = Errors.OnCheckBetweenLayers.Then(perRound.Times(1 / RoundErrors.MovesPerCheck)) },
            ErrorLocation.CheckFlip => Errors with { CheckFlip = Errors.CheckFlip + (probability * (1 - (2 * Errors.CheckFlip))) },
            ErrorLocation.CheckReset => Errors with { CheckReset = probability },
            ErrorLocation.ToldLossOfData => Errors with { DataLossPerSlot = probability, DataLossTold = true },
            ErrorLocation.UntoldLossOfData => Errors with { DataLossPerSlot = probability },
            ErrorLocation.ToldLossOfChecks => Errors with { CheckLossPerSlot = probability, CheckLossTold = true },
            ErrorLocation.UntoldLossOfChecks => Errors with { CheckLossPerSlot = probability },
            _ => throw new ArgumentOutOfRangeException(nameof(source)),
        };
    }
}
