using System.Text.Json;
using FtEstimate.Cycles;
using FtEstimate.Noise;
using FtEstimate.Reports.Estimate;
using FtEstimate.Reports.Figures;
using FtEstimate.Sizing;

namespace FtEstimate.Reports.Json;

/// <summary>The figures of an estimate.</summary>
internal static class EstimateFigures
{
    /// <summary>One object.</summary>
    public static void Write(Utf8JsonWriter json, SizingResult result)
    {
        Subject subject = new(result);
        json.WriteStartObject();
        json.WriteString("scenario", result.Space.Scenario.Title);
        WriteAnswer(json, "answer", result.Space, result.Best);
        if (result.NoAnswer is { } none)
        {
            WriteNoAnswer(json, result.Space, none);
        }

        WriteCycle(json, subject.Cycle);
        WriteErrors(json, subject.Cycle.Ledger);
        WriteMachine(json, subject);
        WriteOthers(json, result);
        json.WriteNull("range");
        json.WriteEndObject();
    }

    private static void WriteAnswer(Utf8JsonWriter json, string name, SearchSpace space, SizedMachine? machine)
    {
        if (machine is null)
        {
            json.WriteNull(name);
            return;
        }

        json.WriteStartObject(name);
        json.WriteFigures(AnswerFigures.Of(space, machine).AsSpan());
        json.WriteNumber("suppression_from", machine.Suppression.FromDistance);
        json.WriteNumber("suppression_to", machine.Suppression.ToDistance);
        json.WriteBoolean("finishes_in_practice", machine.Elapsed.FinishesInPractice);
        json.WriteEndObject();
    }

    private static void WriteNoAnswer(Utf8JsonWriter json, SearchSpace space, NoAnswer none)
    {
        json.WriteString("why", NoAnswerSentence.Of(space, none));
        json.WriteFinite("noise_strength", none.Strength);
        json.WriteFinite("noise_strength_needed", none.StrengthNeeded);
        json.WriteStartArray("limits");
        foreach (LimitInTheWay limit in none.Limits)
        {
            json.WriteStartObject();
            json.WriteString("limit", NoAnswerSentence.KeyOf(limit.Resource));
            json.WriteFinite("allowed", limit.Allowed);
            json.WriteFinite("needed", limit.Enough);
            json.WriteEndObject();
        }

        json.WriteEndArray();
        json.WriteStartArray("blame");
        foreach (BlamedChannel cause in none.Blame)
        {
            json.WriteStartObject();
            json.WriteString("channel", cause.Channel);
            json.WriteFinite("share", cause.Share);
            json.WriteFinite("today", cause.PerLocation);
            json.WriteFinite("needed", cause.NeededPerLocation);
            json.WriteEndObject();
        }

        json.WriteEndArray();
        WriteAnswer(json, "closest", space, none.Closest);
    }

    private static void WriteCycle(Utf8JsonWriter json, CycleView cycle)
    {
        json.WriteStartArray("cycle");
        foreach (CyclePhase phase in cycle.Phases)
        {
            json.WriteStartObject();
            json.WriteString("phase", phase.Name);
            json.WriteString("part", Words.Part(phase.Part));
            json.WriteFinite("start_s", phase.StartSeconds);
            json.WriteFinite("duration_s", phase.Seconds);
            json.WriteFinite("groups", phase.Goes);
            json.WriteBoolean("beside", phase.Data == DataState.Beside);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static void WriteErrors(Utf8JsonWriter json, ErrorLedger ledger)
    {
        json.WriteStartArray("errors");
        foreach (ErrorChannel channel in ledger.Channels)
        {
            json.WriteStartObject();
            json.WriteString("channel", channel.Name);
            json.WriteFinite("per_location", channel.PerLocation);
            json.WriteFinite("times_per_round", channel.TimesPerRound);
            json.WriteFinite("per_round", channel.PerRound);
            json.WriteFinite("share", ledger.Share(channel));
            json.WriteFinite("strength_x", channel.Strength.X);
            json.WriteFinite("strength_z", channel.Strength.Z);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static void WriteMachine(Utf8JsonWriter json, Subject subject)
    {
        if (subject.Machine is not { } machine)
        {
            json.WriteNull("failure");
            json.WriteNull("atoms");
            json.WriteNull("clock");
            json.WriteNull("factory");
            return;
        }

        json.WriteStartObject("failure");
        json.WriteFinite("patches", machine.Failure.Patches);
        json.WriteFinite("magic_states", machine.Failure.MagicStates);
        json.WriteFinite("rotations", machine.Failure.Synthesis);
        json.WriteFinite("logical_error_per_round", machine.LogicalErrorPerRound);
        json.WriteEndObject();
        json.WriteStartObject("atoms");
        json.WriteFigure(new Figure(AtomFigures.Total, machine.Atoms.Total));
        json.WriteFigures(AtomFigures.Ledger(subject.Space, machine).AsSpan());
        json.WriteFigures(AtomFigures.Optics(machine.Optics).AsSpan());
        json.WriteEndObject();
        json.WriteStartObject("clock");
        json.WriteFigures(ClockFigures.Steps(machine).AsSpan());
        json.WriteFigures(ClockFigures.Limits(machine.Clock).AsSpan());
        json.WriteFigures(ClockFigures.WallClock(subject.Space, machine).AsSpan());
        json.WriteEndObject();
        WriteFactory(json, subject, machine);
    }

    private static void WriteFactory(Utf8JsonWriter json, Subject subject, SizedMachine machine)
    {
        if (machine.Factory is not { } factory)
        {
            json.WriteNull("factory");
            return;
        }

        json.WriteStartObject("factory");
        json.WriteFigures(FactoryFigures.Of(subject.Space, machine, factory).AsSpan());
        json.WriteEndObject();
    }

    private static void WriteOthers(Utf8JsonWriter json, SizingResult result)
    {
        json.WriteStartArray("other_machines");
        foreach (SizedMachine machine in result.Unbeaten)
        {
            json.WriteStartObject();
            json.WriteFinite("atoms", machine.Atoms.Total);
            json.WriteFinite("run_s", machine.RunSeconds);
            json.WriteFinite("elapsed_s", machine.Elapsed.Seconds);
            json.WriteString("style", Words.Style(machine.Layout));
            json.WriteNumber("code_distance", machine.Distance);
            json.WriteString("factory", machine.Factory?.Name);
            json.WriteNumber("factory_count", machine.FactoryCount);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }
}
