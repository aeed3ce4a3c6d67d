using FtEstimate.Workloads;

namespace FtEstimate.Tests.Workloads;

public sealed class FactoringTests
{
    // the closed forms of Gidney 2021 (arXiv:1905.09749), abstract, evaluated outside this project; four digits
    [Theory]
    [InlineData(1024, 3092.5, 3.275e8, 5.348e8)]
    [InlineData(2048, 6189.1, 2.624e9, 2.143e9)]
    [InlineData(3072, 9287.2, 8.865e9, 4.828e9)]
    [InlineData(4096, 12386.3, 2.103e10, 8.590e9)]
    public void Counts_follow_the_closed_forms(int bits, double qubits, double toffolis, double depth)
    {
        Workload workload = new Factoring(bits).Workload();

        Assert.Equal(qubits, workload.LogicalQubits, 0.05);
        Assert.Equal(1, workload.Toffolis / toffolis, 2e-4);
        Assert.Equal(1, workload.ReactionDepth!.Value / depth, 2e-4);
        Assert.Equal((0, 0), (workload.TStates, workload.Rotations));
    }

    // printed by the same paper: 0.4, 2.7 and 9.9 billion, from its optimiser, above the closed form
    [Theory]
    [InlineData(1024, 0.4e9)]
    [InlineData(2048, 2.7e9)]
    [InlineData(3072, 9.9e9)]
    public void The_closed_form_lies_up_to_a_fifth_below_the_printed_optimum(int bits, double printed) =>
        Assert.InRange(new Factoring(bits).Toffolis / printed, 0.8, 1);

    [Fact]
    public void Every_count_names_the_paper()
    {
        Workload workload = new Factoring(2048).Workload();

        Assert.Equal(["logical qubits", "Toffolis", "reaction depth"], workload.Derivations.Select(line => line.Quantity));
        Assert.All(workload.Derivations, line => Assert.Contains("1905.09749", line.Source, StringComparison.Ordinal));
        Assert.Equal(workload.Toffolis, workload.Derivations[1].Value);
    }

    [Fact]
    public void A_number_too_short_for_the_closed_form_is_refused() =>
        Assert.Throws<ArgumentOutOfRangeException>(() => new Factoring(8).Workload());
}
