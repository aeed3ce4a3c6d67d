using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;

namespace FtEstimate.Simulation.Memory;

/// <summary>Which circuit is simulated, and at which rates.</summary>
public abstract record MemoryNoise
{
    private protected MemoryNoise()
    {
    }

    /// <summary>The circuit of one experiment.</summary>
    public abstract Circuit CircuitOf(MemorySetting setting);
}

/// <summary>The textbook circuit.</summary>
/// <param name="Rates">Its rates.</param>
/// <param name="Error">The one number they follow from.</param>
public sealed record TextbookMemoryNoise(UniformNoise Rates, double Error) : MemoryNoise
{
    /// <inheritdoc/>
    public override Circuit CircuitOf(MemorySetting setting) => TextbookCircuit.Of(setting.Distance, setting.Rounds, setting.Basis, Rates);
}

/// <summary>The CZ-native circuit of an atom array.</summary>
/// <param name="Errors">The errors of a round.</param>
public sealed record AtomMemoryNoise(RoundErrors Errors) : MemoryNoise
{
    /// <inheritdoc/>
    public override Circuit CircuitOf(MemorySetting setting) => AtomCircuit.Of(setting.Distance, setting.Rounds, setting.Basis, Errors);
}
