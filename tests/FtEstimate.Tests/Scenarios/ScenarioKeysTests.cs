using FtEstimate.Scenarios;
using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Tests.Scenarios;

public class ScenarioKeysTests
{
    private static readonly KeyDefinition[] All = [.. ScenarioKeys.Tables.SelectMany(table => table.Keys).Distinct()];

    [Fact]
    public void A_key_stands_once_in_its_table() =>
        Assert.All(ScenarioKeys.Tables, table => Assert.Equal(table.Keys.Length, table.Keys.DistinctBy(key => key.Name).Count()));

    [Fact]
    public void Meanings_are_one_sentence() =>
        Assert.All(All, key => Assert.Matches("^[A-Z].+[.]$", key.Meaning));

    [Fact]
    public void Defaults_are_allowed_values() =>
        Assert.All(All, key => Assert.True(
            (key.Default is not double number || key.Accepts(number))
            && (key.DefaultText is not string text || key.Kind == ValueKind.PositiveOrBest || key.Choices.Contains(text)),
            key.Name));

    [Fact]
    public void A_required_key_has_no_default() =>
        Assert.DoesNotContain(All, key => key.Required && (key.Default is not null || key.DefaultText is not null));

    [Theory]
    // the factor must be that of the unit at the end of the key
    [InlineData("_us", 1e-6)]
    [InlineData("_um", 1e-6)]
    [InlineData("_mw", 1e-3)]
    [InlineData("_per_ms", 1e3)]
    [InlineData("_days", 86_400)]
    [InlineData("_m_s2", 1)]
    public void The_factor_to_si_follows_from_the_name(string suffix, double factor) =>
        Assert.All(All.Where(key => key.Name.EndsWith(suffix, StringComparison.Ordinal)), key => Assert.Equal(factor, key.ToSi));

    [Fact]
    public void Keys_without_a_known_unit_are_not_scaled() =>
        Assert.All(
            All.Where(key => key.ToSi != 1),
            key => Assert.Matches("(_us|_um|_mw|_per_ms|_days|hours_between_stops|hours_to_restart|decode_us_per_round)$", key.Name));

    [Theory]
    [InlineData(10, 1e-6, 1e-5)]
    [InlineData(0.5, 1e-6, 5e-7)]
    [InlineData(3, 1e3, 3000)]
    public void Numbers_of_few_digits_stay_numbers_of_few_digits(double value, double factor, double expected) =>
        Assert.Equal(expected, new KeyDefinition("x", ValueKind.Positive, "X.", ToSi: factor).InSi(value));

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(double.NegativeInfinity)]
    public void No_key_accepts_what_is_no_finite_number(double value) =>
        Assert.All(All.Where(key => key.IsNumber), key => Assert.False(key.Accepts(value)));

    [Theory]
    [InlineData("machine.gates.cz_error", "cz_error")]
    [InlineData("machine.readout.any-name.recool_time_us", "recool_time_us")]
    [InlineData("machine.readout.use", "use")]
    [InlineData("title", "title")]
    [InlineData("machine.gates.nothing", null)]
    [InlineData("machine.readout.a.b.kind", null)]
    public void A_key_is_found_by_its_path(string path, string? name) => Assert.Equal(name, ScenarioKeys.Find(path)?.Name);
}
