using FtEstimate.Workloads;

namespace FtEstimate.Tests.Workloads;

public sealed class SpinLatticeTests
{
    private static readonly SpinLattice TenByTen = new(new SquareLattice(10, 10, false), 1, 1, 10, 1e-2);

    // worked outside this project for a ring: sqrt(1000·200/0.01) = 4472.1
    [Fact]
    public void A_ring_of_100_spins_needs_4473_steps_for_ten_times()
    {
        SpinLattice ring = new(new SquareLattice(1, 100, true), 1, 1, 10, 1e-2);

        Assert.Equal(4473, new IsingTrotterBound(100, 100, 2, 1, 1).Steps(2, 10, 1e-2));
        Assert.Equal(4473, ring.Steps);
    }

    [Fact]
    public void The_steps_are_the_fewest_that_keep_the_bound()
    {
        IsingTrotterBound bound = new(100, 180, 4, 1, 1.3);

        foreach (int order in (int[])[1, 2])
        {
            double steps = bound.Steps(order, 7, 1e-3);
            Assert.True(bound.Error(order, 7, steps) <= 1e-3);
            Assert.True(bound.Error(order, 7, steps - 1) > 1e-3);
        }
    }

    // 180 bonds and 100 sites; sqrt(1000 (4/3·180 + 16/6·100)/0.01) = 7118.05
    [Fact]
    public void Rotations_are_one_per_bond_and_site_and_step_and_a_last_layer_of_bonds()
    {
        Workload workload = TenByTen.Workload();

        Assert.Equal(7119, TenByTen.Steps);
        Assert.Equal(100, workload.LogicalQubits);
        Assert.Equal(7119 * 280 + 180, workload.Rotations);
        Assert.Equal(7119 * 5 + 4, workload.RotationDepth);
        Assert.Null(workload.RotationError);
    }

    [Fact]
    public void Order_1_has_no_last_layer()
    {
        Workload workload = (TenByTen with { Order = 1, StatedSteps = 50 }).Workload();

        Assert.Equal(50 * 280, workload.Rotations);
        Assert.Equal(50 * 5, workload.RotationDepth);
    }

    [Fact]
    public void Stated_steps_replace_the_bound_and_say_so()
    {
        Workload workload = (TenByTen with { StatedSteps = 120 }).Workload();

        Derivation steps = workload.Derivations.Single(line => line.Quantity == "steps");
        Assert.Equal(120, steps.Value);
        Assert.Equal("stated in the file", steps.Source);
        Assert.Equal(120 * 280 + 180, workload.Rotations);
    }

    [Fact]
    public void Time_is_counted_in_units_of_one_over_the_coupling()
    {
        SpinLattice scaled = TenByTen with { Coupling = 2, Field = 2 };

        Assert.Equal(TenByTen.Steps, scaled.Steps);
    }

    [Fact]
    public void The_formula_and_its_parameters_are_told()
    {
        string formula = TenByTen.Workload().Derivations.Single(line => line.Quantity == "steps").Formula;

        Assert.Contains("4/3 g^2 J B", formula, StringComparison.Ordinal);
        Assert.Contains("t = 10/J, J = 1, g = 1, N = 100, B = 180, z = 4", formula, StringComparison.Ordinal);
    }

    [Fact]
    public void Orders_above_2_are_refused() =>
        Assert.Throws<ArgumentOutOfRangeException>(() => (TenByTen with { Order = 4 }).Steps);
}
