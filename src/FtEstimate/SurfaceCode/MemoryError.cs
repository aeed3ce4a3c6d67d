using FtEstimate.Quantities;

namespace FtEstimate.SurfaceCode;

/// <summary>From the error of a whole memory experiment to the error per round, and back.</summary>
/// <remarks>Exact for independent rounds, each of which flips one logical observable: P = ½[1 − (1 − 2ε)ⁿ].</remarks>
public static class MemoryError
{
    /// <summary>Probability that the observable is wrong after some rounds, 0 to 0.5.</summary>
    /// <param name="perRound">Error per round, 0 to 0.5.</param>
    /// <param name="rounds">Rounds, above 0.</param>
    public static double AfterRounds(double perRound, double rounds) =>
        -0.5 * ElementaryFunctions.ExpMinusOne(rounds * ElementaryFunctions.LogOnePlus(-2 * perRound));

    /// <summary>Error per round, 0 to 0.5.</summary>
    /// <param name="afterRounds">Probability that the observable is wrong after all rounds, 0 to 0.5.</param>
    /// <param name="rounds">Rounds, above 0.</param>
    public static double PerRound(double afterRounds, double rounds) =>
        -0.5 * ElementaryFunctions.ExpMinusOne(ElementaryFunctions.LogOnePlus(-2 * afterRounds) / rounds);
}
