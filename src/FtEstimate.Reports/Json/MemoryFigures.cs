using System.Text.Json;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Reports.Json;

/// <summary>The figures of simulated memory experiments.</summary>
internal static class MemoryFigures
{
    /// <summary>One object; errors per round are those of one logical observable.</summary>
    public static void Write(Utf8JsonWriter json, MemoryResults results)
    {
        json.WriteStartObject();
        json.WriteString("title", results.Origin.Title);
        json.WriteString("decoder", Decoders.NameOf(results.Question.Decoder));
        json.WriteNumber("seed", results.Question.Seed);
        json.WriteNumber("shots_asked", results.Question.Shots);
        json.WriteBoolean("complete", results.IsWhole);
        json.WriteNumber("simulation_version", MemoryRun.Version);
        json.WriteString("law", results.Origin.LawName);
        json.WriteFinite("noise_strength_x", results.Origin.Strength.X);
        json.WriteFinite("noise_strength_z", results.Origin.Strength.Z);
        WriteExperiments(json, results);
        WriteDistances(json, results);
        WriteSuppression(json, results);
        json.WriteEndObject();
    }

    private static void WriteExperiments(Utf8JsonWriter json, MemoryResults results)
    {
        json.WriteStartArray("experiments");
        foreach (ExperimentResult experiment in results.Experiments)
        {
            json.WriteStartObject();
            json.WriteNumber("distance", experiment.Setting.Distance);
            json.WriteNumber("rounds", experiment.Setting.Rounds);
            json.WriteString("basis", experiment.Setting.Basis == PauliBasis.X ? "x" : "z");
            json.WriteNumber("shots", experiment.Count.Shots);
            json.WriteNumber("failures", experiment.Count.Failures);
            json.WriteFinite("per_shot", experiment.PerShot?.Value);
            json.WriteFinite("low", experiment.PerShot?.Low);
            json.WriteFinite("high", experiment.PerShot?.High);
            json.WriteFinite("per_round", experiment.PerRound?.Value);
            json.WriteFinite("per_round_low", experiment.PerRound?.Low);
            json.WriteFinite("per_round_high", experiment.PerRound?.High);
            json.WriteFinite("law_per_round", experiment.LawPerRound);
            json.WriteFinite("seconds", experiment.Seconds);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static void WriteDistances(Utf8JsonWriter json, MemoryResults results)
    {
        json.WriteStartArray("distances");
        foreach (DistanceResult distance in results.Distances)
        {
            json.WriteStartObject();
            json.WriteNumber("distance", distance.Distance);
            json.WriteFinite("per_round", distance.Measured?.Value);
            json.WriteFinite("error", distance.Measured?.Error);
            json.WriteFinite("law", distance.Law);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static void WriteSuppression(Utf8JsonWriter json, MemoryResults results)
    {
        json.WriteStartArray("suppression");
        foreach (SuppressionResult step in results.Suppression)
        {
            json.WriteStartObject();
            json.WriteNumber("from", step.From);
            json.WriteNumber("to", step.To);
            json.WriteFinite("measured", step.Measured?.Value);
            json.WriteFinite("error", step.Measured?.Error);
            json.WriteFinite("law", step.Law);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }
}
