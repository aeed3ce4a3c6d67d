namespace FtEstimate.Files.Toml;

/// <summary>Where a node stands.</summary>
/// <param name="File">The file as it was named, or "--set".</param>
/// <param name="Line">Line, from 1; 0: none.</param>
/// <param name="Column">Column, from 1; 0: none.</param>
internal sealed record Place(string File, int Line, int Column);

/// <summary>A piece of a TOML document with its place.</summary>
/// <param name="place">Where it stands: the key, or the name in the header of a table.</param>
internal abstract class TomlNode(Place place)
{
    /// <summary>Where it stands.</summary>
    public Place Place { get; } = place;

    /// <summary>What it is, for messages: "the text "abc"".</summary>
    public abstract string Description { get; }
}

/// <summary>A text, number, flag, or a value of a kind that no key expects (a date).</summary>
internal sealed class TomlLeaf(Place place, string description) : TomlNode(place)
{
    /// <summary>The text, when it is one.</summary>
    public string? Text { get; init; }

    /// <summary>The number, when it is one; may be NaN or infinite.</summary>
    public double? Number { get; init; }

    /// <summary>The flag, when it is one.</summary>
    public bool? Flag { get; init; }

    /// <inheritdoc/>
    public override string Description { get; } = description;
}

/// <summary>Values in square brackets, or the tables of repeated headers.</summary>
internal sealed class TomlList(Place place, bool isOfTables) : TomlNode(place)
{
    /// <summary>Whether it grows by repeated headers.</summary>
    public bool IsOfTables { get; } = isOfTables;

    /// <summary>The items in their order.</summary>
    public List<TomlNode> Items { get; } = [];

    /// <inheritdoc/>
    public override string Description => IsOfTables ? "repeated tables" : "a list";
}

/// <summary>A table: keys and their nodes in the order of the file.</summary>
internal sealed class TomlSection(Place place, bool isClosed = false) : TomlNode(place)
{
    private readonly Dictionary<string, TomlNode> _nodes = new(StringComparer.Ordinal);
    private readonly List<string> _names = [];

    /// <summary>Whether it stands in braces, so that nothing may be added from outside.</summary>
    public bool IsClosed { get; } = isClosed;

    /// <summary>Whether its header was seen.</summary>
    public bool HasHeader { get; set; }

    /// <summary>The keys in the order of the file.</summary>
    public IReadOnlyList<string> Names => _names;

    /// <inheritdoc/>
    public override string Description => "a table";

    /// <summary>The node of a key, or null.</summary>
    public TomlNode? Find(string name) => _nodes.GetValueOrDefault(name);

    /// <summary>Adds a key, or replaces its node.</summary>
    public void Set(string name, TomlNode node)
    {
        if (!_nodes.ContainsKey(name))
        {
            _names.Add(name);
        }

        _nodes[name] = node;
    }

    /// <summary>Takes a key out.</summary>
    public void Remove(string name)
    {
        _names.Remove(name);
        _nodes.Remove(name);
    }
}
