using FtEstimate.Workloads;

namespace FtEstimate.Tests.Workloads;

public sealed class SquareLatticeTests
{
    // brute force: list every neighbouring pair
    [Fact]
    public void Bonds_and_coordination_match_a_list_of_all_neighbours()
    {
        for (int rows = 1; rows <= 5; rows++)
        {
            for (int columns = 1; columns <= 5; columns++)
            {
                foreach (bool periodic in (bool[])[false, true])
                {
                    HashSet<(int, int)> pairs = IsingMatrices.Bonds(rows, columns, periodic);
                    SquareLattice lattice = new(rows, columns, periodic);
                    int coordination = Enumerable.Range(0, rows * columns).Max(site => pairs.Count(pair => pair.Item1 == site || pair.Item2 == site));

                    Assert.Equal(pairs.Count, lattice.Bonds);
                    Assert.Equal(coordination, lattice.Coordination);
                }
            }
        }
    }

    [Theory]
    [InlineData(10, 10, false, 4)]
    [InlineData(10, 10, true, 4)]
    [InlineData(9, 10, true, 5)] // a ring of odd length takes three colours
    [InlineData(1, 10, false, 2)]
    [InlineData(1, 2, true, 1)]
    public void Bond_layers_follow_the_edge_colouring(int rows, int columns, bool periodic, int layers) =>
        Assert.Equal(layers, new SquareLattice(rows, columns, periodic).BondLayers);
}
