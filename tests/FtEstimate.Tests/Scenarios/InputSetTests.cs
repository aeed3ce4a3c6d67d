using FtEstimate.Scenarios;

namespace FtEstimate.Tests.Scenarios;

public class InputSetTests
{
    private static readonly InputSet Two = new([new Input("a", 1, Low: 0.5, High: 2, Source: "log"), new Input("b", Text: "best")]);

    [Fact]
    public void A_replaced_number_keeps_its_place_and_loses_its_range_and_source()
    {
        InputSet changed = Two.With("a", 3);

        Assert.Equal<Input>([new Input("a", 3), new Input("b", Text: "best")], changed.InOrder);
        Assert.Equal(1, Two.Find("a")!.Number);
    }

    [Fact]
    public void A_new_number_is_added_at_the_end() => Assert.Equal(["a", "b", "c"], Two.With("c", 3).InOrder.Select(input => input.Path));

    [Fact]
    public void Several_numbers_are_replaced_at_once()
    {
        InputSet changed = Two.With([KeyValuePair.Create("b", 5.0), KeyValuePair.Create("a", 4.0)]);

        Assert.Equal<Input>([new Input("a", 4), new Input("b", 5)], changed.InOrder);
    }

    [Fact]
    public void A_path_stands_once() => Assert.Throws<ArgumentException>(() => new InputSet([new Input("a", 1), new Input("a", 2)]));
}
