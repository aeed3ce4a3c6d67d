using FtEstimate.Machines;
using FtEstimate.Noise;
using FtEstimate.Quantities;
using FtEstimate.Scenarios;
using FtEstimate.Sizing;
using FtEstimate.Tests.Cycles;

namespace FtEstimate.Tests.Sizing;

/// <summary>What people in the field say without citing anybody: common practice, no source.</summary>
public sealed class FactsOfTheTradeTests
{
    // Gates near three nines and everything else quieter, so that the CZ gates are three quarters of the noise: a logical qubit takes 100 to 1,000 atoms, a
    // hundred of them 10,000 or more. (With the flips of the other tests, where gates are two thirds, 1e6 layers take 1,057 atoms.)
    [Theory]
    [InlineData(1e4)]
    [InlineData(1e5)]
    [InlineData(1e6)]
    public void At_three_nines_a_logical_qubit_takes_100_to_1000_atoms_and_a_hundred_take_10000_or_more(double logicalLayers)
    {
        AtomArray threeNines = BenchMachine.Array with
        {
            Gates = BenchMachine.Array.Gates with { Cz = new EntanglingGate(1e-3, 1e-4, 0.3e-6), ResetFlip = 2e-4 },
            Readout = BenchMachine.Apart with
            {
                Detector = BenchMachine.Stated with { DarkFlip = 5e-4, BrightFlip = 5e-4 },
                DataDisturbancePerSecond = 0.1,
            },
        };
        Scenario memory = Questions.Bench(Questions.Of(100, 0, logicalLayers), threeNines) with
        {
            Method = Questions.Open with { Style = LogicStyles.Surgery, Patches = 100 },
        };

        SizedMachine machine = memory.Answer().Best!;

        ErrorLedger ledger = machine.Ledger;
        Assert.InRange(ledger.Share(ledger.Channels.Single(channel => channel.Name == "CZ gates")), 0.7, 0.8);
        Assert.InRange(machine.Atoms.Total / 100, 100, 1000);
        Assert.True(machine.Atoms.Total >= 10_000);
    }

    // eighteen things that each go wrong in 8 % all go right in 22 %
    [Fact]
    public void Eighteen_risks_of_8_percent_leave_22_percent() =>
        Assert.Equal(0.22, 1 - FailureComposition.Repeated(18, 0.08), 0.005);
}
