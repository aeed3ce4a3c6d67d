using System.Collections.Immutable;
using System.Text.Json;
using FtEstimate.MagicStates;
using FtEstimate.Reports.Listings;

namespace FtEstimate.Reports.Json;

/// <summary>The figures of a catalogue of factories.</summary>
internal static class CatalogueFigures
{
    /// <summary>One object.</summary>
    public static void Write(Utf8JsonWriter json, FactoryQuestion question, ImmutableArray<CatalogueEntry> entries)
    {
        json.WriteStartObject();
        json.WriteString("law", question.LawName);
        json.WriteFinite("noise_strength_x", question.Strength.X);
        json.WriteFinite("noise_strength_z", question.Strength.Z);
        json.WriteFinite("injected_error", question.InjectedError);
        json.WriteStartArray("factories");
        foreach (CatalogueEntry entry in entries)
        {
            Factory factory = entry.Factory;
            json.WriteStartObject();
            json.WriteString("name", factory.Name);
            json.WriteNumber("atoms", factory.Atoms);
            json.WriteFinite("rounds_per_output", factory.RoundsPerOutput);
            json.WriteFinite("rounds_per_batch", factory.RoundsPerBatch);
            json.WriteNumber("outputs", factory.Outputs);
            json.WriteFinite("output_error", factory.OutputError);
            json.WriteFinite("accepted", factory.Acceptance);
            json.WriteNumber("dx", factory.DX);
            json.WriteNumber("dz", factory.DZ);
            json.WriteNumber("dm", factory.DM);
            json.WriteBoolean("unbeaten", !entry.Dominated);
            json.WriteEndObject();
        }

        json.WriteEndArray();
        json.WriteEndObject();
    }
}
