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
        ChannelSum sum = default;
        Visit(times, loss, ref sum);
        return sum.Total;
    }

    /// <summary>The ledger for given durations, largest share first.</summary>
    public ErrorLedger Ledger(in CycleTimes times)
    {
        ChannelList list = new();
        Visit(times, Loss(times), ref list);
        list.Channels.Sort((a, b) => b.Strength.Mean.CompareTo(a.Strength.Mean));
        return new ErrorLedger([.. list.Channels]);
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
        where TSink : struct, IChannelSink
    {
        VisitGates(times, ref sink);
        VisitWaiting(times, ref sink);
        VisitReadout(ref sink);
        VisitLoss(loss, ref sink);
    }

    private void VisitGates<TSink>(in CycleTimes times, ref TSink sink)
        where TSink : struct, IChannelSink
    {
        double cz = _gate.PauliError;
        double oneQubit = Array.Gates.OneQubitPauliError;
        double checkShare = 1 / Array.Coherence.LossCheck.EveryRounds;
        double extraLayers = LossCheckPhases.ExtraLayers(_lossCheck) * checkShare;
        double onData = GatePhases.OneQubitGatesPerData + Array.Coherence.EchoPulsesPerRound + (extraLayers > 0 ? 2 * checkShare : 0);
        sink.Add("CZ gates", cz, SyndromeCycle.Layers, Weights.Cz(cz));
        sink.Add("CZ gates of the loss check", cz, extraLayers, Weights.ExtraCzLayer(cz) * extraLayers);
        sink.Add("One-qubit gates on data", oneQubit, onData, Weights.DataEvent(PauliChannel.Depolarising(oneQubit)) * onData);
        sink.Add("One-qubit gates on checks", oneQubit, GatePhases.OneQubitGatesPerCheck, Weights.CheckGate(oneQubit) * GatePhases.OneQubitGatesPerCheck);
        sink.Add("Check reset", Array.Gates.ResetFlip, 1, Weights.CheckReset(Array.Gates.ResetFlip));
        if (Array.Reach is MovedAtoms { HandoffInfidelity: > 0 } moved)
        {
            double handoff = Gates.PauliErrorOfOneQubit(moved.HandoffInfidelity);
            bool everyLeg = times.ChecksMoveInGroups || !moved.CheckGridsMoveTogether;
            double handoffs = everyLeg ? 2 * GatePhases.MovesPerCheck : 2;
            NoiseStrength each = everyLeg ? Weights.CheckInSequence(handoff) : Weights.CheckGate(handoff);
            sink.Add("Handoffs of checks", handoff, handoffs, each * handoffs);
        }
    }

    private void VisitWaiting<TSink>(in CycleTimes times, ref TSink sink)
        where TSink : struct, IChannelSink
    {
        Coherence coherence = Array.Coherence;
        PauliChannel inLayer = PauliChannel.Waiting(times.LayerSeconds, coherence.T1Seconds, coherence.T2Seconds);
        PauliChannel outside = PauliChannel.Waiting(times.WaitingSeconds, coherence.T1Seconds, coherence.T2Seconds);
        PauliChannel shelved = ShelvedWaiting(times);
        sink.Add("Waiting in CZ layers", inLayer.Total, SyndromeCycle.Layers, Weights.WaitingPerLayer(inLayer));
        sink.Add("Waiting outside the layers", outside.Total, 1, Weights.DataEvent(outside));
        sink.Add("Waiting while shelved", shelved.Total, 1, Weights.DataEvent(shelved));
    }

    private void VisitReadout<TSink>(ref TSink sink)
        where TSink : struct, IChannelSink
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
        sink.Add("Light on data during readout", light, looks, Weights.DataEvent(PauliChannel.Depolarising(light)) * looks);
        sink.Add("Check readout", Cycle.Reading.Flip, 1, Weights.CheckFlip(Cycle.Reading.Flip));
        if (Cycle.Scheme is Shelved scheme)
        {
            double pulse = Gates.PauliErrorOfOneQubit(scheme.ShelveInfidelity);
            double select = Gates.PauliErrorOfOneQubit(scheme.SelectInfidelity);
            sink.Add("Shelving pulses on data", pulse, 2 * looks, Weights.DataEvent(PauliChannel.Depolarising(pulse)) * (2 * looks));
            sink.Add("Shelving and selecting checks", pulse + select, 1, Weights.CheckFlip(pulse + select));
            sink.Add("Crosstalk of selecting", scheme.SelectCrosstalk, looks, Weights.DataEvent(PauliChannel.Depolarising(scheme.SelectCrosstalk)) * looks);
        }
    }

    private void VisitLoss<TSink>(in AtomLoss loss, ref TSink sink)
        where TSink : struct, IChannelSink
    {
        double lookLater = Cycle.Scheme is MovedApart { ReadInRound: false } ? Cycle.Reading.LossPerLook * (1 - LooksAtData) : 0;
        double data = loss.PerGateSlot + (loss.DataPerRound / SyndromeCycle.Layers);
        double check = loss.PerGateSlot + (Math.Max(loss.CheckPerRound - lookLater, 0) / SyndromeCycle.Layers);
        bool tells = Cycle.Scheme.Detector.TellsLoss;
        if (tells || _lossCheck == LossCheckMethod.ExtraCheck)
        {
            sink.Add("Loss of data atoms", data, SyndromeCycle.Layers, LossWeights.Told(data, Array.Coherence.LossCheck.EveryRounds));
        }
        else
        {
            // nobody tells the decoder: a lost atom counts as an error of its gate, and as a random qubit in the rounds until it is replaced
            double roundsUntilReplaced = (Array.Coherence.LossCheck.EveryRounds - 1) / 2;
            NoiseStrength random = Weights.DataEvent(PauliChannel.Depolarising(0.75 * SyndromeCycle.Layers * data * roundsUntilReplaced));
            sink.Add("Loss of data atoms, not told", data, SyndromeCycle.Layers, Weights.Cz(data) + random);
        }

        if (tells)
        {
            sink.Add("Loss of check atoms", check, SyndromeCycle.Layers, LossWeights.Told(check, 1));
        }
        else
        {
            sink.Add("Loss of check atoms, not told", check, SyndromeCycle.Layers, Weights.Cz(check));
        }
    }
}

/// <summary>Where atoms are lost.</summary>
/// <param name="PerGateSlot">Per atom and CZ layer.</param>
/// <param name="DataPerRound">Per data atom and round, gates not counted.</param>
/// <param name="CheckPerRound">Per check atom and round, gates not counted.</param>
public readonly record struct AtomLoss(double PerGateSlot, double DataPerRound, double CheckPerRound);
