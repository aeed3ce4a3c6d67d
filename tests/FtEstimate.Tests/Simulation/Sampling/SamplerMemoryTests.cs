using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Graphs;
using FtEstimate.Simulation.Sampling;
using FtEstimate.Tests.Simulation.Circuits;

namespace FtEstimate.Tests.Simulation.Sampling;

public sealed class SamplerMemoryTests
{
    private static readonly Circuit Circuit = AtomCircuit.Of(
        5, 4, PauliBasis.Z, TestCircuits.EverywhereOnAtoms(0.003) with { DataLossPerSlot = 0.003, DataLossTold = true, CheckLossPerSlot = 0.002 });

    private static readonly MemoryModel Model = FaultPropagation.Of(Circuit);

    [Theory]
    [InlineData("frames")]
    [InlineData("mechanisms")]
    public void A_block_has_the_same_shots_whatever_came_before(string name)
    {
        string fresh = Shots(Make(name), 9, 1234);

        IShotSampler used = Make(name);
        Shots(used, 8, 77);
        Shots(used, 9, 5);

        Assert.Equal(fresh, Shots(used, 9, 1234));
        Assert.NotEqual(fresh, Shots(used, 9, 1235));
        Assert.NotEqual(fresh, Shots(used, 10, 1234));
    }

    [Theory]
    [InlineData("frames")]
    [InlineData("mechanisms")]
    public void A_shot_takes_no_memory(string name)
    {
        IShotSampler sampler = Make(name);
        Shots(sampler, 1, 0);
        sampler.Begin(2, 0);
        long before = GC.GetAllocatedBytesForCurrentThread();
        for (int shot = 0; shot < 2000; shot++)
        {
            sampler.NextShot();
        }

        Assert.Equal(before, GC.GetAllocatedBytesForCurrentThread());
    }

    private static IShotSampler Make(string name) => name == "frames" ? new FrameSampler(Circuit, Model) : new MechanismSampler(Model);

    private static string Shots(IShotSampler sampler, ulong seed, ulong block)
    {
        sampler.Begin(seed, block);
        List<string> shots = [];
        for (int shot = 0; shot < 150; shot++)
        {
            SampledShot sampled = sampler.NextShot();
            shots.Add($"{string.Join(' ', sampled.Defects.ToArray())} | {string.Join(' ', sampled.Told.ToArray())} | {sampled.ObservableFlipped}");
        }

        return string.Join('\n', shots);
    }
}
