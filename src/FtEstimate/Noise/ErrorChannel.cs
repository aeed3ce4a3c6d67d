using System.Collections.Immutable;

namespace FtEstimate.Noise;

/// <summary>One cause of error in the ledger.</summary>
/// <param name="Name">The cause.</param>
/// <param name="PerLocation">Probability each time it can happen.</param>
/// <param name="TimesPerRound">How often it can happen to an atom (or pair) per round.</param>
/// <param name="Strength">What it adds to the noise strength.</param>
public sealed record ErrorChannel(string Name, double PerLocation, double TimesPerRound, NoiseStrength Strength)
{
    /// <summary>Probability per round.</summary>
    public double PerRound => PerLocation * TimesPerRound;
}

/// <summary>Every cause of error of a machine at one size, each apart.</summary>
/// <param name="Channels">The causes, largest share first.</param>
public sealed record ErrorLedger(ImmutableArray<ErrorChannel> Channels)
{
    /// <summary>Sum of all causes.</summary>
    public NoiseStrength Total
    {
        get
        {
            NoiseStrength sum = default;
            foreach (ErrorChannel channel in Channels)
            {
                sum += channel.Strength;
            }

            return sum;
        }
    }

    /// <summary>Share of a cause in the mean strength.</summary>
    public double Share(ErrorChannel channel) => Total.Mean > 0 ? channel.Strength.Mean / Total.Mean : 0;
}

/// <summary>Receives the causes one by one; a sum needs no list.</summary>
internal interface IErrorSink
{
    /// <summary>Takes one cause.</summary>
    void Add(string name, in ErrorSource source);
}

/// <summary>Adds the strengths up.</summary>
/// <param name="weights">How causes count.</param>
/// <param name="roundsBetweenLooks">Rounds between two looks at a data atom.</param>
internal struct StrengthSum(ChannelWeights weights, double roundsBetweenLooks) : IErrorSink
{
    /// <summary>The sum so far.</summary>
    public NoiseStrength Total;

    /// <inheritdoc/>
    public void Add(string name, in ErrorSource source) => Total += weights.Of(source, roundsBetweenLooks);
}

/// <summary>Keeps the causes for a report.</summary>
/// <param name="weights">How causes count.</param>
/// <param name="roundsBetweenLooks">Rounds between two looks at a data atom.</param>
internal readonly struct ChannelList(ChannelWeights weights, double roundsBetweenLooks) : IErrorSink
{
    /// <summary>The causes so far.</summary>
    public List<ErrorChannel> Channels { get; } = [];

    /// <inheritdoc/>
    public void Add(string name, in ErrorSource source)
    {
        if (source.Probability > 0 && source.TimesPerRound > 0)
        {
            Channels.Add(new ErrorChannel(name, source.Probability, source.TimesPerRound, weights.Of(source, roundsBetweenLooks)));
        }
    }
}
