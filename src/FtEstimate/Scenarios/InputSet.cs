using System.Collections.Immutable;

namespace FtEstimate.Scenarios;

/// <summary>One given input: a number with an optional range, a text, or a yes/no. Numbers are in the unit its key names.</summary>
/// <param name="Path">Where it stands, such as "machine.gates.cz_error".</param>
/// <param name="Number">The likely value, when it is a number.</param>
/// <param name="Text">The text, when it is one ("best" included).</param>
/// <param name="Flag">The yes/no, when it is one.</param>
/// <param name="Low">10th percentile of the range; null: none stated.</param>
/// <param name="High">90th percentile of the range; null: none stated.</param>
/// <param name="Source">Where the value comes from; null: assumed.</param>
public sealed record Input(
    string Path,
    double? Number = null,
    string? Text = null,
    bool? Flag = null,
    double? Low = null,
    double? High = null,
    string? Source = null);

/// <summary>Every input of a scenario by its path; changing one and binding again gives another scenario.</summary>
public sealed class InputSet
{
    private readonly ImmutableDictionary<string, Input> _byPath;

    /// <summary>Collects inputs; a path stands once.</summary>
    /// <param name="inputs">The inputs, in the order of the files.</param>
    public InputSet(IEnumerable<Input> inputs)
    {
        InOrder = [.. inputs];
        _byPath = InOrder.ToImmutableDictionary(input => input.Path, StringComparer.Ordinal);
    }

    /// <summary>The inputs in the order of the files.</summary>
    public ImmutableArray<Input> InOrder { get; }

    /// <summary>The input at a path, or null.</summary>
    public Input? Find(string path) => _byPath.GetValueOrDefault(path);

    /// <summary>The same inputs with one number replaced; its range and source are dropped.</summary>
    public InputSet With(string path, double value) =>
        new(InOrder.Where(input => input.Path != path).Append(new Input(path, value)));
}
