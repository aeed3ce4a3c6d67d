using FtEstimate.MagicStates;

namespace FtEstimate.Tests.MagicStates;

internal static class TestNoise
{
    /// <summary>0.1 (100 p)^((d+1)/2) per round (Fowler 2018, arXiv:1808.06709), injected error p.</summary>
    public static FactoryNoise Textbook(double p) => new(d => 0.1 * Math.Pow(100 * p, (d + 1) / 2.0), p);

    public static FactoryDesign Design(string text)
    {
        Assert.True(FactoryDesign.TryParse(text, out FactoryDesign? design, out string? fault), fault);
        return design;
    }
}
