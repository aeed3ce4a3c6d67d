using System.Text.Json;
using FtEstimate.Reports.Listings;
using FtEstimate.Workloads;

namespace FtEstimate.Reports.Json;

/// <summary>The figures of a workload.</summary>
internal static class WorkloadFigures
{
    /// <summary>One object.</summary>
    public static void Write(Utf8JsonWriter json, Workload workload)
    {
        json.WriteStartObject();
        json.WriteString("workload", workload.Name);
        json.WriteFigures(WorkloadCounts.Of(workload).AsSpan());
        json.WriteStartArray("derivations");
        if (!workload.Derivations.IsDefault)
        {
            foreach (Derivation derivation in workload.Derivations)
            {
                json.WriteStartObject();
                json.WriteString("quantity", derivation.Quantity);
                json.WriteString("formula", derivation.Formula);
                json.WriteFinite("value", derivation.Value);
                json.WriteString("source", derivation.Source);
                json.WriteEndObject();
            }
        }

        json.WriteEndArray();
        json.WriteStartArray("synthesis");
        foreach (SynthesisCost cost in SynthesisCost.Of(workload))
        {
            json.WriteStartObject();
            json.WriteString("method", cost.Method.Name);
            json.WriteFinite("rotation_error", cost.RotationError);
            json.WriteFinite("t_per_rotation", cost.TPerRotation);
            json.WriteFinite("t_states", cost.TStates);
            json.WriteEndObject();
        }

        json.WriteEndArray();
        json.WriteEndObject();
    }
}
