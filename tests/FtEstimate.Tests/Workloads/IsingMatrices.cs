using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.LinearAlgebra.Factorization;
using Complex = System.Numerics.Complex;

namespace FtEstimate.Tests.Workloads;

/// <summary>The Ising model of a few spins as dense matrices, by MathNet: an outside check of the error bounds.</summary>
internal sealed class IsingMatrices
{
    private readonly Matrix<double> bonds;
    private readonly Matrix<double> field;

    public IsingMatrices(int rows, int columns, bool periodic, double coupling, double transverse)
    {
        int sites = rows * columns;
        int size = 1 << sites;
        bonds = Matrix<double>.Build.Dense(size, size);
        field = Matrix<double>.Build.Dense(size, size);
        for (int state = 0; state < size; state++)
        {
            foreach ((int first, int second) in Bonds(rows, columns, periodic))
            {
                bonds[state, state] += ((state >> first) & 1) == ((state >> second) & 1) ? coupling : -coupling;
            }

            for (int site = 0; site < sites; site++)
            {
                field[state, state ^ (1 << site)] += transverse;
            }
        }
    }

    /// <summary>All pairs of neighbours, each once.</summary>
    public static HashSet<(int First, int Second)> Bonds(int rows, int columns, bool periodic)
    {
        HashSet<(int, int)> pairs = [];
        for (int row = 0; row < rows; row++)
        {
            for (int column = 0; column < columns; column++)
            {
                Add(row, column, row, column + 1);
                Add(row, column, row + 1, column);
            }
        }

        return pairs;

        void Add(int row, int column, int otherRow, int otherColumn)
        {
            if (!periodic && (otherRow == rows || otherColumn == columns))
            {
                return;
            }

            int site = row * columns + column;
            int other = otherRow % rows * columns + otherColumn % columns;
            if (site != other)
            {
                pairs.Add((Math.Min(site, other), Math.Max(site, other)));
            }
        }
    }

    /// <summary>Spectral norm of the difference between the product formula and the exact evolution.</summary>
    public double TrotterError(int order, double time, int steps)
    {
        double tau = time / steps;
        Matrix<Complex> step = order == 1
            ? Evolution(bonds, tau) * Evolution(field, tau)
            : Evolution(bonds, tau / 2) * Evolution(field, tau) * Evolution(bonds, tau / 2);
        return (step.Power(steps) - Evolution(bonds + field, time)).L2Norm();
    }

    private static Matrix<Complex> Evolution(Matrix<double> hamiltonian, double time)
    {
        Evd<double> decomposition = hamiltonian.Evd(Symmetricity.Symmetric);
        Matrix<Complex> vectors = decomposition.EigenVectors.ToComplex();
        Vector<Complex> phases = decomposition.EigenValues.Map(energy => Complex.Exp(-Complex.ImaginaryOne * energy.Real * time));
        return vectors * Matrix<Complex>.Build.DenseOfDiagonalVector(phases) * vectors.Transpose();
    }
}
