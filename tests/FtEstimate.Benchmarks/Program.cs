using BenchmarkDotNet.Running;

BenchmarkSwitcher.FromAssembly(typeof(FtEstimate.Benchmarks.BenchmarkMarker).Assembly).Run(args);

namespace FtEstimate.Benchmarks
{
    internal static class BenchmarkMarker;
}
