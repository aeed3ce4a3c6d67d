namespace FtEstimate.Scenarios;

/// <summary>The inputs of one table, read by their definitions and turned into SI units. Trusts that the inputs were checked.</summary>
/// <param name="inputs">All inputs.</param>
/// <param name="path">The table, such as "machine.gates".</param>
internal readonly struct TableInputs(InputSet inputs, string path)
{
    /// <summary>Whether the key is given.</summary>
    public bool Gives(KeyDefinition key) => Find(key) is not null;

    /// <summary>The number in SI units; the default when absent.</summary>
    /// <exception cref="InvalidOperationException">Neither given nor defaulted: the inputs were not checked.</exception>
    public double Number(KeyDefinition key) =>
        NumberOrNull(key) ?? throw new InvalidOperationException($"{path}.{key.Name} is needed and not given");

    /// <summary>The number in SI units; the default when absent, null without one.</summary>
    public double? NumberOrNull(KeyDefinition key) => (Find(key)?.Number ?? key.Default) is double value ? key.InSi(value) : null;

    /// <summary>The number in SI units; another value when absent.</summary>
    public double NumberOr(KeyDefinition key, double otherwise) => NumberOrNull(key) ?? otherwise;

    /// <summary>The whole number; the default when absent.</summary>
    public int Whole(KeyDefinition key) => (int)Number(key);

    /// <summary>The text; the default when absent.</summary>
    /// <exception cref="InvalidOperationException">Neither given nor defaulted: the inputs were not checked.</exception>
    public string Text(KeyDefinition key) =>
        TextOrNull(key) ?? throw new InvalidOperationException($"{path}.{key.Name} is needed and not given");

    /// <summary>The text; the default when absent, null without one.</summary>
    public string? TextOrNull(KeyDefinition key) => Find(key)?.Text ?? key.DefaultText;

    /// <summary>The yes/no; another value when absent.</summary>
    public bool FlagOr(KeyDefinition key, bool otherwise) => Find(key)?.Flag ?? otherwise;

    private Input? Find(KeyDefinition key) => inputs.Find(path.Length == 0 ? key.Name : $"{path}.{key.Name}");
}
