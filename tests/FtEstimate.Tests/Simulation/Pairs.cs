namespace FtEstimate.Tests.Simulation;

/// <summary>All pairs of two lists, for theories.</summary>
internal static class Pairs
{
    public static TheoryData<TA, TB> Of<TA, TB>(TA[] first, TB[] second)
    {
        TheoryData<TA, TB> pairs = [];
        foreach (TA a in first)
        {
            foreach (TB b in second)
            {
                pairs.Add(a, b);
            }
        }

        return pairs;
    }
}
