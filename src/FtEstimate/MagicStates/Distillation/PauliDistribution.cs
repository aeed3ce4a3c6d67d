using System.Numerics;
using System.Runtime.CompilerServices;
using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;

namespace FtEstimate.MagicStates.Distillation;

/// <summary>
/// Probabilities of all Pauli patterns of n qubits, and the independent events that spread them. Pattern (x, z) lies in
/// row z and column x. Every update is a sum of non-negative terms, so each pattern keeps its relative precision however rare it is.
/// </summary>
/// <remarks>Only the first rows (z) and columns (x) that can be occupied so far are touched by rotations; columns come in fours.</remarks>
internal readonly ref struct PauliDistribution
{
    private const int Lanes = 4;
    private const int BlockBits = 5;
    private const int Block = 1 << BlockBits;

    private readonly Span<double> _probabilities;
    private readonly int _rowBits;

    /// <summary>Starts with no error at all.</summary>
    /// <param name="probabilities">Room for <see cref="Size"/> values; its content is overwritten.</param>
    /// <param name="qubits">Number n of qubits.</param>
    public PauliDistribution(Span<double> probabilities, int qubits)
    {
        _rowBits = Math.Max(qubits, BlockBits);
        _probabilities = probabilities[..Size(qubits)];
        _probabilities.Clear();
        _probabilities[0] = 1;
    }

    /// <summary>Columns of a row: 2ⁿ, but never fewer than the block that fits in the registers.</summary>
    public int Columns => 1 << _rowBits;

    /// <summary>Room that n qubits need.</summary>
    public static int Size(int qubits) => 1 << (qubits + Math.Max(qubits, BlockBits));

    /// <summary>
    /// A Z error on all qubits of a mask, with the given probability; with one half where an earlier X error anticommutes with the
    /// rotation, since it then turns the other way.
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public void Rotate(int mask, double probability, int rows, int columns)
    {
        ref double start = ref MemoryMarshal.GetReference(_probabilities);
        Span<double> flips = stackalloc double[Columns];
        ref double flip = ref MemoryMarshal.GetReference(flips);
        Vector256<double> commuting = LaneProbabilities(mask, probability, flipped: 0);
        Vector256<double> anticommuting = LaneProbabilities(mask, probability, flipped: 1);
        for (int column = 0; column < columns; column += Lanes)
        {
            bool odd = (BitOperations.PopCount((uint)(column & mask)) & 1) != 0;
            (odd ? anticommuting : commuting).StoreUnsafe(ref flip, (nuint)column);
        }

        int pivot = 1 << BitOperations.Log2((uint)mask);
        for (int high = 0; high < rows; high += 2 * pivot)
        {
            for (int row = high; row < high + pivot; row++)
            {
                ref double here = ref Unsafe.Add(ref start, row << _rowBits);
                ref double there = ref Unsafe.Add(ref start, (row ^ mask) << _rowBits);
                for (nuint column = 0; column < (nuint)columns; column += Lanes)
                {
                    Vector256<double> a = Vector256.LoadUnsafe(ref here, column);
                    Vector256<double> b = Vector256.LoadUnsafe(ref there, column);
                    Exchange(ref a, ref b, Vector256.LoadUnsafe(ref flip, column));
                    a.StoreUnsafe(ref here, column);
                    b.StoreUnsafe(ref there, column);
                }
            }
        }
    }

    /// <summary>Independent X errors on all qubits.</summary>
    /// <param name="probabilities">The probability for each bit; zero where there is none.</param>
    /// <param name="rows">Patterns z are below this number.</param>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public void FlipX(ReadOnlySpan<double> probabilities, int rows)
    {
        ref double start = ref MemoryMarshal.GetReference(_probabilities);
        Vector256<double> q0 = Vector256.Create(probabilities[0]);
        Vector256<double> q1 = Vector256.Create(probabilities[1]);
        Vector256<double> q2 = Vector256.Create(probabilities[2]);
        Vector256<double> q3 = Vector256.Create(probabilities[3]);
        Vector256<double> q4 = Vector256.Create(probabilities[4]);
        nuint end = (nuint)(rows << _rowBits);
        for (nuint at = 0; at < end; at += Block)
        {
            Vector256<double> v0 = FlipLanes(Vector256.LoadUnsafe(ref start, at), q0, q1);
            Vector256<double> v1 = FlipLanes(Vector256.LoadUnsafe(ref start, at + 4), q0, q1);
            Vector256<double> v2 = FlipLanes(Vector256.LoadUnsafe(ref start, at + 8), q0, q1);
            Vector256<double> v3 = FlipLanes(Vector256.LoadUnsafe(ref start, at + 12), q0, q1);
            Vector256<double> v4 = FlipLanes(Vector256.LoadUnsafe(ref start, at + 16), q0, q1);
            Vector256<double> v5 = FlipLanes(Vector256.LoadUnsafe(ref start, at + 20), q0, q1);
            Vector256<double> v6 = FlipLanes(Vector256.LoadUnsafe(ref start, at + 24), q0, q1);
            Vector256<double> v7 = FlipLanes(Vector256.LoadUnsafe(ref start, at + 28), q0, q1);
            Exchange(ref v0, ref v1, q2);
            Exchange(ref v2, ref v3, q2);
            Exchange(ref v4, ref v5, q2);
            Exchange(ref v6, ref v7, q2);
            Exchange(ref v0, ref v2, q3);
            Exchange(ref v1, ref v3, q3);
            Exchange(ref v4, ref v6, q3);
            Exchange(ref v5, ref v7, q3);
            Exchange(ref v0, ref v4, q4);
            Exchange(ref v1, ref v5, q4);
            Exchange(ref v2, ref v6, q4);
            Exchange(ref v3, ref v7, q4);
            v0.StoreUnsafe(ref start, at);
            v1.StoreUnsafe(ref start, at + 4);
            v2.StoreUnsafe(ref start, at + 8);
            v3.StoreUnsafe(ref start, at + 12);
            v4.StoreUnsafe(ref start, at + 16);
            v5.StoreUnsafe(ref start, at + 20);
            v6.StoreUnsafe(ref start, at + 24);
            v7.StoreUnsafe(ref start, at + 28);
        }

        for (int bit = BlockBits; bit < _rowBits; bit++)
        {
            FlipFarX(ref start, (nuint)1 << bit, Vector256.Create(probabilities[bit]), end);
        }
    }

    /// <summary>The sum over x of one row, each pattern times its weight.</summary>
    /// <param name="row">The pattern z.</param>
    /// <param name="weights">A weight for every column.</param>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public double WeightedRow(int row, ReadOnlySpan<double> weights)
    {
        ref double start = ref MemoryMarshal.GetReference(_probabilities);
        ref double weight = ref MemoryMarshal.GetReference(weights);
        nuint first = (nuint)(row << _rowBits);
        Vector256<double> sum = Vector256<double>.Zero;
        for (nuint column = 0; column < (nuint)(1 << _rowBits); column += Lanes)
        {
            sum += Vector256.LoadUnsafe(ref start, first + column) * Vector256.LoadUnsafe(ref weight, column);
        }

        return Vector256.Sum(sum);
    }

    /// <summary>The sum over x of one row.</summary>
    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    public double Row(int row)
    {
        ref double start = ref MemoryMarshal.GetReference(_probabilities);
        nuint first = (nuint)(row << _rowBits);
        Vector256<double> sum = Vector256<double>.Zero;
        for (nuint column = 0; column < (nuint)(1 << _rowBits); column += Lanes)
        {
            sum += Vector256.LoadUnsafe(ref start, first + column);
        }

        return Vector256.Sum(sum);
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private static void FlipFarX(ref double start, nuint stride, Vector256<double> flip, nuint end)
    {
        for (nuint block = 0; block < end; block += 2 * stride)
        {
            for (nuint here = block; here < block + stride; here += Lanes)
            {
                Vector256<double> a = Vector256.LoadUnsafe(ref start, here);
                Vector256<double> b = Vector256.LoadUnsafe(ref start, here + stride);
                Exchange(ref a, ref b, flip);
                a.StoreUnsafe(ref start, here);
                b.StoreUnsafe(ref start, here + stride);
            }
        }
    }

    // Flips of the two lowest bits happen inside one vector.
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Vector256<double> FlipLanes(Vector256<double> a, Vector256<double> q0, Vector256<double> q1)
    {
        a += q0 * (Vector256.Shuffle(a, Vector256.Create(1L, 0L, 3L, 2L)) - a);
        return a + q1 * (Vector256.Shuffle(a, Vector256.Create(2L, 3L, 0L, 1L)) - a);
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static void Exchange(ref Vector256<double> a, ref Vector256<double> b, Vector256<double> flip)
    {
        Vector256<double> moved = flip * (b - a);
        a += moved;
        b -= moved;
    }

    private static Vector256<double> LaneProbabilities(int mask, double probability, int flipped)
    {
        double at0 = Lane(0);
        double at1 = Lane(1);
        double at2 = Lane(2);
        double at3 = Lane(3);
        return Vector256.Create(at0, at1, at2, at3);

        double Lane(int lane) => ((BitOperations.PopCount((uint)(lane & mask)) + flipped) & 1) != 0 ? 0.5 : probability;
    }
}
