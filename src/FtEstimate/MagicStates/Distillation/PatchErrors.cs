namespace FtEstimate.MagicStates.Distillation;

/// <summary>Logical errors per round of the three kinds of patch of one level.</summary>
/// <param name="X">Error of a dX×dX patch.</param>
/// <param name="Z">Error of a dZ×dZ patch.</param>
/// <param name="M">Error of a dm×dm patch.</param>
internal readonly record struct PatchErrors(double X, double Z, double M);
