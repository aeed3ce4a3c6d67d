using FtEstimate.MagicStates.Distillation;

namespace FtEstimate.MagicStates;

/// <summary>From a design and a noise to what the factory delivers, level by level.</summary>
internal static class FactoryEvaluation
{
    /// <summary>Steps of the first level, each dm rounds long.</summary>
    public const double FirstLevelSteps = 6;

    /// <summary>Step times of a second-level batch; the paper counts 7.5 for the eight steps of its table.</summary>
    public const double SecondLevelSteps = 7.5;

    // Floors are lowered by this much against rounding.
    private const double Rounding = 1 - 1e-12;

    private static readonly LevelPlan FirstPlan = new(FifteenToOneSchedules.FirstLevel);
    private static readonly LevelPlan SecondPlan = new(FifteenToOneSchedules.SecondLevel);

    public static Factory Of(FactoryDesign design, NoiseTable noise)
    {
        if (design.Feeders is not { } feeders)
        {
            return OneLevel(design, FirstLevel(design.Last.Distances, noise));
        }

        return TwoLevels(design, FirstLevel(feeders.Block.Distances, noise), noise);
    }

    public static LevelResult FirstLevel(PatchDistances distances, NoiseTable noise) =>
        LevelSum.Of(FirstPlan, FirstLevelNoise(distances, noise));

    public static Factory OneLevel(FactoryDesign design, LevelResult level) =>
        Described(design, FirstLevelSteps * design.Last.Distances.M, level);

    public static Factory TwoLevels(FactoryDesign design, LevelResult feeder, NoiseTable noise)
    {
        double stepRounds = StepRounds(design, feeder.Acceptance);
        LevelResult level = LevelSum.Of(SecondPlan, SecondLevelNoise(design, feeder.OutputError, stepRounds, noise));
        return Described(design, SecondLevelSteps * stepRounds, level);
    }

    /// <summary>Optimistic bounds on a one-level design, without summing patterns.</summary>
    public static FactoryBounds OneLevelBounds(FactoryDesign design, NoiseTable noise)
    {
        PatchDistances distances = design.Last.Distances;
        return Bounds(FirstPlan, FirstLevelNoise(distances, noise), FirstLevelSteps * distances.M);
    }

    /// <summary>Optimistic bounds on a two-level design, given what a feeder delivers.</summary>
    public static FactoryBounds TwoLevelBounds(FactoryDesign design, LevelResult feeder, NoiseTable noise)
    {
        double stepRounds = StepRounds(design, feeder.Acceptance);
        LevelNoise level = SecondLevelNoise(design, feeder.OutputError, stepRounds, noise);
        return Bounds(SecondPlan, level, SecondLevelSteps * stepRounds);
    }

    /// <summary>Rounds per state of a design if nothing were ever rejected.</summary>
    public static double RoundsWithoutRejection(FactoryDesign design) => design.Feeders is null
        ? FirstLevelSteps * design.Last.Distances.M
        : SecondLevelSteps * StepRounds(design, feederAcceptance: 1);

    // Two feeders deliver the two states of a step.
    private static double StepRounds(FactoryDesign design, double feederAcceptance)
    {
        FeederBlocks feeders = design.Feeders!.Value;
        double supply = FirstLevelSteps * feeders.Block.Distances.M / (feeders.Count / 2.0 * feederAcceptance);
        return Math.Max(supply, design.Last.Distances.M);
    }

    private static LevelNoise FirstLevelNoise(PatchDistances distances, NoiseTable noise) =>
        LevelNoise.Injecting(distances, noise.At(distances), noise.InjectedError);

    private static LevelNoise SecondLevelNoise(FactoryDesign design, double inputError, double stepRounds, NoiseTable noise)
    {
        PatchDistances distances = design.Last.Distances;
        double moveLength = FactoryGeometry.MoveLength(design.Feeders!.Value, distances);
        return LevelNoise.FedByFactories(distances, noise.At(distances), inputError, moveLength, stepRounds);
    }

    private static FactoryBounds Bounds(LevelPlan plan, in LevelNoise noise, double roundsPerBatch)
    {
        double rotation = plan.LeastRotationError(noise);
        double error = LevelSum.OutputErrorFloor(plan, noise, FifteenToOne.OutputError(rotation));
        return new FactoryBounds(error * Rounding, roundsPerBatch / FifteenToOne.Acceptance(rotation) * Rounding);
    }

    private static Factory Described(FactoryDesign design, double roundsPerBatch, LevelResult level)
    {
        PatchDistances distances = design.Last.Distances;
        return new Factory
        {
            Design = design,
            Atoms = design.Atoms,
            RoundsPerBatch = roundsPerBatch,
            Outputs = 1,
            OutputError = level.OutputError,
            Acceptance = level.Acceptance,
            DX = distances.X,
            DZ = distances.Z,
            DM = distances.M,
        };
    }
}

/// <summary>Values that no evaluation of a design can undercut.</summary>
/// <param name="OutputError">Floor of the output error.</param>
/// <param name="RoundsPerOutput">Floor of the rounds per state.</param>
internal readonly record struct FactoryBounds(double OutputError, double RoundsPerOutput);
