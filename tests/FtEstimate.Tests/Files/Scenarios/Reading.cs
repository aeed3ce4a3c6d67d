using FtEstimate.Files;
using FtEstimate.Files.Scenarios;

namespace FtEstimate.Tests.Files.Scenarios;

/// <summary>Reads the sample files with something changed in them.</summary>
internal static class Reading
{
    /// <summary>Reads the three sample files, or others in their place.</summary>
    public static ScenarioReading Of(
        string scenario = SampleFiles.Scenario,
        string machine = SampleFiles.Machine,
        string workload = SampleFiles.Workload,
        params string[] settings)
    {
        using TemporaryFolder folder = new();
        folder.Write("machines/brindle-fell.toml", machine);
        folder.Write("workloads/spin-lattice.toml", workload);
        ScenarioReading reading = ScenarioReader.Read(folder.Write("s.toml", scenario), settings);
        string root = folder.Root + Path.DirectorySeparatorChar;
        return reading with
        {
            Faults = [.. reading.Faults.Select(fault => new Fault(
                Short(fault.File, root), fault.Line, fault.Column, fault.Key, Short(fault.Message, root)))],
            Files = [.. reading.Files.Select(file => Short(file, root))],
        };
    }

    /// <summary>The faults of the sample machine with one piece of text replaced.</summary>
    public static string[] FaultsOfMachine(string old, string changed, params string[] settings) =>
        Faults(Of(machine: Changed(SampleFiles.Machine, old, changed), settings: settings));

    /// <summary>The faults, one line each.</summary>
    public static string[] Faults(ScenarioReading reading) => [.. reading.Faults.Select(fault => fault.ToString())];

    /// <summary>A text with one piece replaced, which must be in it once.</summary>
    public static string Changed(string text, string old, string changed)
    {
        Assert.Equal(2, text.Split(old).Length);
        return text.Replace(old, changed, StringComparison.Ordinal);
    }

    private static string Short(string text, string root) =>
        text.Replace(root, "", StringComparison.Ordinal).Replace('\\', '/');
}
