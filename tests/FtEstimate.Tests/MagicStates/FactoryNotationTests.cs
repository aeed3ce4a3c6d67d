using CsCheck;
using FtEstimate.MagicStates;

namespace FtEstimate.Tests.MagicStates;

public sealed class FactoryNotationTests
{
    [Theory]
    [InlineData("15-to-1:17,7,7")]
    [InlineData("15-to-1:13,5,5*6 > 15-to-1:29,11,13")]
    public void A_design_prints_as_it_is_written(string text) => Assert.Equal(text, TestNoise.Design(text).ToString());

    [Fact]
    public void Spaces_do_not_matter() =>
        Assert.Equal(
            FactoryDesign.TwoLevels(new PatchDistances(13, 5, 5), 6, new PatchDistances(29, 11, 13)),
            TestNoise.Design(" 15-to-1 : 13, 5,5 *6>15-to-1:29,11,13 "));

    [Theory]
    [InlineData("", "empty")]
    [InlineData("20-to-4:15,7,9", "not modelled yet")]
    [InlineData("8-to-CCZ:15,7,9", "not modelled yet")]
    [InlineData("15-to-1:17,7", "three distances")]
    [InlineData("15-to-1:17,7,8", "must be odd")]
    [InlineData("15-to-1:17,7,x", "\"x\"")]
    [InlineData("15-to-1:17,7,7*4", "single block")]
    [InlineData("15-to-1:9,3,3 > 15-to-1:17,7,7", "number of its blocks")]
    [InlineData("15-to-1:9,3,3*5 > 15-to-1:17,7,7", "must be even")]
    [InlineData("15-to-1:9,3,3*4 > 15-to-1:9,3,3*4 > 15-to-1:17,7,7", "more than two levels")]
    [InlineData("17,7,7", "a protocol, a colon")]
    public void A_wrong_design_is_explained(string text, string part)
    {
        Assert.False(FactoryDesign.TryParse(text, out _, out string? fault));
        Assert.Contains(part, fault, StringComparison.Ordinal);
    }

    [Fact]
    public void Any_text_is_either_read_or_explained()
    {
        Gen<string> pieces = Gen.OneOf("15-to-1", ":", ",", "*", ">", " ", "7", "-3", "99999999999", "é", "").Array[0, 12].Select(string.Concat);
        Gen.OneOf(pieces, Gen.String).Sample(text =>
            FactoryDesign.TryParse(text, out FactoryDesign? design, out string? fault)
                ? FactoryDesign.TryParse(design.ToString(), out FactoryDesign? again, out _) && again == design
                : !string.IsNullOrEmpty(fault));
    }
}
