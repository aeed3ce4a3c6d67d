using FtEstimate.Files;
using FtEstimate.Reports.Documents;
using FtEstimate.Reports.Writers;

namespace FtEstimate.Cli;

/// <summary>Writes a report to the places asked for; every file is complete or untouched.</summary>
internal static class ReportOutput
{
    /// <summary>Writes a report.</summary>
    /// <param name="document">The report.</param>
    /// <param name="figures">Gives the figures for scripts; asked only when they are wanted.</param>
    /// <param name="places">Where to.</param>
    /// <param name="output">Standard output.</param>
    /// <param name="error">Standard error.</param>
    /// <returns>Whether everything could be written.</returns>
    public static bool Write(
        ReportDocument document, Func<string> figures, OutputPlaces places, TextWriter output, TextWriter error)
    {
        var faults = new List<Fault>();
        if (places.Figures is { } figuresPath)
        {
            Keep(faults, AtomicFile.Write(figuresPath, figures()));
        }

        if (places.Page is { } pagePath)
        {
            Keep(faults, AtomicFile.Write(pagePath, HtmlWriter.Write(document)));
        }

        if (places.Markdown is { } markdownPath)
        {
            WriteMarkdown(document, markdownPath, faults);
        }
        else
        {
            output.Write(MarkdownWriter.Write(document));
        }

        FaultOutput.Write(faults, error);
        return faults.Count == 0;
    }

    private static void WriteMarkdown(ReportDocument document, string path, List<Fault> faults)
    {
        string folder = Path.GetDirectoryName(Path.GetFullPath(path)) ?? ".";
        string pictures = $"{Path.GetFileNameWithoutExtension(path)}-pictures";
        if (!document.Pictures.IsEmpty && !Keep(faults, AtomicFile.MakeFolder(Path.Combine(folder, pictures))))
        {
            return;
        }

        foreach (Picture picture in document.Pictures)
        {
            Keep(faults, AtomicFile.Write(Path.Combine(folder, pictures, picture.FileName), picture.Svg()));
        }

        if (faults.Count == 0)
        {
            Keep(faults, AtomicFile.Write(path, MarkdownWriter.Write(document, pictures)));
        }
    }

    private static bool Keep(List<Fault> faults, Fault? fault)
    {
        if (fault is not null)
        {
            faults.Add(fault);
        }

        return fault is null;
    }
}

/// <summary>Prints faults, one a line, and how many there are.</summary>
internal static class FaultOutput
{
    /// <summary>Prints them; nothing when there are none.</summary>
    public static void Write(IReadOnlyCollection<Fault> faults, TextWriter error)
    {
        foreach (Fault fault in faults)
        {
            error.WriteLine(fault.ToString());
        }
    }

    /// <summary>Prints faults found before anything was computed, and whether there are any.</summary>
    public static bool Stop(IReadOnlyCollection<Fault> faults, TextWriter error)
    {
        Write(faults, error);
        if (faults.Count > 1)
        {
            error.WriteLine(FormattableString.Invariant($"{faults.Count} faults; nothing was computed."));
        }

        return faults.Count > 0;
    }
}
