using System.Collections.Immutable;
using FtEstimate.Machines;

namespace FtEstimate.Cycles;

/// <summary>The phases that read the checks, by kind of scheme.</summary>
public static class ReadoutPhases
{
    /// <summary>The phases in order; with a second bank they run beside the gates.</summary>
    public static ImmutableArray<PhaseRule> Of(AtomArray array, ReadoutScheme scheme, CheckReading reading) => scheme switch
    {
        Shelved shelved => OfShelved(shelved, reading),
        SecondSpecies or InPlace => Look(scheme, reading),
        MovedApart { ExchangeSeconds: { } seconds } apart =>
        [
            Phase("Exchange checks for a fresh block", seconds, DataState.Waiting),
            .. apart.ReadInRound ? Look(scheme, reading) : [],
        ],
        MovedApart apart => [Trip("Checks to the readout zone", array, apart), .. Look(scheme, reading), Trip("Checks back", array, apart)],
        _ => throw new ArgumentOutOfRangeException(nameof(scheme)),
    };

    private static ImmutableArray<PhaseRule> OfShelved(Shelved scheme, CheckReading reading) =>
    [
        Phase("Shelve all atoms", scheme.ShelveSeconds, DataState.Waiting),
        new("Select checks", CyclePart.Readout, WorkKind.Checks, scheme.SelectAtOnce, scheme.SelectSeconds, scheme.SelectSeconds, 1, DataState.Shelved),
        Phase("Expose", reading.ExposureSeconds, DataState.Shelved),
        Phase("Recool and restore checks", scheme.RecoolSeconds, DataState.Shelved),
        Phase("Unshelve all atoms", scheme.ShelveSeconds, DataState.Waiting),
    ];

    private static ImmutableArray<PhaseRule> Look(ReadoutScheme scheme, CheckReading reading)
    {
        DataState data = scheme.Banks > 1 ? DataState.Beside : DataState.Waiting;
        return
        [
            Phase("Expose", reading.ExposureSeconds, data),
            Phase("Recool checks", scheme.RecoolSeconds, data),
        ];
    }

    private static PhaseRule Trip(string name, AtomArray array, MovedApart scheme)
    {
        DataState data = scheme.Banks > 1 ? DataState.Beside : DataState.Waiting;
        if (array.Reach is not MovedAtoms moved || scheme.DistanceMetres is not { } metres)
        {
            return Phase(name, 0, data);
        }

        double seconds = MoveTime.Seconds(moved.Profile, metres, moved.PeakAccelerationMetresPerSecondSquared)
            + (2 * moved.HandoffSeconds);
        return new(name, CyclePart.Readout, WorkKind.CheckAtoms, moved.MovedAtOnce, seconds, seconds, 1, data);
    }

    private static PhaseRule Phase(string name, double seconds, DataState data) =>
        GatePhases.Simple(name, CyclePart.Readout, seconds, data);
}
