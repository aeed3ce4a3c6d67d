using CsCheck;
using FtEstimate.Noise;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Tests.Simulation.Memory;

public sealed class WorseNoiseTests
{
    private static readonly Gen<double> Rate = Gen.Double[0, 0.01];

    private static readonly Gen<RoundErrors> Errors = Gen.Select(Rate, Rate, Rate, Rate, Gen.Bool, Gen.Int[1, 3], (gate, flip, dephasing, loss, told, looks) =>
        new RoundErrors
        {
            CzGate = gate,
            CheckFlip = flip,
            CheckReset = flip,
            OnData = new PauliChannel(dephasing / 3, dephasing / 3, dephasing),
            WaitingInLayer = new PauliChannel(0, 0, dephasing / 4),
            DataLossPerSlot = loss / 2,
            DataLossTold = told,
            CheckLossPerSlot = loss / 3,
            CheckLossTold = told,
            RoundsBetweenLooks = looks,
        });

    // five standard errors: one false alarm in some million runs
    [Fact]
    public void Worse_rates_never_lower_the_failure_rate() => Gen.Select(Errors, Gen.Double[1.3, 3], Gen.Enum<PauliBasis>(), Gen.Enum<DecoderKind>())
        .Sample(
            (errors, factor, basis, decoder) =>
            {
                ShotCount good = Shots.Run(AtomCircuit.Of(3, 3, basis, errors), 2000, decoder);
                ShotCount bad = Shots.Run(AtomCircuit.Of(3, 3, basis, Worse(errors, factor)), 2000, decoder, 2);
                return bad.Rate() > good.Rate() - (5 * Math.Sqrt((good.StandardError() * good.StandardError()) + (bad.StandardError() * bad.StandardError())));
            },
            seed: "0000KzsGvVi3",
            iter: 60,
            threads: 1);

    private static RoundErrors Worse(RoundErrors errors, double factor) => errors with
    {
        CzGate = errors.CzGate * factor,
        CheckFlip = errors.CheckFlip * factor,
        CheckReset = errors.CheckReset * factor,
        OnData = errors.OnData.Times(factor),
        WaitingInLayer = errors.WaitingInLayer.Times(factor),
        DataLossPerSlot = errors.DataLossPerSlot * factor,
        CheckLossPerSlot = errors.CheckLossPerSlot * factor,
    };
}
