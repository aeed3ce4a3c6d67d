using System.Numerics;

namespace FtEstimate.Tests.MagicStates.Distillation;

/// <summary>
/// A second, plain way to the same sums: each event in its order, nothing merged, one pattern after the other. Qubit q is bit q−1.
/// </summary>
internal sealed class PlainPatternSum(int qubits)
{
    private double[,] _patterns = StartingClean(1 << qubits);

    /// <summary>Flips z with a probability, or with one half where x anticommutes with the rotation.</summary>
    public void Rotate(int mask, double probability) =>
        Spread((x, _) => BitOperations.PopCount((uint)(x & mask)) % 2 == 1 ? 0.5 : probability, 0, mask);

    public void Z(int qubit, double probability) => Spread((_, _) => probability, 0, 1 << (qubit - 1));

    public void X(int qubit, double probability) => Spread((_, _) => probability, 1 << (qubit - 1), 0);

    /// <summary>Sum of the patterns that keep the z of qubits above the outputs clear, each with its weight.</summary>
    public double Accepted(int outputs, Func<int, int, double> weight)
    {
        double sum = 0;
        int outputMask = (1 << outputs) - 1;
        for (int x = 0; x < 1 << qubits; x++)
        {
            for (int z = 0; z <= outputMask; z++)
            {
                sum += _patterns[x, z] * weight(x & outputMask, z);
            }
        }

        return sum;
    }

    private static double[,] StartingClean(int size)
    {
        double[,] patterns = new double[size, size];
        patterns[0, 0] = 1;
        return patterns;
    }

    private void Spread(Func<int, int, double> probability, int flipX, int flipZ)
    {
        int size = 1 << qubits;
        double[,] next = new double[size, size];
        for (int x = 0; x < size; x++)
        {
            for (int z = 0; z < size; z++)
            {
                double p = probability(x, z);
                next[x, z] += (1 - p) * _patterns[x, z];
                next[x ^ flipX, z ^ flipZ] += p * _patterns[x, z];
            }
        }

        _patterns = next;
    }
}
