using FtEstimate.MagicStates;

namespace FtEstimate.Tests.MagicStates;

public sealed class TileFactoryTests
{
    // Litinski 2019, arXiv:1808.02892: d = 13, p = 1e-4, a tile of 2d² qubits. The published figures are 3,720 qubits, 143 rounds
    // (rejections left out) and 3.5e-11.
    private readonly Factory _factory = TileFactory.Of(distance: 13, atomsPerTile: 2 * 13 * 13, injectedError: 1e-4);

    [Fact]
    public void Eleven_tiles_give_the_published_number_of_qubits() => Assert.Equal(3718, _factory.Atoms);

    [Fact]
    public void Eleven_steps_give_the_published_rounds() => Assert.Equal(143, _factory.RoundsPerBatch);

    [Fact]
    public void Output_error_is_the_published_one() => Assert.Equal(3.5e-11, _factory.OutputError, 0.05e-11);

    [Fact]
    public void Rejected_batches_are_repeated() =>
        // P_acc = 0.998501 by exact enumeration
        Assert.Equal(143 / 0.998501, _factory.RoundsPerOutput, 1e-4);
}
