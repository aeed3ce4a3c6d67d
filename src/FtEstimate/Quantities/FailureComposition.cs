namespace FtEstimate.Quantities;

/// <summary>Something that may fail many times over.</summary>
/// <param name="Count">How often it is done, 0 or more; need not be whole.</param>
/// <param name="Probability">Chance that one of them fails, 0 to 1.</param>
public readonly record struct RepeatedRisk(double Count, double Probability);

/// <summary>Chance that at least one of many independent risks strikes.</summary>
/// <remarks>1 − exp Σ n·ln(1 − p): exact, and without loss of digits at 1e-20 or close to 1.</remarks>
public static class FailureComposition
{
    /// <summary>Chance that any of the risks strikes at least once, 0 to 1.</summary>
    public static double AnyOf(params ReadOnlySpan<RepeatedRisk> risks)
    {
        double logSurvival = 0;
        foreach (RepeatedRisk risk in risks)
        {
            // a certain failure done zero times must not give 0 × infinity
            if (risk.Count > 0)
            {
                logSurvival += risk.Count * ElementaryFunctions.LogOnePlus(-risk.Probability);
            }
        }

        return -ElementaryFunctions.ExpMinusOne(logSurvival);
    }

    /// <summary>Chance that <paramref name="count"/> repeats of one risk fail at least once, 0 to 1.</summary>
    public static double Repeated(double count, double probability) => AnyOf(new RepeatedRisk(count, probability));
}
