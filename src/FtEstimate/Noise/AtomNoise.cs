using FtEstimate.Cycles;
using FtEstimate.Machines;
using FtEstimate.Quantities;

namespace FtEstimate.Noise;

/// <summary>The noise of an atom array in one syndrome cycle: every cause, from bench numbers to its strength.</summary>
/// <param name="array">The machine.</param>
/// <param name="cycle">Its round.</param>
/// <param name="weights">How causes count towards the strength.</param>
public sealed class AtomNoise(AtomArray array, SyndromeCycle cycle, ChannelWeights weights)
{
    private readonly EntanglingGate _gate = GatePhases.GateOf(array, cycle.Scheme);
    private readonly LossCheckMethod _lossCheck = LossCheckPhases.MethodFor(array, cycle.Scheme);

    /// <summary>Looks at a data atom per round: the share of looks that checks are spared.</summary>
    private double LooksAtData => _lossCheck == LossCheckMethod.Swap ? 1 / Array.Coherence.LossCheck.EveryRounds : 0;

    /// <summary>The machine.</summary>
    public AtomArray Array { get; } = array;

    /// <summary>Its round.</summary>
    public SyndromeCycle Cycle { get; } = cycle;

    /// <summary>How causes count towards the strength.</summary>
    public ChannelWeights Weights { get; } = weights;

    /// <summary>Total strength for given durations; no allocation.</summary>
    public NoiseStrength Strength(in CycleTimes times) => Strength(times, Loss(times));

    /// <summary>Total strength for given durations and the losses that go with them.</summary>
    internal NoiseStrength Strength(in CycleTimes times, in AtomLoss loss)
    {
        StrengthSum sum = new(Weights, Array.Coherence.LossCheck.EveryRounds);
        Visit(times, loss, ref sum);
        return sum.Total;
    }

    /// <summary>The ledger for given durations, largest share first.</summary>
    public ErrorLedger Ledger(in CycleTimes times)
    {
        ChannelList list = new(Weights, Array.Coherence.LossCheck.EveryRounds);
        Visit(times, Loss(times), ref list);
        list.Channels.Sort((a, b) => b.Strength.Mean.CompareTo(a.Strength.Mean));
        return new ErrorLedger([.. list.Channels]);
    }

    /// <summary>The errors of a round place by place, as a simulation of the round needs them.</summary>
    public RoundErrors Errors(in CycleTimes times)
    {
        RoundErrorSum sum = new(Array.Coherence.LossCheck.EveryRounds);
        Visit(times, Loss(times), ref sum);
        return sum.Errors;
    }

    /// <summary>
    /// Pauli probability of an injected T state: one CZ, two one-qubit gates, a reset, one round of waiting and the losses of a data atom.
    /// </summary>
    public double InjectedError(in CycleTimes times)
    {
        Coherence coherence = Array.Coherence;
        double waiting = PauliChannel.Waiting(
            (SyndromeCycle.Layers * times.LayerSeconds) + times.WaitingSeconds, coherence.T1Seconds, coherence.T2Seconds).Total;
        AtomLoss loss = Loss(times);
        return Math.Min(
            0.5,
            _gate.PauliError + (2 * Array.Gates.OneQubitPauliError) + Array.Gates.ResetFlip + waiting
                + ShelvedWaiting(times).Total + loss.PerGateSlot + loss.DataPerRound);
    }

    /// <summary>Where atoms are lost, for given durations.</summary>
    public AtomLoss Loss(in CycleTimes times)
    {
        double vacuum = -ElementaryFunctions.ExpMinusOne(-times.RoundSeconds / Array.Coherence.VacuumLifetimeSeconds);
        double everyRounds = Array.Coherence.LossCheck.EveryRounds;
        double look = Cycle.Reading.LossPerLook;
        double looksAtData = LooksAtData;
        double looksAtChecks = 1 - looksAtData + (_lossCheck == LossCheckMethod.ExtraCheck ? 1 / everyRounds : 0);
        double extraGates = _gate.LossPerAtom * LossCheckPhases.ExtraLayers(_lossCheck) / everyRounds;
        double lossPerMove = Array.Reach is MovedAtoms moved ? moved.LossPerMove : 0;
        double trips = Cycle.Scheme is MovedApart ? 2 : 0;
        double legs = Array.Reach is MovedAtoms ? GatePhases.MovesPerCheck : 0;
        return new AtomLoss(
            _gate.LossPerAtom,
            vacuum + (look * looksAtData) + extraGates,
            vacuum + (look * looksAtChecks) + extraGates + ((legs + trips) * lossPerMove));
    }

    private PauliChannel ShelvedWaiting(in CycleTimes times) => Cycle.Scheme is Shelved shelved
        ? PauliChannel.Waiting(times.ShelvedSeconds, shelved.ShelvedT1Seconds, shelved.ShelvedT2Seconds)
        : default;

    private void Visit<TSink>(in CycleTimes times, in AtomLoss loss, ref TSink sink)
        where TSink : struct, IErrorSink
    {
        VisitGates(times, ref sink);
        VisitWaiting(times, ref sink);
        VisitReadout(ref sink);
        VisitLoss(loss, ref sink);
    }

    private void VisitGates<TSink>(in CycleTimes times, ref TSink sink)
        where TSink : struct, IErrorSink
    {
        double cz = _gate.PauliError;
        double oneQubit = Array.Gates.OneQubitPauliError;
        double checkShare = 1 / Array.Coherence.LossCheck.EveryRounds;
        double extraLayers = LossCheckPhases.ExtraLayers(_lossCheck) * checkShare;
        double moreOnData = Array.Coherence.EchoPulsesPerRound + (extraLayers > 0 ? 2 * checkShare : 0);
        sink.Add("CZ gates", ErrorSource.Of(ErrorLocation.CzGate, cz, SyndromeCycle.Layers));
        sink.Add("CZ gates of the loss check", ErrorSource.Of(ErrorLocation.ExtraCzLayer, cz, extraLayers));
        sink.Add("One-qubit gates on data", ErrorSource.Of(ErrorLocation.GateOnData, oneQubit, GatePhases.OneQubitGatesPerData));
        sink.Add("Echo pulses and turns of the loss check", ErrorSource.Of(ErrorLocation.DataAtom, oneQubit, moreOnData));
        sink.Add("One-qubit gates on checks", ErrorSource.Of(ErrorLocation.CheckOutsideLayers, oneQubit, GatePhases.OneQubitGatesPerCheck));
        sink.Add("Check reset", ErrorSource.Of(ErrorLocation.CheckReset, Array.Gates.ResetFlip, 1));
        if (Array.Reach is MovedAtoms { HandoffInfidelity: > 0 } moved)
        {
            double handoff = Gates.PauliErrorOfOneQubit(moved.HandoffInfidelity);
            bool everyLeg = times.ChecksMoveInGroups || !moved.CheckGridsMoveTogether;
            sink.Add("Handoffs of checks", everyLeg
                ? ErrorSource.Of(ErrorLocation.CheckBetweenLayers, handoff, 2 * GatePhases.MovesPerCheck)
                : ErrorSource.Of(ErrorLocation.CheckOutsideLayers, handoff, 2));
        }
    }

    private void VisitWaiting<TSink>(in CycleTimes times, ref TSink sink)
        where TSink : struct, IErrorSink
    {
        Coherence coherence = Array.Coherence;
        PauliChannel inLayer = PauliChannel.Waiting(times.LayerSeconds, coherence.T1Seconds, coherence.T2Seconds);
        PauliChannel outside = PauliChannel.Waiting(times.WaitingSeconds, coherence.T1Seconds, coherence.T2Seconds);
        sink.Add("Waiting in CZ layers", new ErrorSource(ErrorLocation.WaitingInLayer, inLayer, SyndromeCycle.Layers));
        sink.Add("Waiting outside the layers", new ErrorSource(ErrorLocation.DataAtom, outside, 1));
        sink.Add("Waiting while shelved", new ErrorSource(ErrorLocation.DataAtom, ShelvedWaiting(times), 1));
    }

    private void VisitReadout<TSink>(ref TSink sink)
        where TSink : struct, IErrorSink
    {
        double looks = 1 + (_lossCheck == LossCheckMethod.ExtraCheck ? 1 / Array.Coherence.LossCheck.EveryRounds : 0);
        double lit = Cycle.Reading.ExposureSeconds + Cycle.Scheme.RecoolSeconds;
        double rate = Cycle.Scheme switch
        {
            Shelved shelved => shelved.ScatterPerSecond,
            SecondSpecies second => second.DataDisturbancePerSecond,
            MovedApart { ReadInRound: true } apart => apart.DataDisturbancePerSecond,
            InPlace bare => bare.DataDisturbancePerSecond,
            _ => 0,
        };
        double light = -ElementaryFunctions.ExpMinusOne(-rate * lit);
        sink.Add("Light on data during readout", ErrorSource.Of(ErrorLocation.DataAtom, light, looks));
        sink.Add("Check readout", ErrorSource.Of(ErrorLocation.CheckFlip, Cycle.Reading.Flip, 1));
        if (Cycle.Scheme is Shelved scheme)
        {
            double pulse = Gates.PauliErrorOfOneQubit(scheme.ShelveInfidelity);
            double select = Gates.PauliErrorOfOneQubit(scheme.SelectInfidelity);
            sink.Add("Shelving pulses on data", ErrorSource.Of(ErrorLocation.DataAtom, pulse, 2 * looks));
            sink.Add("Shelving and selecting checks", ErrorSource.Of(ErrorLocation.CheckFlip, pulse + select, 1));
            sink.Add("Crosstalk of selecting", ErrorSource.Of(ErrorLocation.DataAtom, scheme.SelectCrosstalk, looks));
        }
    }

    private void VisitLoss<TSink>(in AtomLoss loss, ref TSink sink)
        where TSink : struct, IErrorSink
    {
        double lookLater = Cycle.Scheme is MovedApart { ReadInRound: false } ? Cycle.Reading.LossPerLook * (1 - LooksAtData) : 0;
        double data = loss.PerGateSlot + (loss.DataPerRound / SyndromeCycle.Layers);
        double check = loss.PerGateSlot + (Math.Max(loss.CheckPerRound - lookLater, 0) / SyndromeCycle.Layers);
        bool tells = Cycle.Scheme.Detector.TellsLoss;
        if (tells || _lossCheck == LossCheckMethod.ExtraCheck)
        {
            sink.Add("Loss of data atoms", ErrorSource.Of(ErrorLocation.ToldLossOfData, data, SyndromeCycle.Layers));
        }
        else
        {
            sink.Add("Loss of data atoms, not told", ErrorSource.Of(ErrorLocation.UntoldLossOfData, data, SyndromeCycle.Layers));
        }

        if (tells)
        {
            sink.Add("Loss of check atoms", ErrorSource.Of(ErrorLocation.ToldLossOfChecks, check, SyndromeCycle.Layers));
        }
        else
        {
            sink.Add("Loss of check atoms, not told", ErrorSource.Of(ErrorLocation.UntoldLossOfChecks, check, SyndromeCycle.Layers));
        }
    }
}

/// <summary>Where atoms are lost.</summary>
/// <param name="PerGateSlot">Per atom and CZ layer.</param>
/// <param name="DataPerRound">Per data atom and round, gates not counted.</param>
/// <param name="CheckPerRound">Per check atom and round, gates not counted.</param>
public readonly record struct AtomLoss(double PerGateSlot, double DataPerRound, double CheckPerRound);
