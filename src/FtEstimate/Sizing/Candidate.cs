using FtEstimate.MagicStates;
using FtEstimate.Noise;

namespace FtEstimate.Sizing;

/// <summary>One machine that meets the goal, as the search holds it. A class, so that collections of it need no code of their own when the program starts.</summary>
/// <param name="Point">Readout and exposure.</param>
/// <param name="Layout">Style and block.</param>
/// <param name="Distance">Code distance.</param>
/// <param name="Factory">The factory, evaluated at noise rounded up; null when no magic states are needed.</param>
/// <param name="FactoryCount">How many of it.</param>
/// <param name="RotationError">Error per rotation; 0 when there are none.</param>
/// <param name="Atoms">Atoms in traps.</param>
/// <param name="RunSeconds">Run time of one shot.</param>
public sealed record Candidate(
    OperatingPoint Point,
    LogicLayout Layout,
    int Distance,
    Factory? Factory,
    int FactoryCount,
    double RotationError,
    double Atoms,
    double RunSeconds);
