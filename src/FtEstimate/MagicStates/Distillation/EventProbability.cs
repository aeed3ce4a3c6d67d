namespace FtEstimate.MagicStates.Distillation;

/// <summary>Arithmetic of independent flips.</summary>
internal static class EventProbability
{
    /// <summary>
    /// Smallest probability other than zero that the pattern sums carry. Ten events of it still give a normal double; smaller
    /// ones would reach subnormal numbers, whose arithmetic is slow. It adds less than 1e-28 to an output error.
    /// </summary>
    public const double Smallest = 1e-30;

    /// <summary>A probability brought into the range in which a flip is a flip: one half means nothing is known any more.</summary>
    public static double Bounded(double probability) =>
        probability >= 0.5 ? 0.5 : probability > 0 && probability < Smallest ? Smallest : probability;

    /// <summary>Probability that exactly one of two independent flips happens; both at most 0.5.</summary>
    public static double EitherOr(double first, double second) => first + second * (1 - 2 * first);
}
