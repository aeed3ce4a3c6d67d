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
internal interface IChannelSink
{
    /// <summary>Takes one cause.</summary>
    void Add(string name, double perLocation, double timesPerRound, NoiseStrength strength);
}

/// <summary>Adds the strengths up.</summary>
internal struct ChannelSum : IChannelSink
{
    /// <summary>The sum so far.</summary>
    public NoiseStrength Total;

    /// <inheritdoc/>
    public void Add(string name, double perLocation, double timesPerRound, NoiseStrength strength) => Total += strength;
}

/// <summary>Keeps the causes for a report.</summary>
internal readonly struct ChannelList() : IChannelSink
{
    /// <summary>The causes so far.</summary>
    public List<ErrorChannel> Channels { get; } = [];

    /// <inheritdoc/>
    public void Add(string name, double perLocation, double timesPerRound, NoiseStrength strength)
    {
        if (perLocation > 0 && timesPerRound > 0)
        {
            Channels.Add(new ErrorChannel(name, perLocation, timesPerRound, strength));
        }
    }
}
