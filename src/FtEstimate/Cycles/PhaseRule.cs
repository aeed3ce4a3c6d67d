namespace FtEstimate.Cycles;

/// <summary>One kind of work in a round and how its duration grows with the machine.</summary>
/// <param name="Name">Printed in reports.</param>
/// <param name="Part">Which part of the round it belongs to.</param>
/// <param name="Work">What has to be served.</param>
/// <param name="AtOnce">How many are served in one go, machine-wide; infinite when all are.</param>
/// <param name="SecondsWhole">Duration when one go serves all.</param>
/// <param name="SecondsPerGo">Duration of each of several goes.</param>
/// <param name="PerRound">Times per round; below 1 for work that is not done every round.</param>
/// <param name="Data">What the data atoms do meanwhile.</param>
public sealed record PhaseRule(
    string Name,
    CyclePart Part,
    WorkKind Work,
    double AtOnce,
    double SecondsWhole,
    double SecondsPerGo,
    double PerRound,
    DataState Data)
{
    /// <summary>Goes needed to serve a load, at least 1.</summary>
    public double Goes(in MachineLoad load, int atomsPerCheck)
    {
        double count = Work switch
        {
            WorkKind.Pairs => load.PairsPerLayer,
            WorkKind.Checks => load.CheckSites,
            WorkKind.CheckAtoms => load.CheckSites * atomsPerCheck,
            WorkKind.AllAtoms => load.DataAtoms + (load.CheckSites * atomsPerCheck),
            WorkKind.Everything => 1,
            _ => throw new InvalidOperationException($"unknown kind of work {Work}"),
        };
        return count <= AtOnce ? 1 : Math.Ceiling(count / AtOnce);
    }

    /// <summary>Whether the duration is the same for every load.</summary>
    public bool IsFixed => Work == WorkKind.Everything || double.IsPositiveInfinity(AtOnce);

    /// <summary>Seconds per round for a load.</summary>
    public double Seconds(in MachineLoad load, int atomsPerCheck) => SecondsFor(Goes(load, atomsPerCheck));

    /// <summary>Seconds per round for a number of goes.</summary>
    public double SecondsFor(double goes) => PerRound * (goes <= 1 ? SecondsWhole : goes * SecondsPerGo);
}

/// <summary>The part of the round a phase belongs to.</summary>
public enum CyclePart
{
    /// <summary>Reset and one-qubit gates.</summary>
    Preparation,

    /// <summary>CZ layers and the moves between them.</summary>
    Gates,

    /// <summary>Reading the checks.</summary>
    Readout,

    /// <summary>Looking for lost data atoms.</summary>
    LossCheck,
}

/// <summary>What a phase has to serve.</summary>
public enum WorkKind
{
    /// <summary>Pairs of one CZ layer.</summary>
    Pairs,

    /// <summary>Checks, an ensemble counting once.</summary>
    Checks,

    /// <summary>Check atoms.</summary>
    CheckAtoms,

    /// <summary>Data and check atoms.</summary>
    AllAtoms,

    /// <summary>Nothing that grows with the machine.</summary>
    Everything,
}

/// <summary>What the data atoms do during a phase.</summary>
public enum DataState
{
    /// <summary>In the sequence of CZ layers, half the time in the Hadamard frame.</summary>
    InGates,

    /// <summary>Waiting, with their ordinary coherence.</summary>
    Waiting,

    /// <summary>Waiting in the shelved states.</summary>
    Shelved,

    /// <summary>Not affected: the phase runs beside the others.</summary>
    Beside,
}
