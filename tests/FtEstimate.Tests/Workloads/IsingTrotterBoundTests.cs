using FtEstimate.Workloads;

namespace FtEstimate.Tests.Workloads;

public sealed class IsingTrotterBoundTests
{
    // dense matrices of 4 to 6 spins; the bound adds norms that do not all peak in one state, hence some slack, but not much
    [Theory]
    [InlineData(1, 4, true, 1.0)]
    [InlineData(1, 5, true, 1.0)]
    [InlineData(1, 6, true, 1.0)]
    [InlineData(1, 6, true, 0.4)]
    [InlineData(1, 6, true, 2.5)]
    [InlineData(2, 3, false, 1.0)]
    public void The_exact_error_is_below_the_bound_and_at_least_a_quarter_of_it(int rows, int columns, bool periodic, double field)
    {
        SquareLattice lattice = new(rows, columns, periodic);
        IsingTrotterBound bound = new(lattice.Sites, lattice.Bonds, lattice.Coordination, 1, field);
        IsingMatrices matrices = new(rows, columns, periodic, 1, field);

        foreach (int order in (int[])[1, 2])
        {
            double ratio = matrices.TrotterError(order, 0.05, 1) / bound.Error(order, 0.05, 1);
            Assert.InRange(ratio, 0.25, 1);
        }
    }

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    public void Over_many_steps_the_bound_still_holds(int order)
    {
        IsingTrotterBound bound = new(6, 6, 2, 1, 1);
        IsingMatrices matrices = new(1, 6, true, 1, 1);

        foreach (int steps in (int[])[10, 20, 80])
        {
            Assert.InRange(matrices.TrotterError(order, 2, steps), 0, bound.Error(order, 2, steps));
        }
    }
}
