using FtEstimate.Quantities;
using FtEstimate.Sizing;

namespace FtEstimate.Reports.Estimate;

/// <summary>Why no machine meets the goal, in a few sentences.</summary>
internal static class NoAnswerSentence
{
    private const double SecondsPerDay = 86_400;

    /// <summary>The sentences.</summary>
    public static string Of(SearchSpace space, NoAnswer none)
    {
        string obstacle = none.Reason switch
        {
            Obstacle.AboveThreshold => $"The noise is {Show.Significant(none.Strength, 3)} times the threshold: no code distance helps.",
            Obstacle.FailureProbability => TooLarge(space, none),
            _ => Limits(none),
        };
        string held = space.Scenario.Method.InjectedError is null ? "" : " The injected error is fixed by the scenario and stays as it is.";
        return $"{obstacle} {LowerNoise(none)}{held}";
    }

    /// <summary>How scripts know a limit.</summary>
    public static string KeyOf(LimitedResource resource) => resource switch
    {
        LimitedResource.Atoms => "atoms",
        LimitedResource.ElapsedSeconds => "elapsed_s",
        _ => "atoms_per_s",
    };

    private static string Limits(NoAnswer none)
    {
        string[] broken = [.. none.Limits.Where(limit => !(limit.Preferred <= limit.Allowed)).Select(Broken)];
        string[] enough = [.. none.Limits.Where(limit => limit.Enough is not null).Select(limit => Enough(limit.Resource, limit.Enough!.Value))];
        string why = broken.Length > 0 ? string.Join("; ", broken) : "each machine that keeps one of them breaks another";
        string what = enough.Length > 0 ? $" What would do, with the other limits and the noise as they are: {string.Join(", or ", enough)}." : "";
        return $"A machine would do, but not within the limits: {why}.{what}";
    }

    private static string Broken(LimitInTheWay limit) => limit switch
    {
        { Preferred: null } => "its run does not finish between stops",
        { Resource: LimitedResource.Atoms, Preferred: { } atoms } =>
            $"the preferred machine takes {Show.Atoms(atoms)} atoms, the limit is {Show.Atoms(limit.Allowed)}",
        { Resource: LimitedResource.ElapsedSeconds, Preferred: { } seconds } => $"it takes {Days(seconds)} days, the limit is {Days(limit.Allowed)}",
        { Preferred: { } atoms } => $"it loses {Show.Atoms(atoms)} atoms per second, {Show.Atoms(limit.Allowed)} are delivered",
    };

    private static string Enough(LimitedResource resource, double value) => resource switch
    {
        LimitedResource.Atoms => $"{Show.Atoms(value)} atoms",
        LimitedResource.ElapsedSeconds => $"{Days(value)} days on the wall clock",
        _ => $"{Show.Atoms(value)} atoms delivered per second",
    };

    private static string TooLarge(SearchSpace space, NoAnswer none)
    {
        const string failure = "no factory offered reaches the allowed failure probability.";
        string start = $"No code distance up to {SearchSpace.LargestDistance} and {failure}";
        if (none.FullSize.RoundSeconds <= none.SinglePatch.RoundSeconds)
        {
            return start;
        }

        string growth =
            $" A single patch has a round of {Show.Duration(none.SinglePatch.RoundSeconds)} and noise at {Show.Significant(none.SinglePatch.Strength, 2)} of the threshold; " +
            $"with all {Show.Significant(space.Layouts[0].Tiles, 3)} tiles at distance {SearchSpace.TypicalDistance} it is {Show.Duration(none.FullSize.RoundSeconds)} " +
            $"and {Show.Significant(none.FullSize.Strength, 2)}, as limits on what is served at once lengthen the round.";
        return none.GroupsStandInTheWay
            ? $"{start}{growth} Without limits on the pairs, checks and atoms served at once a machine would do: these limits are the obstacle."
            : start + growth;
    }

    private static string LowerNoise(NoAnswer none) => none.NoiseFactor switch
    {
        null => "Lower noise alone is not enough.",
        > 0.9 and { } factor => $"All noise together would have to fall by {Show.Percent(1 - factor)}.",
        { } factor => $"All noise together would have to fall by a factor of {Show.Significant(1 / factor, 2)}.",
    };

    private static string Days(double seconds) => Show.Significant(seconds / SecondsPerDay, 4);
}
