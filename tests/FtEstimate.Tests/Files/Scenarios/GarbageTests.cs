using System.Text;
using CsCheck;
using FtEstimate.Files.Scenarios;
using FtEstimate.Machines;
using FtEstimate.Scenarios;

namespace FtEstimate.Tests.Files.Scenarios;

public class GarbageTests
{
    // pieces that get past the lexer, so that deeper rooms see trouble too
    private static readonly Gen<string> Piece = Gen.OneOf(
        "", "=", "[", "]", "{", "}", "\"", "'", "\"\"\"", ".", ",", "\n", "#", "-", "0", "1e308", "-1e308", "1e-320", "nan", "-inf", "true", "\"best\"",
        "[machine.gates]", "[[readout]]", "use = \"bare\"", "kind = 5", "{ likely = 1, low = 1, high = 1 }", "{ value = \"x\" }", "a.b.c = 1", "é", "\u0001");

    [Fact]
    public void Random_bytes_give_faults_and_never_throw() =>
        Gen.Byte.Array[0, 400].Sample(
            bytes =>
            {
                using TemporaryFolder folder = new();
                ScenarioReading reading = ScenarioReader.Read(folder.Write("s.toml", bytes), []);
                return reading.Scenario is null && reading.Faults.Length > 0;
            },
            iter: 2000);

    [Fact]
    public void A_damaged_machine_file_gives_faults_or_a_scenario_of_plain_numbers() =>
        Gen.Select(Gen.Int[0, SampleFiles.Machine.Length], Gen.Int[0, 30], Piece, Piece).Sample(
            (at, length, first, second) =>
            {
                int end = Math.Min(at + length, SampleFiles.Machine.Length);
                string damaged = SampleFiles.Machine[..at] + first + second + SampleFiles.Machine[end..];
                ScenarioReading reading = Reading.Of(machine: damaged);
                return reading.Scenario is null ? reading.Faults.Length > 0 : reading.Faults.Length == 0 && IsSound(reading.Scenario);
            },
            iter: 2000);

    [Fact]
    public void Random_settings_give_faults_or_a_scenario_of_plain_numbers()
    {
        string[] paths = [.. Reading.Of().Scenario!.Inputs.InOrder.Select(input => input.Path)];
        Gen.Select(Gen.OneOf(paths), Gen.OneOf(Piece, Gen.Double.Select(number => FormattableString.Invariant($"{number}")))).Sample(
            (path, value) =>
            {
                ScenarioReading reading = Reading.Of(settings: $"{path}={value}");
                return reading.Scenario is null ? reading.Faults.Length > 0 : reading.Faults.Length == 0 && IsSound(reading.Scenario);
            },
            iter: 2000);
    }

    // the records print all their numbers; infinity stands for "no limit"
    private static bool IsSound(Scenario scenario)
    {
        StringBuilder all = new();
        all.Append(scenario.Machine).Append(scenario.Workload).Append(scenario.Goal).Append(scenario.Method);
        foreach (ReadoutScheme other in scenario.Machine.Apparatus is AtomArray atoms ? atoms.OtherReadouts : [])
        {
            all.Append(other);
        }

        return !all.ToString().Contains("NaN", StringComparison.Ordinal) && double.IsFinite(scenario.Workload.Rotations);
    }
}
