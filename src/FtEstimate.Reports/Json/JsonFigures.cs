using System.Buffers;
using System.Collections.Immutable;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using FtEstimate.MagicStates;
using FtEstimate.Reports.Listings;
using FtEstimate.Simulation.Memory;
using FtEstimate.Sizing;
using FtEstimate.Workloads;

namespace FtEstimate.Reports.Json;

/// <summary>The figures of a report as JSON for scripts: SI units, never NaN or infinite.</summary>
public static class JsonFigures
{
    private static readonly JsonWriterOptions Options = new()
    {
        Indented = true,
        NewLine = "\n",

        // the text goes into files for programs, not into web pages
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
    };

    /// <summary>Of an estimate.</summary>
    public static string Of(SizingResult result) => Written(json => EstimateFigures.Write(json, result));

    /// <summary>Of a workload.</summary>
    public static string Of(Workload workload) => Written(json => WorkloadFigures.Write(json, workload));

    /// <summary>Of a catalogue of factories.</summary>
    public static string Of(FactoryQuestion question, ImmutableArray<CatalogueEntry> entries) =>
        Written(json => CatalogueFigures.Write(json, question, entries));

    /// <summary>Of simulated memory experiments.</summary>
    public static string Of(MemoryResults results) => Written(json => MemoryFigures.Write(json, results));

    private static string Written(Action<Utf8JsonWriter> write)
    {
        var buffer = new ArrayBufferWriter<byte>(16_384);
        using (var json = new Utf8JsonWriter(buffer, Options))
        {
            write(json);
        }

        return Encoding.UTF8.GetString(buffer.WrittenSpan) + "\n";
    }
}
