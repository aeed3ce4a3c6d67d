using CsCheck;
using FtEstimate.Noise;
using FtEstimate.Tests.Cycles;

namespace FtEstimate.Tests.Noise;

public sealed class PauliChannelTests
{
    // Ghosh 2012 (arXiv:1210.5799); 13 digits were computed outside the project
    [Fact]
    public void Waiting_is_the_twirl_of_amplitude_and_phase_damping()
    {
        foreach (double[] row in PublishedTable.Rows("pauli-twirl.csv"))
        {
            PauliChannel channel = PauliChannel.Waiting(row[0], row[1], row[2]);

            Assert.Equal(row[3], channel.X, 1e-12 * row[3]);
            Assert.Equal(channel.X, channel.Y);

            // T2 = 2 T1 cancels two digits, and the table ends after 13
            Assert.Equal(row[4], channel.Z, 2e-11 * row[4]);
        }
    }

    // exact: both exponentials are then the same
    [Fact]
    public void Equal_relaxation_and_coherence_times_depolarise() =>
        Gen.Select(Gen.Double[1e-6, 10], Gen.Double[0.1, 100]).Sample((seconds, lifetime) =>
        {
            PauliChannel channel = PauliChannel.Waiting(seconds, lifetime, lifetime);
            Assert.Equal(channel.X, channel.Z, 1e-14);
            Assert.Equal(channel.X, PauliChannel.Depolarising(channel.Total).X, 1e-15);
        });

    // exact: the maximally mixed state is I, X, Y, Z with a quarter each
    [Fact]
    public void A_very_long_wait_leaves_nothing()
    {
        PauliChannel channel = PauliChannel.Waiting(1e6, 1, 1);

        Assert.Equal(0.25, channel.X, 1e-12);
        Assert.Equal(0.25, channel.Z, 1e-12);
    }

    // exact: waiting twice as long composes the channel with itself (Pauli channels multiply in their eigenvalues)
    [Fact]
    public void Two_waits_in_a_row_are_one_wait_of_twice_the_time() =>
        Gen.Select(Gen.Double[1e-4, 1], Gen.Double[0.5, 10], Gen.Double[0.05, 1.99]).Sample((seconds, t1, ratio) =>
        {
            PauliChannel one = PauliChannel.Waiting(seconds, t1, ratio * t1);
            PauliChannel two = PauliChannel.Waiting(2 * seconds, t1, ratio * t1);
            double flipsOfZ = 1 - (2 * (one.X + one.Y));
            double flipsOfX = 1 - (2 * (one.Y + one.Z));
            Assert.Equal(flipsOfZ * flipsOfZ, 1 - (2 * (two.X + two.Y)), 1e-12);
            Assert.Equal(flipsOfX * flipsOfX, 1 - (2 * (two.Y + two.Z)), 1e-12);
        });
}
