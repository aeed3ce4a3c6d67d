using System.Collections.Immutable;
using FtEstimate.Cycles;
using FtEstimate.Noise;
using FtEstimate.Reports.Documents;
using FtEstimate.Sizing;

namespace FtEstimate.Reports.Estimate;

/// <summary>What the sections of an estimate speak about.</summary>
/// <param name="Result">The sizing.</param>
internal sealed record Subject(SizingResult Result)
{
    /// <summary>The machine in the sections: the answer, or what comes closest; null when nothing does.</summary>
    public SizedMachine? Machine => Result.Best ?? Result.NoAnswer?.Closest;

    /// <summary>What was chosen from.</summary>
    public SearchSpace Space => Result.Space;

    /// <summary>Says whose figures follow, when it is not the answer's; one sentence or nothing.</summary>
    public ImmutableArray<Block> Preface => Result.Best is not null ? []
        : Machine is not null ? [new Paragraph("These are the figures of the machine that comes closest, with the limits on atoms, time and supply dropped.")]
        : [new Paragraph("There is no machine to report on: see the bottom line.")];

    /// <summary>The round to show: of the machine, or of the quietest single patch of distance 3 when there is none.</summary>
    public CycleView Cycle
    {
        get
        {
            if (Machine is { } machine)
            {
                return new CycleView(machine.Phases, machine.Clock.RoundSeconds, machine.Ledger, machine.Point);
            }

            OperatingPoint point = Space.Points[0];
            MachineLoad onePatch = MachineLoad.Of(2 * SmallestDistance * SmallestDistance, SmallestDistance);
            OperatingState state = point.At(onePatch);
            return point is AtomOperatingPoint atom
                ? new CycleView(atom.Noise.Cycle.Phases(onePatch), state.Times.RoundSeconds, atom.Noise.Ledger(state.Times), point)
                : new CycleView([], state.Times.RoundSeconds, new ErrorLedger([]), point);
        }
    }

    private const int SmallestDistance = 3;
}

/// <summary>A syndrome round with its errors, as it is reported.</summary>
/// <param name="Phases">The phases.</param>
/// <param name="RoundSeconds">Duration of the round.</param>
/// <param name="Ledger">The causes of error.</param>
/// <param name="Point">Readout and exposure.</param>
internal sealed record CycleView(ImmutableArray<CyclePhase> Phases, double RoundSeconds, ErrorLedger Ledger, OperatingPoint Point)
{
    /// <summary>Whether a physical machine stands behind it.</summary>
    public bool IsPhysical => Point is AtomOperatingPoint;

    /// <summary>Time at the end in which the gates wait for a readout that runs beside them.</summary>
    public double IdleSeconds
    {
        get
        {
            double path = 0;
            foreach (CyclePhase phase in Phases)
            {
                path += phase.Data == DataState.Beside ? 0 : phase.Seconds;
            }

            double idle = RoundSeconds - path;
            return idle > 1e-9 * RoundSeconds ? idle : 0;
        }
    }

    /// <summary>Time of the phases of one part, beside the gates or not.</summary>
    public double SecondsOf(CyclePart part, bool beside)
    {
        double seconds = 0;
        foreach (CyclePhase phase in Phases)
        {
            seconds += phase.Part == part && phase.Data == DataState.Beside == beside ? phase.Seconds : 0;
        }

        return seconds;
    }
}
