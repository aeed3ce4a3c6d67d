namespace FtEstimate.Files.Toml;

/// <summary>One part of a dotted key or header.</summary>
/// <param name="Name">The name.</param>
/// <param name="Place">Where it stands.</param>
internal sealed record TomlKeyPart(string Name, Place Place);

/// <summary>Puts keys and tables where they belong, and reports what stands twice.</summary>
/// <param name="file">Name of the file, for faults.</param>
/// <param name="faults">Receives the faults.</param>
internal sealed class TomlTree(string file, List<Fault> faults)
{
    /// <summary>The whole document.</summary>
    public TomlSection Root { get; } = new(new Place(file, 1, 1)) { HasHeader = true };

    /// <summary>Opens the table of a header.</summary>
    /// <param name="parts">The name in the header.</param>
    /// <param name="isRepeated">Whether the header is in double brackets.</param>
    /// <returns>The table, or null when something else stands there.</returns>
    public TomlSection? Open(List<TomlKeyPart> parts, bool isRepeated)
    {
        if (Descend(Root, parts) is not TomlSection parent)
        {
            return null;
        }

        TomlKeyPart part = parts[^1];
        TomlNode? existing = parent.Find(part.Name);
        return isRepeated ? OpenNext(parent, part, existing) : OpenOnly(parent, part, existing);
    }

    /// <summary>Adds a value, unless its key is taken.</summary>
    public void Add(TomlSection target, List<TomlKeyPart> parts, TomlNode value)
    {
        TomlKeyPart last = parts[^1];
        if (Descend(target, parts) is not TomlSection section)
        {
            return;
        }

        if (section.Find(last.Name) is TomlNode existing)
        {
            Report(last, $"duplicate key: {last.Name} stands already on line {existing.Place.Line}");
        }
        else
        {
            section.Set(last.Name, value);
        }
    }

    private TomlSection? OpenNext(TomlSection parent, TomlKeyPart part, TomlNode? existing)
    {
        if (existing is not (null or TomlList { IsOfTables: true }))
        {
            Report(part, $"{part.Name} stands already on line {existing.Place.Line}");
            return null;
        }

        TomlList list = existing as TomlList ?? new TomlList(part.Place, isOfTables: true);
        parent.Set(part.Name, list);
        TomlSection section = new(part.Place) { HasHeader = true };
        list.Items.Add(section);
        return section;
    }

    private TomlSection? OpenOnly(TomlSection parent, TomlKeyPart part, TomlNode? existing)
    {
        if (existing is TomlSection { IsClosed: false } section)
        {
            if (section.HasHeader)
            {
                Report(part, $"the table {part.Name} stands already on line {section.Place.Line}");
            }

            section.HasHeader = true;
            return section;
        }

        if (existing is not null)
        {
            Report(part, $"{part.Name} stands already on line {existing.Place.Line}");
            return null;
        }

        TomlSection added = new(part.Place) { HasHeader = true };
        parent.Set(part.Name, added);
        return added;
    }

    private TomlSection? Descend(TomlSection from, List<TomlKeyPart> parts)
    {
        TomlSection section = from;
        for (int i = 0; i < parts.Count - 1; i++)
        {
            TomlKeyPart part = parts[i];
            TomlNode? node = section.Find(part.Name);
            if (node is TomlList { IsOfTables: true } list)
            {
                node = list.Items[^1];
            }

            if (node is null)
            {
                node = new TomlSection(part.Place);
                section.Set(part.Name, node);
            }

            if (node is not TomlSection { IsClosed: false } next)
            {
                Report(part, $"{part.Name} stands already on line {node.Place.Line} as {node.Description}; nothing can be added to it here");
                return null;
            }

            section = next;
        }

        return section;
    }

    private void Report(TomlKeyPart part, string message) =>
        faults.Add(new Fault(file, part.Place.Line, part.Place.Column, part.Name, message));
}
