using System.Collections.Immutable;
using FtEstimate.Files.Toml;
using FtEstimate.Scenarios;
using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Files.Scenarios;

/// <summary>Reads scenario files, with the machine and workload files they name.</summary>
public static class ScenarioReader
{
    private static readonly string[] Parts = [MachineKeys.Top.Path, WorkloadKeys.Top.Path];

    /// <summary>Reads a scenario. Never throws for what the files or settings hold.</summary>
    /// <param name="path">The scenario file.</param>
    /// <param name="settings">Settings "key=value" that replace what the files say; a path of a file counts from the scenario file.</param>
    public static ScenarioReading Read(string path, IReadOnlyList<string> settings)
    {
        Findings findings = new();
        if (Load(path, InputText.Read(path), "", findings) is TomlSection root)
        {
            List<Setting> left = ApplyReferences(root, ReadSettings(settings, findings), findings);
            foreach (string part in Parts)
            {
                Follow(root, part, path, findings);
            }

            Apply(root, left, findings);
            SilenceWhatMayBeUnread(root, path, findings);
            InputCollector.Collect(root, "", findings);
            foreach (SenseFault fault in PhysicalSense.Check(findings.Draft))
            {
                findings.AddFaultNear(fault.Path, fault.Message);
            }
        }

        Scenario? scenario = findings.IsFaultless ? ScenarioBinder.Bind(findings.Draft.Inputs) : null;
        return new ScenarioReading(scenario, findings.SortedFaults(), [.. findings.Files]);
    }

    /// <summary>Reads a workload file by itself. Never throws for what the file or settings hold.</summary>
    /// <param name="path">The workload file.</param>
    /// <param name="settings">Settings "workload.key=value" that replace what the file says.</param>
    public static WorkloadReading ReadWorkload(string path, IReadOnlyList<string> settings)
    {
        string part = WorkloadKeys.Top.Path;
        Findings findings = new();
        if (Load(path, InputText.Read(path), part, findings) is TomlSection workload)
        {
            TomlSection root = new(workload.Place);
            root.Set(part, workload);
            Apply(root, ReadSettings(settings, findings), findings);
            foreach (string name in root.Names)
            {
                if (name != part)
                {
                    findings.AddFault(root.Find(name)!.Place, name, "a workload file has only keys below workload");
                }
            }

            InputCollector.Collect(workload, part, findings);
            foreach (SenseFault fault in PhysicalSense.CheckWorkload(findings.Draft))
            {
                findings.AddFaultNear(fault.Path, fault.Message);
            }
        }

        return new WorkloadReading(
            findings.IsFaultless ? WorkloadBinder.Bind(findings.Draft.Inputs) : null,
            findings.SortedFaults());
    }

    private static TomlSection? Load(string path, InputText content, string part, Findings findings)
    {
        findings.AddFile(path);
        if (content.Text is null)
        {
            findings.AddFault(new Place(path, content.Line, content.Line > 0 ? 1 : 0), part, content.Problem ?? "unreadable");
            return null;
        }

        List<Fault> faults = [];
        TomlSection section = TomlGrammar.Read(path, content.Text, faults);
        findings.AddSyntaxFaults(path, faults);
        if (faults.Count > 0 && part.Length > 0)
        {
            findings.Silence(part);
        }

        return section;
    }

    // in a file with faults of syntax, what seems to be missing may stand in a line that could not be read
    private static void SilenceWhatMayBeUnread(TomlSection root, string path, Findings findings)
    {
        if (!findings.IsBroken(path))
        {
            return;
        }

        foreach (string name in ScenarioKeys.TopNames)
        {
            if (root.Find(name) is not TomlNode node || node.Place.File == path)
            {
                findings.Silence(name);
            }
        }
    }

    private static List<Setting> ReadSettings(IReadOnlyList<string> settings, Findings findings)
    {
        List<Setting> read = [];
        foreach (string text in settings)
        {
            if (Setting.Read(text, out Fault? fault) is Setting setting)
            {
                read.Add(setting);
            }
            else if (fault is not null)
            {
                findings.AddFault(new Place(fault.File, 0, 0), fault.Key, fault.Message);
            }
        }

        return read;
    }

    // another machine or workload file goes in first, then settings inside it
    private static List<Setting> ApplyReferences(TomlSection root, List<Setting> settings, Findings findings)
    {
        Apply(root, settings.FindAll(setting => Parts.Contains(setting.Path)), findings);
        return settings.FindAll(setting => !Parts.Contains(setting.Path));
    }

    private static void Apply(TomlSection root, List<Setting> settings, Findings findings)
    {
        foreach (Setting setting in settings)
        {
            if (setting.ApplyTo(root) is Fault fault)
            {
                findings.AddFault(new Place(fault.File, 0, 0), fault.Key, fault.Message);
            }
        }
    }

    private static void Follow(TomlSection root, string part, string scenarioPath, Findings findings)
    {
        if (root.Find(part) is not TomlNode reference || reference is TomlSection)
        {
            return;
        }

        // whatever comes of it, the key itself is not looked at again
        root.Set(part, new TomlSection(reference.Place));
        if ((reference as TomlLeaf)?.Text is not string named || string.IsNullOrWhiteSpace(named))
        {
            findings.AddFault(reference.Place, part, $"expected the path of a file in quotes, or a table, found {reference.Description}");
            return;
        }

        string path = Path.Combine(Path.GetDirectoryName(scenarioPath) ?? "", named);
        if (IsAmong(findings.Files, path))
        {
            findings.AddFault(reference.Place, part, $"{named} names a file that is already read here; expected a file of its own for the {part}");
            return;
        }

        InputText content = InputText.Read(path);
        if (content.Text is null && content.Line == 0)
        {
            findings.AddFault(reference.Place, part, $"{path}: {content.Problem}");
            return;
        }

        if (Load(path, content, part, findings) is TomlSection section)
        {
            root.Set(part, section);
            RefuseReferences(section, part, findings);
        }
    }

    // a part that names parts of its own would go round in circles
    private static void RefuseReferences(TomlSection section, string part, Findings findings)
    {
        foreach (string inner in Parts)
        {
            if (section.Find(inner) is TomlNode node)
            {
                findings.AddFault(node.Place, $"{part}.{inner}", $"only a scenario names a {inner}; this is the file of a {part}");
                section.Remove(inner);
            }
        }
    }

    private static bool IsAmong(IReadOnlyList<string> files, string path)
    {
        try
        {
            string full = Path.GetFullPath(path);
            foreach (string file in files)
            {
                if (Path.GetFullPath(file) == full)
                {
                    return true;
                }
            }

            return false;
        }
        catch (ArgumentException)
        {
            // no file name at all: reading it will say so
            return false;
        }
    }
}
