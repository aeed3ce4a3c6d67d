using System.Collections.Immutable;
using FtEstimate.Scenarios.Keys;

namespace FtEstimate.Scenarios.Sense;

/// <summary>Readout schemes and their detection.</summary>
internal static class ReadoutRules
{
    private static readonly string Use = ReadoutKeys.Readout.PathOf(ReadoutKeys.Use);
    private static readonly string ReachKind = ReachKeys.MovedAtoms.PathOf(ReachKeys.Kind);
    private static readonly string Detection = DetectionKeys.Detection.Path;

    private static readonly ImmutableArray<KeyDefinition> NeededForCounting =
    [
        DetectionKeys.Signal, DetectionKeys.Background, DetectionKeys.Depump, DetectionKeys.Loss,
    ];

    public static void Check(ScenarioDraft draft, List<SenseFault> faults)
    {
        if (!draft.Tables.Contains(ReadoutKeys.Path))
        {
            return;
        }

        InUse(draft, faults);
        OneWayOfDetection(draft, Detection, faults);
        List<SenseFault> lacking = [];
        foreach (string scheme in draft.SchemeTables())
        {
            OneWayOfDetection(draft, scheme, faults);
            CompleteDetection(draft, scheme, lacking);
            switch (draft.KindOf(scheme))
            {
                case "shelved":
                    ArrayRules.Decay(draft, $"{scheme}.{ReadoutKeys.ShelvedT1.Name}", $"{scheme}.{ReadoutKeys.ShelvedT2.Name}", faults);
                    break;
                case "moved_apart":
                    WayApart(draft, scheme, faults);
                    break;
            }
        }

        if (lacking.Count > 0)
        {
            // what [detection] lacks is missed by every scheme that relies on it
            faults.AddRange(lacking.DistinctBy(fault => fault.Path));
        }
    }

    private static void InUse(ScenarioDraft draft, List<SenseFault> faults)
    {
        List<string> names = [];
        foreach (string table in draft.SchemeTables())
        {
            names.Add(table[(ReadoutKeys.Path.Length + 1)..]);
        }

        if (names.Count == 0)
        {
            faults.Add(new SenseFault(ReadoutKeys.Path, "no readout scheme is described; expected a table [readout.NAME] with a kind"));
        }
        else if (draft.Text(Use) is string use && !names.Contains(use) && !draft.IsUnreadable($"{ReadoutKeys.Path}.{use}"))
        {
            faults.Add(new SenseFault(Use, $"no scheme is called \"{use}\"; described are {string.Join(", ", names)}"));
        }
    }

    private static void OneWayOfDetection(ScenarioDraft draft, string table, List<SenseFault> faults)
    {
        KeyDefinition? counted = draft.FirstGiven(table, DetectionKeys.Counting);
        KeyDefinition? stated = draft.FirstGiven(table, DetectionKeys.Stated);
        if (counted is not null && stated is not null)
        {
            faults.Add(new SenseFault(
                $"{table}.{stated.Name}", $"{stated.Name} is a measured error and {counted.Name} a photon count; a detector is known by one or the other"));
        }

        string mean = $"{table}.{DetectionKeys.FlipError.Name}";
        string dark = $"{table}.{DetectionKeys.DarkFlip.Name}";
        string bright = $"{table}.{DetectionKeys.BrightFlip.Name}";
        if (draft.Gives(mean) && (draft.Gives(dark) || draft.Gives(bright)))
        {
            faults.Add(new SenseFault(mean, "give flip_error, or dark_flip and bright_flip, not both"));
        }
        else if ((draft.Gives(dark) && draft.Lacks(bright)) || (draft.Gives(bright) && draft.Lacks(dark)))
        {
            faults.Add(new SenseFault(draft.Gives(dark) ? bright : dark, "missing key; dark_flip and bright_flip go together"));
        }
    }

    private static void CompleteDetection(ScenarioDraft draft, string scheme, List<SenseFault> faults)
    {
        bool ownFlips = StatesFlips(draft, scheme);
        bool ownCounts = !draft.Lacks($"{scheme}.{DetectionKeys.Signal.Name}");
        if (draft.KindOf(scheme) == "second_species" && !ownFlips && !ownCounts)
        {
            faults.Add(new SenseFault(
                $"{scheme}.{DetectionKeys.Signal.Name}", "missing key; another species has a signal of its own, or a flip_error of its own"));
            return;
        }

        bool states = ownFlips || (!ownCounts && StatesFlips(draft, Detection));
        if (!states && !ownCounts && draft.Lacks($"{Detection}.{DetectionKeys.Signal.Name}"))
        {
            faults.Add(new SenseFault(
                $"{Detection}.{DetectionKeys.Signal.Name}",
                "missing key; expected signal_counts_per_ms with the other counts, or flip_error with loss_per_look and exposure_us"));
            return;
        }

        string owner = ownFlips || ownCounts ? scheme : Detection;
        foreach (KeyDefinition key in states ? [DetectionKeys.LossPerLook] : NeededForCounting)
        {
            if (draft.Lacks($"{scheme}.{key.Name}") && draft.Lacks($"{Detection}.{key.Name}"))
            {
                string companion = states ? "a measured flip error" : "a signal";
                faults.Add(new SenseFault($"{owner}.{key.Name}", $"missing key; needed beside {companion}"));
            }
        }

        string exposure = draft.Lacks($"{scheme}.{DetectionKeys.Exposure.Name}") ? Detection : scheme;
        string exposurePath = $"{exposure}.{DetectionKeys.Exposure.Name}";
        if (states && draft.Number(exposurePath) is null && !draft.IsUnreadable(exposurePath))
        {
            faults.Add(new SenseFault(
                draft.Gives(exposurePath) ? exposurePath : $"{owner}.{DetectionKeys.Exposure.Name}",
                "a measured flip error holds for one exposure; expected a number"));
        }
    }

    private static bool StatesFlips(ScenarioDraft draft, string table) =>
        !draft.Lacks($"{table}.{DetectionKeys.FlipError.Name}") || !draft.Lacks($"{table}.{DetectionKeys.DarkFlip.Name}");

    private static void WayApart(ScenarioDraft draft, string scheme, List<SenseFault> faults)
    {
        string distance = $"{scheme}.{ReadoutKeys.Distance.Name}";
        string exchange = $"{scheme}.{ReadoutKeys.ExchangeTime.Name}";
        if (draft.Gives(distance) && draft.Gives(exchange))
        {
            faults.Add(new SenseFault(exchange, "give distance_um or exchange_time_us, not both"));
        }
        else if (draft.Lacks(distance) && draft.Lacks(exchange))
        {
            faults.Add(new SenseFault(distance, "missing key; expected distance_um, or exchange_time_us"));
        }
        else if (draft.Gives(distance) && draft.Text(ReachKind) == ReachKeys.SteeredBeams.SelectedWhen)
        {
            faults.Add(new SenseFault(distance, "steered beams move no atoms, so a distance gives no time; expected exchange_time_us"));
        }
    }
}
