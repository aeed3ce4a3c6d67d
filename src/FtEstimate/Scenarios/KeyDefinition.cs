using System.Collections.Immutable;

namespace FtEstimate.Scenarios;

/// <summary>What a key of a scenario file means: the one place that reading, validation, documentation and planning share.</summary>
/// <param name="Name">The key, with its unit.</param>
/// <param name="Kind">What may stand there.</param>
/// <param name="Meaning">One sentence for the documentation.</param>
/// <param name="ToSi">Factor from the key's unit to SI (1e-6 for µs).</param>
/// <param name="Low">Smallest value allowed, in the key's unit.</param>
/// <param name="High">Largest value allowed, in the key's unit.</param>
/// <param name="Required">Whether the table is incomplete without it.</param>
/// <param name="Default">The value when absent, in the key's unit; null: none.</param>
/// <param name="DefaultText">The text when absent; null: none.</param>
/// <param name="Choices">The texts allowed; empty: any.</param>
/// <param name="Better">Which way is better for the machine, for planning.</param>
public sealed record KeyDefinition(
    string Name,
    ValueKind Kind,
    string Meaning,
    double ToSi = 1,
    double Low = 0,
    double High = KeyDefinition.Largest,
    bool Required = false,
    double? Default = null,
    string? DefaultText = null,
    ImmutableArray<string> Choices = default,
    BetterWhen Better = BetterWhen.NoDirection)
{
    /// <summary>No input is larger than this, so that products of inputs stay finite.</summary>
    public const double Largest = 1e30;

    /// <summary>No input that must be above zero is smaller than this, so that quotients of inputs stay finite.</summary>
    public const double Smallest = 1e-30;

    /// <summary>The texts allowed; empty: any.</summary>
    public ImmutableArray<string> Choices { get; } = Choices.IsDefault ? [] : Choices;

    /// <summary>Whether a number stands here.</summary>
    public bool IsNumber => Kind is not (ValueKind.Text or ValueKind.Flag);

    /// <summary>Whether the number must be above zero.</summary>
    public bool IsAboveZero => Kind is ValueKind.Positive or ValueKind.PositiveOrBest;

    /// <summary>The largest number allowed, in the key's unit.</summary>
    public double Upper => Kind == ValueKind.Probability ? Math.Min(High, 1) : High;

    /// <summary>A number in the key's unit, in SI units.</summary>
    // 10 µs are 10/1e6 s: 10 · 1e-6 would be rounded twice and print as 9.999999999999999E-06
    public double InSi(double value) => ToSi < 1 ? value / Math.Round(1 / ToSi) : value * ToSi;

    /// <summary>Whether a number, in the key's unit, may stand here; never for NaN and infinities.</summary>
    public bool Accepts(double value) =>
        value >= Low && value <= Upper
        && (!IsAboveZero || value >= Smallest)
        && (Kind != ValueKind.Whole || double.IsInteger(value));
}

/// <summary>What may stand at a key.</summary>
public enum ValueKind
{
    /// <summary>A number in [0, 1], with an optional range.</summary>
    Probability,

    /// <summary>A number greater than zero, with an optional range.</summary>
    Positive,

    /// <summary>A number of at least zero, with an optional range.</summary>
    NotNegative,

    /// <summary>A whole number.</summary>
    Whole,

    /// <summary>A number greater than zero, or the word "best".</summary>
    PositiveOrBest,

    /// <summary>A text, possibly one of a list.</summary>
    Text,

    /// <summary>true or false.</summary>
    Flag,
}

/// <summary>Which way an input improves.</summary>
public enum BetterWhen
{
    /// <summary>Neither way, or it depends.</summary>
    NoDirection,

    /// <summary>Errors, times, losses.</summary>
    Smaller,

    /// <summary>Coherence, lifetimes, limits on parallel work.</summary>
    Larger,
}

/// <summary>A table of a scenario file with its keys; rows apply only for some values of its selecting key.</summary>
/// <param name="Path">Where it stands; a star stands for a name the user chooses ("machine.readout.*").</param>
/// <param name="Meaning">One sentence for the documentation.</param>
/// <param name="Keys">The keys, in the order of the documentation.</param>
/// <param name="SelectedBy">Key whose value selects this table among several of the same path ("kind"); null: none.</param>
/// <param name="SelectedWhen">That key's value for this table; null: none.</param>
public sealed record TableDefinition(
    string Path,
    string Meaning,
    ImmutableArray<KeyDefinition> Keys,
    string? SelectedBy = null,
    string? SelectedWhen = null)
{
    /// <summary>Where a key of this table stands, such as "machine.gates.cz_error"; for tables without a star.</summary>
    public string PathOf(KeyDefinition key) => Path.Length == 0 ? key.Name : $"{Path}.{key.Name}";

    /// <summary>The key of this name, or null.</summary>
    public KeyDefinition? Find(string name)
    {
        foreach (KeyDefinition key in Keys)
        {
            if (key.Name == name)
            {
                return key;
            }
        }

        return null;
    }
}
