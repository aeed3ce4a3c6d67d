using System.Numerics;

namespace FtEstimate.MagicStates.Distillation;

/// <summary>A set of the logical qubits of a protocol, numbered from 1 as in the papers; outputs come first.</summary>
/// <param name="Bits">Bit q−1 is set when qubit q belongs to the set.</param>
internal readonly record struct QubitSet(int Bits)
{
    public static QubitSet None => default;

    public int Count => BitOperations.PopCount((uint)Bits);

    /// <summary>The set of the given qubits, each 1 to 7.</summary>
    public static QubitSet Of(params ReadOnlySpan<int> qubits)
    {
        int bits = 0;
        foreach (int qubit in qubits)
        {
            bits |= 1 << (qubit - 1);
        }

        return new QubitSet(bits);
    }

    /// <summary>The qubits first, first+1, ..., last.</summary>
    public static QubitSet Range(int first, int last) => new((1 << last) - (1 << (first - 1)));

    public static QubitSet operator |(QubitSet left, QubitSet right) => new(left.Bits | right.Bits);

    public bool Contains(int qubit) => ((Bits >> (qubit - 1)) & 1) != 0;

    public bool Overlaps(QubitSet other) => (Bits & other.Bits) != 0;
}
