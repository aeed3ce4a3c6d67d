namespace FtEstimate.MagicStates.Distillation;

/// <summary>
/// Probabilities of the error events of one level, from its distances (Litinski 2019, arXiv:1905.06903). A rotation that fails by
/// P_{π/2} is a Z error on all its qubits; one that fails by P_{±π/4} is that Z error with probability one half (Pauli twirl; agrees
/// with the full density matrix to 5e-5).
/// </summary>
internal readonly struct LevelNoise
{
    private readonly PatchDistances _distances;
    private readonly double _singleRotation;
    private readonly double _rotation;
    private readonly double _rotationPerLength;
    private readonly double _disturbance;
    private readonly double _disturbancePerLength;

    private LevelNoise(
        PatchDistances distances,
        PatchErrors patch,
        double stepRounds,
        double singleRotation,
        double rotation,
        double ancillaAllowance)
    {
        _distances = distances;
        (double dx, double dz, double dm) = (distances.X, distances.Z, distances.M);
        _rotationPerLength = 0.25 * (dx / dm) * patch.M;
        _disturbancePerLength = 0.5 * (dm / dx) * patch.X;
        _disturbance = _disturbancePerLength * ancillaAllowance;
        _rotation = rotation + _rotationPerLength * ancillaAllowance;
        _singleRotation = singleRotation + _rotationPerLength * ancillaAllowance;
        CheckStoredX = 0.5 * (dz / dx) * patch.X * stepRounds;
        CheckStoredZ = 0.5 * (dx / dz) * patch.Z * stepRounds;
        OutputStored = 0.5 * patch.X * stepRounds;
        OutputHandedOver = 0.5 * patch.X * (dm + 2 * dx);
    }

    /// <summary>X error of a check qubit during one step.</summary>
    public double CheckStoredX { get; }

    /// <summary>Z error of a check qubit during one step.</summary>
    public double CheckStoredZ { get; }

    /// <summary>X error, and as much Z error, of an output qubit during one step.</summary>
    public double OutputStored { get; }

    /// <summary>X error, and as much Z error, of an output qubit while it leaves.</summary>
    public double OutputHandedOver { get; }

    /// <summary>A level that rotates with freshly injected states; one step lasts dm rounds.</summary>
    public static LevelNoise Injecting(PatchDistances distances, PatchErrors patch, double injectedError)
    {
        (double dz, double dm) = (distances.Z, distances.M);
        double injected = 2 * injectedError / 3;
        double single = injected + 0.5 * (dm / dz) * patch.Z * dm + 0.25 * dz * patch.M;
        double several = injected + 0.75 * patch.M * dm;
        return new LevelNoise(distances, patch, dm, single, several, ancillaAllowance: 0);
    }

    /// <summary>A level that rotates with states of lower-level factories.</summary>
    /// <param name="distances">Distances of this level.</param>
    /// <param name="patch">Patch errors at those distances.</param>
    /// <param name="inputError">Output error of the lower level.</param>
    /// <param name="moveLength">Length of the path by which a state arrives, in sites.</param>
    /// <param name="stepRounds">Rounds of one step.</param>
    public static LevelNoise FedByFactories(
        PatchDistances distances, PatchErrors patch, double inputError, double moveLength, double stepRounds)
    {
        double rotation = inputError + 0.75 * moveLength * patch.M;
        return new LevelNoise(distances, patch, stepRounds, rotation, rotation, ancillaAllowance: distances.M);
    }

    /// <summary>Probability that a rotation leaves a Z error on all its qubits.</summary>
    public double RotationError(bool single, int spansX, int spansZ) =>
        (single ? _singleRotation : _rotation) + _rotationPerLength * Length(spansX, spansZ);

    /// <summary>Probability of an extra Z on an output along which the ancilla patch of a rotation runs.</summary>
    public double Disturbance(int spansX, int spansZ) => _disturbance + _disturbancePerLength * Length(spansX, spansZ);

    private double Length(int spansX, int spansZ) => spansX * _distances.X + spansZ * _distances.Z;
}
