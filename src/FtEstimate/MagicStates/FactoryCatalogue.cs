using System.Collections.Concurrent;
using System.Collections.Immutable;
using FtEstimate.MagicStates.Distillation;

namespace FtEstimate.MagicStates;

/// <summary>A factory of the catalogue.</summary>
/// <param name="Factory">The factory.</param>
/// <param name="Dominated">Whether another is no worse in atoms, rounds per state and error, and better in one of them (or equal and listed earlier).</param>
public sealed record CatalogueEntry(Factory Factory, bool Dominated);

/// <summary>
/// All one-level and two-level 15-to-1 designs of a fixed grid, evaluated under a noise. Remembers what it found; safe for use by
/// several threads.
/// </summary>
/// <remarks>
/// Grid. One level: dX = 7, 9, ..., 61; dZ odd, 0.33 to 0.55 of dX; dm = dZ, dZ+2, dZ+4. Two levels: feeders with dX = 7, 9, ..., 21, 25, ...,
/// 41 and dZ = dm next to 0.4 dX; last block 1.5 to 3 times as large, up to 61, dZ next to 0.35, 0.42 and 0.5 dX, dm = dZ, dZ+2; 4, 6, 8, ...
/// feeders, as many as can be put to use.
/// </remarks>
public sealed class FactoryCatalogue
{
    // An error this much below what is asked for buys nothing: at most a hundredth of the failure that all states together may cause.
    private const double ErrorThatBuysNothing = 1e-2;

    // The error asked for is rounded up to a power of ten in steps of an eighth.
    private const int ErrorStepsPerDecade = 8;

    private readonly ConcurrentDictionary<Question, Found> _found = new();

    /// <summary>Number of designs in the grid.</summary>
    public static int DesignCount => CatalogueGrid.Entries.Length;

    /// <summary>
    /// Builds the grid and has the kernels compiled, which the first question would otherwise wait for: worth calling on another thread while
    /// files are read. Changes nothing that can be seen.
    /// </summary>
    public static void WarmUp()
    {
        const double anyError = 1e-3;
        _ = Factory.Of(CatalogueGrid.Entries[^1].Design, new FactoryNoise(_ => anyError, anyError));
    }

    /// <summary>Every design of the grid, in order of rising atoms.</summary>
    public static ImmutableArray<CatalogueEntry> All(FactoryNoise noise)
    {
        GridEvaluation grid = new(noise);
        FactoryFront front = new(errorFloor: 0);
        Factory[] factories = new Factory[CatalogueGrid.Entries.Length];
        for (int i = 0; i < factories.Length; i++)
        {
            factories[i] = grid.Evaluate(CatalogueGrid.Entries[i]);
            front.Offer(factories[i]);
        }

        HashSet<Factory> undominated = new(front.Members, ReferenceEqualityComparer.Instance);
        return [.. factories.Select(factory => new CatalogueEntry(factory, !undominated.Contains(factory)))];
    }

    /// <summary>
    /// The designs with an error at most as stated that no other such design beats in atoms, rounds per state and error at once, in order of
    /// rising atoms. Errors below a hundredth of the stated one count as equal. Empty when no design is good enough.
    /// </summary>
    /// <remarks>
    /// Exact, though most designs are never evaluated: they are visited in order of atoms, and one is skipped when bounds on its error
    /// and rounds that hold for certain already rule it out.
    /// </remarks>
    /// <param name="noise">The noise.</param>
    /// <param name="errorAtMost">Largest useful output error, above 0.</param>
    /// <exception cref="ArgumentOutOfRangeException">The error is not above 0.</exception>
    public static ImmutableArray<Factory> Undominated(FactoryNoise noise, double errorAtMost)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(errorAtMost);
        double floor = ErrorThatBuysNothing * errorAtMost;
        GridEvaluation grid = new(noise);
        FactoryFront front = new(floor);
        foreach (GridEntry entry in CatalogueGrid.Entries)
        {
            if (front.Beats(entry.LeastRounds, floor))
            {
                continue;
            }

            FactoryBounds bounds = grid.Bounds(entry);
            if (bounds.OutputError > errorAtMost || front.Beats(bounds.RoundsPerOutput, bounds.OutputError))
            {
                continue;
            }

            Factory factory = grid.Evaluate(entry);
            if (factory.OutputError <= errorAtMost)
            {
                front.Offer(factory);
            }
        }

        return [.. front.Members];
    }

    /// <summary>As <see cref="Undominated(FactoryNoise, double)"/>, remembered by a key of the noise and the error rounded up to an eighth of a decade.</summary>
    /// <param name="key">Key of the noise; see <see cref="NoiseGrid"/>.</param>
    /// <param name="noise">Gives the noise of that key; called only when it is new.</param>
    /// <param name="errorAtMost">
    /// Largest useful output error, above 0. Since it is rounded up, the result may hold designs with up to a third more.
    /// </param>
    /// <exception cref="ArgumentOutOfRangeException">The error is not above 0.</exception>
    public ImmutableArray<Factory> Undominated(NoiseKey key, Func<FactoryNoise> noise, double errorAtMost)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(errorAtMost);

        // 1e-12 must not become 1.3e-12 by rounding
        int step = (int)Math.Ceiling((ErrorStepsPerDecade * Math.Log10(errorAtMost)) - 1e-9);
        return _found.GetOrAdd(
            new Question(key, step),
            static (question, noise) => new Found(Undominated(noise(), Math.Pow(10, (double)question.ErrorStep / ErrorStepsPerDecade))),
            noise).Factories;
    }

    /// <summary>What was asked. A class, as is the answer: a dictionary of classes needs no code of its own when the program starts.</summary>
    private sealed class Question(NoiseKey noise, int errorStep) : IEquatable<Question>
    {
        private readonly NoiseKey _noise = noise;

        public int ErrorStep { get; } = errorStep;

        public bool Equals(Question? other) => other is not null && _noise.Equals(other._noise) && ErrorStep == other.ErrorStep;

        public override bool Equals(object? obj) => Equals(obj as Question);

        public override int GetHashCode() => HashCode.Combine(_noise.XBin, _noise.ZBin, _noise.InjectedBin, _noise.GateBin, ErrorStep);
    }

    private sealed record Found(ImmutableArray<Factory> Factories);

    /// <summary>The grid under one noise, each feeder block worked out once.</summary>
    private sealed class GridEvaluation(FactoryNoise noise)
    {
        private readonly NoiseTable _noise = new(noise);
        private readonly LevelResult?[] _feeders = new LevelResult?[CatalogueGrid.Feeders.Length];

        public Factory Evaluate(GridEntry entry) => entry.FeederIndex < 0
            ? FactoryEvaluation.OneLevel(entry.Design, FactoryEvaluation.FirstLevel(entry.Design.Last.Distances, _noise))
            : FactoryEvaluation.TwoLevels(entry.Design, Feeder(entry.FeederIndex), _noise);

        public FactoryBounds Bounds(GridEntry entry) => entry.FeederIndex < 0
            ? FactoryEvaluation.OneLevelBounds(entry.Design, _noise)
            : FactoryEvaluation.TwoLevelBounds(entry.Design, Feeder(entry.FeederIndex), _noise);

        private LevelResult Feeder(int index) =>
            _feeders[index] ??= FactoryEvaluation.FirstLevel(CatalogueGrid.Feeders[index], _noise);
    }
}
