namespace FtEstimate.Scenarios;

/// <summary>Inputs as they were read, before it is known whether they make a scenario.</summary>
/// <param name="Inputs">The inputs that are right by themselves.</param>
/// <param name="Tables">Paths of the tables that stand in the files, empty ones too.</param>
/// <param name="Unreadable">Paths of keys, tables and whole files ("machine") with a fault of their own: nothing more is said about them.</param>
public sealed record ScenarioDraft(InputSet Inputs, IReadOnlySet<string> Tables, IReadOnlySet<string> Unreadable)
{
    /// <summary>A draft without faults, its tables being those that hold an input.</summary>
    public static ScenarioDraft Of(InputSet inputs)
    {
        HashSet<string> tables = new(StringComparer.Ordinal) { "" };
        foreach (Input input in inputs.InOrder)
        {
            for (int dot = input.Path.LastIndexOf('.'); dot > 0; dot = input.Path.LastIndexOf('.', dot - 1))
            {
                tables.Add(input.Path[..dot]);
            }
        }

        return new ScenarioDraft(inputs, tables, new HashSet<string>());
    }

    /// <summary>The number at a path, in the unit of its key; null: absent, or unreadable.</summary>
    public double? Number(string path) => Inputs.Find(path)?.Number;

    /// <summary>The text at a path; null: absent, or unreadable.</summary>
    public string? Text(string path) => Inputs.Find(path)?.Text;

    /// <summary>Whether an input stands at a path.</summary>
    public bool Gives(string path) => Inputs.Find(path) is not null;

    /// <summary>Whether nothing stands at a path, not even something unreadable.</summary>
    public bool Lacks(string path) => !Gives(path) && !IsUnreadable(path);

    /// <summary>Whether no table stands at a path, not even an unreadable one.</summary>
    public bool LacksTable(string path) => !Tables.Contains(path) && !IsUnreadable(path);

    /// <summary>Whether the path, or a table around it, has a fault of its own.</summary>
    public bool IsUnreadable(string path) => Covers(Unreadable, path);

    /// <summary>Whether a path, or a table around it, is among some paths.</summary>
    public static bool Covers(IReadOnlySet<string> paths, string path)
    {
        if (paths.Count == 0)
        {
            return false;
        }

        for (int end = path.Length; end > 0; end = path.LastIndexOf('.', end - 1))
        {
            if (paths.Contains(path[..end]))
            {
                return true;
            }
        }

        return false;
    }
}
