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

/// <summary>Every input of a scenario by its path; changing some and binding again gives another scenario.</summary>
public sealed class InputSet
{
    private readonly Dictionary<string, Input> _byPath;

    /// <summary>Collects inputs; a path stands once.</summary>
    /// <param name="inputs">The inputs, in the order of the files.</param>
    /// <exception cref="ArgumentException">A path stands twice.</exception>
    public InputSet(IEnumerable<Input> inputs)
    {
        InOrder = [.. inputs];
        _byPath = new Dictionary<string, Input>(InOrder.Length, StringComparer.Ordinal);
        foreach (Input input in InOrder)
        {
            _byPath.Add(input.Path, input);
        }
    }

    /// <summary>The inputs in the order of the files.</summary>
    public ImmutableArray<Input> InOrder { get; }

    /// <summary>The input at a path, or null.</summary>
    public Input? Find(string path) => _byPath.GetValueOrDefault(path);

    /// <summary>The same inputs with one number replaced, or added; its range and source are dropped.</summary>
    /// <param name="path">Where the number stands.</param>
    /// <param name="value">The number, in the unit of its key.</param>
    public InputSet With(string path, double value) => With([KeyValuePair.Create(path, value)]);

    /// <summary>The same inputs with several numbers replaced, or added; their ranges and sources are dropped.</summary>
    /// <param name="numbers">Paths and numbers, in the units of their keys.</param>
    public InputSet With(IReadOnlyCollection<KeyValuePair<string, double>> numbers)
    {
        Dictionary<string, double> left = new(numbers, StringComparer.Ordinal);
        ImmutableArray<Input>.Builder changed = ImmutableArray.CreateBuilder<Input>(InOrder.Length + left.Count);
        foreach (Input input in InOrder)
        {
            changed.Add(left.Remove(input.Path, out double value) ? new Input(input.Path, value) : input);
        }

        foreach ((string path, double value) in left)
        {
            changed.Add(new Input(path, value));
        }

        return new InputSet(changed);
    }
}
