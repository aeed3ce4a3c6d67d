namespace FtEstimate.MagicStates;

/// <summary>A noise rounded to a grid, by which results are remembered. Equal keys must mean equal noise.</summary>
/// <param name="XBin">Bin of the noise strength seen by X checks.</param>
/// <param name="ZBin">Bin of the noise strength seen by Z checks.</param>
/// <param name="InjectedBin">Bin of the error of an injected state.</param>
/// <param name="GateBin">Bin of anything else that changes the law, for instance the strength added by gates; 0 when there is none.</param>
public readonly record struct NoiseKey(int XBin, int ZBin, int InjectedBin, int GateBin);
