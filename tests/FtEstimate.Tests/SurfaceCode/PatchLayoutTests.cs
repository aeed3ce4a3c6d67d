using FtEstimate.SurfaceCode;

namespace FtEstimate.Tests.SurfaceCode;

public sealed class PatchLayoutTests
{
    [Theory]
    [InlineData("2d^2-1", 3, 17)] // the 17-atom rotated patch
    [InlineData("2d^2", 13, 338)] // Litinski 2019 (arXiv:1808.02892): 164 tiles of 2·13² are 55,432
    [InlineData("2(d+1)^2", 27, 1568)] // Gidney 2021 (arXiv:1905.09749)
    [InlineData("2(d+1)^2", 25, 1352)] // Gidney 2025 (arXiv:2505.15917)
    public void Atoms_per_tile_match_published_figures(string name, int distance, int atoms) =>
        Assert.Equal(atoms, PatchLayout.Named(name)!.AtomsPerTile(distance));

    [Fact]
    public void Data_and_checks_make_up_the_tile()
    {
        Assert.All(PatchLayout.All, layout =>
            Assert.Equal(layout.AtomsPerTile(11), layout.DataAtoms(11) + layout.CheckAtoms(11)));
        Assert.Equal((121, 120), (PatchLayout.Bare.DataAtoms(11), PatchLayout.Bare.CheckAtoms(11)));
    }

    [Fact]
    public void An_unknown_name_is_no_layout() => Assert.Null(PatchLayout.Named("d^2"));
}
