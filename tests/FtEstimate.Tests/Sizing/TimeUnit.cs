using FtEstimate.Machines;
using FtEstimate.Scenarios;

namespace FtEstimate.Tests.Sizing;

/// <summary>The same machine with all its times in another unit.</summary>
internal static class TimeUnit
{
    public static Scenario Stretched(Scenario scenario, double c)
    {
        Machine machine = scenario.Machine;
        return scenario with
        {
            Machine = machine with
            {
                Apparatus = Stretched((AtomArray)machine.Apparatus, c),
                Control = new Control(machine.Control.DecodeSecondsPerRound * c, machine.Control.FeedForwardSeconds * c),
            },
        };
    }

    private static AtomArray Stretched(AtomArray array, double c) => array with
    {
        Gates = array.Gates with
        {
            Cz = array.Gates.Cz with { Seconds = array.Gates.Cz.Seconds * c },
            BetweenSpecies = array.Gates.BetweenSpecies is { } gate ? gate with { Seconds = gate.Seconds * c } : null,
            OneQubitSeconds = array.Gates.OneQubitSeconds * c,
            ResetSeconds = array.Gates.ResetSeconds * c,
        },
        Reach = array.Reach switch
        {
            MovedAtoms moved => moved with
            {
                PeakAccelerationMetresPerSecondSquared = moved.PeakAccelerationMetresPerSecondSquared / (c * c),
                HandoffSeconds = moved.HandoffSeconds * c,
                BetweenPulsesSeconds = moved.BetweenPulsesSeconds * c,
                LayerSecondsAsStated = moved.LayerSecondsAsStated * c,
            },
            SteeredBeams beams => beams with { SwitchSeconds = beams.SwitchSeconds * c, LayerSecondsAsStated = beams.LayerSecondsAsStated * c },
            _ => array.Reach,
        },
        Coherence = array.Coherence with
        {
            T1Seconds = array.Coherence.T1Seconds * c,
            T2Seconds = array.Coherence.T2Seconds * c,
            VacuumLifetimeSeconds = array.Coherence.VacuumLifetimeSeconds * c,
        },
        Readout = Stretched(array.Readout, c),
    };

    private static ReadoutScheme Stretched(ReadoutScheme scheme, double c)
    {
        ReadoutScheme slower = scheme with { Detector = Stretched(scheme.Detector, c), RecoolSeconds = scheme.RecoolSeconds * c };
        return slower switch
        {
            Shelved shelved => shelved with
            {
                ShelveSeconds = shelved.ShelveSeconds * c,
                SelectSeconds = shelved.SelectSeconds * c,
                ShelvedT1Seconds = shelved.ShelvedT1Seconds * c,
                ShelvedT2Seconds = shelved.ShelvedT2Seconds * c,
                ScatterPerSecond = shelved.ScatterPerSecond / c,
            },
            SecondSpecies second => second with { DataDisturbancePerSecond = second.DataDisturbancePerSecond / c },
            MovedApart apart => apart with
            {
                ExchangeSeconds = apart.ExchangeSeconds * c,
                DataDisturbancePerSecond = apart.DataDisturbancePerSecond / c,
            },
            InPlace bare => bare with { DataDisturbancePerSecond = bare.DataDisturbancePerSecond / c },
            _ => slower,
        };
    }

    private static Detector Stretched(Detector detector, double c) => detector switch
    {
        StatedReadout stated => stated with
        {
            ExposureSeconds = stated.ExposureSeconds * c,
            StatedExposureSeconds = stated.StatedExposureSeconds * c,
            TransferSeconds = stated.TransferSeconds * c,
        },
        PhotonCounting counting => counting with
        {
            SignalPerSecond = counting.SignalPerSecond / c,
            BackgroundPerSecond = counting.BackgroundPerSecond / c,
            DepumpPerSecond = counting.DepumpPerSecond / c,
            LossPerSecond = counting.LossPerSecond / c,
            BrightenPerSecond = counting.BrightenPerSecond / c,
            ExposureSeconds = counting.ExposureSeconds * c,
            TransferSeconds = counting.TransferSeconds * c,
        },
        _ => detector,
    };
}
