using System.Collections.Immutable;
using FtEstimate.Files;

namespace FtEstimate.Cli;

/// <summary>Where a report goes.</summary>
/// <param name="Markdown">File of the Markdown; null: standard output.</param>
/// <param name="Page">File of the page; null: none.</param>
/// <param name="Figures">File of the figures; null: none.</param>
/// <param name="Counts">File of the counts of a simulation; null: none.</param>
internal sealed record OutputPlaces(string? Markdown, string? Page, string? Figures, string? Counts = null)
{
    /// <summary>What is wrong with the places, found before anything is computed or written.</summary>
    /// <param name="inputs">The files that were read: no output replaces them.</param>
    public ImmutableArray<Fault> Faults(IEnumerable<string> inputs)
    {
        var faults = ImmutableArray.CreateBuilder<Fault>();
        HashSet<string> inputPaths = [.. inputs.Where(AtomicFile.IsFileName).Select(Path.GetFullPath)];
        HashSet<string> outputPaths = [];
        foreach (string path in new[] { Counts, Markdown, Page, Figures }.OfType<string>())
        {
            if (AtomicFile.FaultOfPlace(path) is { } fault)
            {
                faults.Add(fault);
            }
            else if (inputPaths.Contains(Path.GetFullPath(path)))
            {
                faults.Add(new Fault(path, 0, 0, "", "cannot be written: it is an input of this report"));
            }
            else if (!outputPaths.Add(Path.GetFullPath(path)) && !AtomicFile.IsDevice(path))
            {
                faults.Add(new Fault(path, 0, 0, "", "cannot be written twice: each output needs a file of its own"));
            }
        }

        return faults.ToImmutable();
    }
}
