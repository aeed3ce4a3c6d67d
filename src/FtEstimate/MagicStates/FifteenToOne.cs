namespace FtEstimate.MagicStates;

/// <summary>
/// The 15-to-1 protocol with perfect Clifford gates: fifteen T states with independent Z errors go in, one comes out
/// (Bravyi 2005, arXiv:quant-ph/0403025; exact).
/// </summary>
public static class FifteenToOne
{
    /// <summary>Error above which the protocol makes states worse (where output error equals input error; exact root, rounded).</summary>
    public const double FixedPoint = 0.14148;

    // Number of accepted patterns with w faulty inputs, w = 0..15; the output is wrong when w is odd.
    private static ReadOnlySpan<double> AcceptedPatterns => [1, 0, 0, 35, 105, 168, 280, 435, 435, 280, 168, 105, 35, 0, 0, 1];

    /// <summary>Probability that the checks pass, [1 + 15(1−2p)⁸]/16.</summary>
    /// <param name="inputError">Z error p of each input state, 0 to 0.5.</param>
    /// <exception cref="ArgumentOutOfRangeException">The input error is not between 0 and 0.5.</exception>
    public static double Acceptance(double inputError)
    {
        RequireProbability(inputError);
        double square = (1 - 2 * inputError) * (1 - 2 * inputError);
        double fourth = square * square;
        return (1 + 15 * fourth * fourth) / 16;
    }

    /// <summary>Error of the output state given that the checks pass; 35 p³ at small p, with all digits however small p is.</summary>
    /// <remarks>
    /// The sum over the accepted patterns of odd weight divided by the sum over all accepted ones: no term cancels, unlike in
    /// the closed form [1 − 15(1−2p)⁷ + 15(1−2p)⁸ − (1−2p)¹⁵]/{2[1 + 15(1−2p)⁸]}.
    /// </remarks>
    /// <param name="inputError">Z error p of each input state, 0 to 0.5.</param>
    /// <exception cref="ArgumentOutOfRangeException">The input error is not between 0 and 0.5.</exception>
    public static double OutputError(double inputError)
    {
        RequireProbability(inputError);
        double odds = inputError / (1 - inputError);
        double power = 1;
        double good = 0;
        double bad = 0;
        for (int weight = 0; weight < AcceptedPatterns.Length; weight += 2)
        {
            good += AcceptedPatterns[weight] * power;
            power *= odds;
            bad += AcceptedPatterns[weight + 1] * power;
            power *= odds;
        }

        return bad / (good + bad);
    }

    private static void RequireProbability(double inputError)
    {
        if (inputError is not (>= 0 and <= 0.5))
        {
            throw new ArgumentOutOfRangeException(nameof(inputError), inputError, "The error of an input state lies between 0 and 0.5.");
        }
    }
}
