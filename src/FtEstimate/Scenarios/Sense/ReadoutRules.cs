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

    public static IEnumerable<SenseFault> Check(ScenarioDraft draft)
    {
        if (!draft.Tables.Contains(ReadoutKeys.Path))
        {
            return [];
        }

        List<SenseFault> faults = [.. InUse(draft), .. OneWayOfDetection(draft, Detection)];
        foreach (string scheme in draft.SchemeTables())
        {
            faults.AddRange(OneWayOfDetection(draft, scheme));
            faults.AddRange(CompleteDetection(draft, scheme));
            faults.AddRange(draft.KindOf(scheme) switch
            {
                "shelved" => ArrayRules.Decay(
                    draft, $"{scheme}.{ReadoutKeys.ShelvedT1.Name}", $"{scheme}.{ReadoutKeys.ShelvedT2.Name}"),
                "moved_apart" => WayApart(draft, scheme),
                _ => [],
            });
        }

        // what [detection] lacks is missed by every scheme that relies on it
        return faults.DistinctBy(fault => fault.Path);
    }

    private static IEnumerable<SenseFault> InUse(ScenarioDraft draft)
    {
        string[] names = [.. draft.SchemeTables().Select(table => table[(ReadoutKeys.Path.Length + 1)..])];
        if (names.Length == 0)
        {
            yield return new SenseFault(ReadoutKeys.Path, "no readout scheme is described; expected a table [readout.NAME] with a kind");
        }
        else if (draft.Text(Use) is string use && !names.Contains(use) && !draft.IsUnreadable($"{ReadoutKeys.Path}.{use}"))
        {
            yield return new SenseFault(Use, $"no scheme is called \"{use}\"; described are {string.Join(", ", names)}");
        }
    }

    private static IEnumerable<SenseFault> OneWayOfDetection(ScenarioDraft draft, string table)
    {
        KeyDefinition? counted = DetectionKeys.Counting.FirstOrDefault(key => draft.Gives($"{table}.{key.Name}"));
        KeyDefinition? stated = DetectionKeys.Stated.FirstOrDefault(key => draft.Gives($"{table}.{key.Name}"));
        if (counted is not null && stated is not null)
        {
            yield return new SenseFault(
                $"{table}.{stated.Name}", $"{stated.Name} is a measured error and {counted.Name} a photon count; a detector is known by one or the other");
        }

        string mean = $"{table}.{DetectionKeys.FlipError.Name}";
        string dark = $"{table}.{DetectionKeys.DarkFlip.Name}";
        string bright = $"{table}.{DetectionKeys.BrightFlip.Name}";
        if (draft.Gives(mean) && (draft.Gives(dark) || draft.Gives(bright)))
        {
            yield return new SenseFault(mean, "give flip_error, or dark_flip and bright_flip, not both");
        }
        else if ((draft.Gives(dark) && draft.Lacks(bright)) || (draft.Gives(bright) && draft.Lacks(dark)))
        {
            yield return new SenseFault(draft.Gives(dark) ? bright : dark, "missing key; dark_flip and bright_flip go together");
        }
    }

    private static IEnumerable<SenseFault> CompleteDetection(ScenarioDraft draft, string scheme)
    {
        bool ownFlips = StatesFlips(draft, scheme);
        bool ownCounts = !draft.Lacks($"{scheme}.{DetectionKeys.Signal.Name}");
        if (draft.KindOf(scheme) == "second_species" && !ownFlips && !ownCounts)
        {
            yield return new SenseFault(
                $"{scheme}.{DetectionKeys.Signal.Name}", "missing key; another species has a signal of its own, or a flip_error of its own");
            yield break;
        }

        bool states = ownFlips || (!ownCounts && StatesFlips(draft, Detection));
        if (!states && !ownCounts && draft.Lacks($"{Detection}.{DetectionKeys.Signal.Name}"))
        {
            yield return new SenseFault(
                $"{Detection}.{DetectionKeys.Signal.Name}",
                "missing key; expected signal_counts_per_ms with the other counts, or flip_error with loss_per_look and exposure_us");
            yield break;
        }

        string owner = ownFlips || ownCounts ? scheme : Detection;
        foreach (KeyDefinition key in states ? [DetectionKeys.LossPerLook] : NeededForCounting)
        {
            if (draft.Lacks($"{scheme}.{key.Name}") && draft.Lacks($"{Detection}.{key.Name}"))
            {
                string companion = states ? "a measured flip error" : "a signal";
                yield return new SenseFault($"{owner}.{key.Name}", $"missing key; needed beside {companion}");
            }
        }

        string exposure = draft.Lacks($"{scheme}.{DetectionKeys.Exposure.Name}") ? Detection : scheme;
        string exposurePath = $"{exposure}.{DetectionKeys.Exposure.Name}";
        if (states && draft.Number(exposurePath) is null && !draft.IsUnreadable(exposurePath))
        {
            yield return new SenseFault(
                draft.Gives(exposurePath) ? exposurePath : $"{owner}.{DetectionKeys.Exposure.Name}",
                "a measured flip error holds for one exposure; expected a number");
        }
    }

    private static bool StatesFlips(ScenarioDraft draft, string table) =>
        !draft.Lacks($"{table}.{DetectionKeys.FlipError.Name}") || !draft.Lacks($"{table}.{DetectionKeys.DarkFlip.Name}");

    private static IEnumerable<SenseFault> WayApart(ScenarioDraft draft, string scheme)
    {
        string distance = $"{scheme}.{ReadoutKeys.Distance.Name}";
        string exchange = $"{scheme}.{ReadoutKeys.ExchangeTime.Name}";
        if (draft.Gives(distance) && draft.Gives(exchange))
        {
            yield return new SenseFault(exchange, "give distance_um or exchange_time_us, not both");
        }
        else if (draft.Lacks(distance) && draft.Lacks(exchange))
        {
            yield return new SenseFault(distance, "missing key; expected distance_um, or exchange_time_us");
        }
        else if (draft.Gives(distance) && draft.Text(ReachKind) == ReachKeys.SteeredBeams.SelectedWhen)
        {
            yield return new SenseFault(distance, "steered beams move no atoms, so a distance gives no time; expected exchange_time_us");
        }
    }
}
