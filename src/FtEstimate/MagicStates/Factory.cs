namespace FtEstimate.MagicStates;

/// <summary>A magic-state factory with what it delivers under a given noise.</summary>
public sealed record Factory
{
    private readonly string? _name;

    /// <summary>The distillation design; null for a factory that is no such design (see <see cref="TileFactory"/>).</summary>
    public FactoryDesign? Design { get; init; }

    /// <summary>The design in words, unique within a catalogue.</summary>
    public string Name
    {
        get => _name ?? Design?.ToString() ?? "factory";
        init => _name = value;
    }

    /// <summary>Atoms of the factory, half of them data and half checks.</summary>
    public required int Atoms { get; init; }

    /// <summary>
    /// Syndrome rounds one batch takes, whether accepted or not. Feeders' rejected batches are inside, as a longer mean step.
    /// </summary>
    public required double RoundsPerBatch { get; init; }

    /// <summary>Magic states of one accepted batch.</summary>
    public required int Outputs { get; init; }

    /// <summary>Infidelity of one accepted magic state.</summary>
    public required double OutputError { get; init; }

    /// <summary>Probability that a batch of the last level is accepted.</summary>
    public required double Acceptance { get; init; }

    /// <summary>Distance dX of the last level.</summary>
    public required int DX { get; init; }

    /// <summary>Distance dZ of the last level.</summary>
    public required int DZ { get; init; }

    /// <summary>Distance dm of the last level.</summary>
    public required int DM { get; init; }

    /// <summary>Mean number of rounds per magic state, rejected batches included.</summary>
    public double RoundsPerOutput => RoundsPerBatch / (Outputs * Acceptance);

    /// <summary>Evaluates a design under a noise by summing all its error patterns (Litinski 2019, arXiv:1905.06903).</summary>
    /// <remarks>One-level rounds: 6dm per batch. Two levels: 7.5 steps of max(6dm/[(n/2)(1−rejected)], Dm) rounds.</remarks>
    public static Factory Of(FactoryDesign design, FactoryNoise noise) => FactoryEvaluation.Of(design, new NoiseTable(noise));
}
