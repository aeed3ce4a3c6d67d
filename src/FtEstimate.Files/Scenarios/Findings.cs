using System.Collections.Immutable;
using FtEstimate.Files.Toml;
using FtEstimate.Scenarios;

namespace FtEstimate.Files.Scenarios;

/// <summary>What reading has found so far: inputs, where everything stands, and faults.</summary>
internal sealed class Findings
{
    // a file with more is no input file, and nobody reads on
    private const int MostFaults = 200;

    private readonly List<string> _files = [];
    private readonly List<Fault> _faults = [];
    private readonly List<Input> _inputs = [];
    private readonly Dictionary<string, Place> _places = new(StringComparer.Ordinal);
    private readonly HashSet<string> _tables = new(StringComparer.Ordinal);
    private readonly HashSet<string> _unreadable = new(StringComparer.Ordinal);
    private readonly HashSet<string> _brokenFiles = new(StringComparer.Ordinal);

    /// <summary>The files, in the order they were opened.</summary>
    public IReadOnlyList<string> Files => _files;

    /// <summary>Whether nothing is wrong so far.</summary>
    public bool IsFaultless => _faults.Count == 0;

    /// <summary>Whether further faults are left out.</summary>
    public bool IsFull => _faults.Count >= MostFaults;

    /// <summary>Inputs, tables, and what not to complain about twice.</summary>
    public ScenarioDraft Draft => new(new InputSet(_inputs), _tables, _unreadable);

    /// <summary>Notes a file that is opened.</summary>
    public void AddFile(string file) => _files.Add(file);

    /// <summary>Notes an input that is right by itself.</summary>
    public void AddInput(Input input, Place place)
    {
        _inputs.Add(input);
        _places[input.Path] = place;
    }

    /// <summary>Notes a table that stands in a file.</summary>
    public void AddTable(string path, Place place)
    {
        _tables.Add(path);
        _places[path] = place;
    }

    /// <summary>Notes a fault; nothing more will be said about that key or table.</summary>
    public void AddFault(Place place, string path, string message)
    {
        _unreadable.Add(path);
        if (_faults.Count < MostFaults)
        {
            _faults.Add(new Fault(place.File, place.Line, place.Column, path, message));
        }
    }

    /// <summary>Notes faults of syntax: keys may seem to be missing because they could not be read.</summary>
    public void AddSyntaxFaults(string file, IReadOnlyList<Fault> faults)
    {
        if (faults.Count > 0)
        {
            _faults.AddRange(faults);
            _brokenFiles.Add(file);
        }
    }

    /// <summary>Whether a file has faults of syntax.</summary>
    public bool IsBroken(string file) => _brokenFiles.Contains(file);

    /// <summary>Says nothing more about a key or table.</summary>
    public void Silence(string path) => _unreadable.Add(path);

    /// <summary>Whether nothing more is said about a key or table.</summary>
    public bool IsSilenced(string path) => ScenarioDraft.Covers(_unreadable, path);

    /// <summary>Notes a fault of something that is missing or contradicts something else, at the nearest place there is.</summary>
    public void AddFaultNear(string path, string message)
    {
        string around = path;
        Place? place;
        while (!_places.TryGetValue(around, out place) && around.Length > 0)
        {
            around = around[..Math.Max(0, around.LastIndexOf('.'))];
        }

        AddFault(place ?? new Place(_files[0], 0, 0), path, message);
    }

    /// <summary>Notes a missing key, unless it may be among what could not be read.</summary>
    public void AddMissing(Place table, string path, KeyDefinition key)
    {
        if (!IsBroken(table.File) && !IsSilenced(path))
        {
            AddFault(table, path, $"missing key; expected {Expectation.Of(key)} ({key.Meaning})");
        }
    }

    /// <summary>All faults by file and place.</summary>
    public ImmutableArray<Fault> SortedFaults() => _faults.Count == 0
        ? []
        : [.. _faults.OrderBy(fault => Order(fault.File)).ThenBy(fault => fault.Line).ThenBy(fault => fault.Column)];

    // settings come after all files
    private int Order(string file) => _files.IndexOf(file) is int index and >= 0 ? index : int.MaxValue;
}
