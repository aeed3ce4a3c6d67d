using FtEstimate.Cycles;
using FtEstimate.Noise;

namespace FtEstimate.Sizing;

/// <summary>Atoms that have to be replaced.</summary>
public static class AtomSupply
{
    /// <summary>
    /// Atoms lost per second by a machine with so many sites, half data and half checks: gates, looks, moves and vacuum of each kind.
    /// Checks that rest in a second bank lose nothing but to vacuum, which is left out for them.
    /// </summary>
    public static double DemandPerSecond(double sites, OperatingPoint point, in OperatingState state)
    {
        double gates = SyndromeCycle.Layers * state.Loss.PerGateSlot;
        double data = sites / 2 * (gates + state.Loss.DataPerRound);
        double checks = sites / 2 * point.CheckAtomsInUse * (gates + state.Loss.CheckPerRound);
        return (data + checks) / state.Times.RoundSeconds;
    }
}
