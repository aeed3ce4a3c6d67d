using System.Globalization;
using FtEstimate.Files.Scenarios;

namespace FtEstimate.Tests.Files.Scenarios;

public class FaultTests
{
    private const string CzTime = "\ncz_time_us = 0.27";
    private const string T2 = "t2_s = { likely = 1.5, low = 1.0, high = 2.0, source = \"XY16, moves included\" }";

    [Theory]
    // spelling
    [InlineData("\ncz_loss =", "\ncz_los =", "(+0,1): machine.gates.cz_los: unknown key; did you mean cz_loss?")]
    [InlineData("[supply]", "[suply]", "(+0,2): machine.suply: unknown table; did you mean supply?")]
    [InlineData("use = ", "usee = ", "(+0,1): machine.readout.usee: unknown key; did you mean use?")]
    [InlineData("profile = \"cubic\"", "profile = \"cubik\"", "(+0,1): machine.reach.profile: expected \"cubic\", \"adiabatic-sine\" or \"bang-bang\", found the text \"cubik\"; did you mean \"cubic\"?")]
    [InlineData("t1_s = 119", "cz_error = 119", "(+0,1): machine.coherence.cz_error: unknown key; it belongs to machine.gates")]
    [InlineData("distance_um = 100", "distance_um = 100\nshelve_error = 1e-3", "(+1,1): machine.readout.apart.shelve_error: this key goes with kind = \"shelved\"")]
    // units
    [InlineData(CzTime, "\ncz_time_ns = 270", "(+0,1): machine.gates.cz_time_ns: unknown key; the unit is part of the key: did you mean cz_time_us = 0.27?")]
    [InlineData(CzTime, "\ncz_time = 0.27", "(+0,1): machine.gates.cz_time: unknown key; keys carry their unit: did you mean cz_time_us?")]
    [InlineData("\nsignal_counts_per_ms = 100\n", "\nsignal_counts_per_s = 1e5\n", "(+0,1): machine.detection.signal_counts_per_s: unknown key; the unit is part of the key: did you mean signal_counts_per_ms = 100?")]
    // types and bounds
    [InlineData(CzTime, "\ncz_time_us = \"0.27\"", "(+0,1): machine.gates.cz_time_us: expected a number greater than 0, found the text \"0.27\"")]
    [InlineData(CzTime, "\ncz_time_us = true", "(+0,1): machine.gates.cz_time_us: expected a number greater than 0, found true")]
    [InlineData(CzTime, "\ncz_time_us = [1, 2]", "(+0,1): machine.gates.cz_time_us: expected a number greater than 0, found a list")]
    [InlineData(CzTime, "\ncz_time_us = 2026-01-01", "(+0,1): machine.gates.cz_time_us: expected a number greater than 0, found a date or time")]
    [InlineData(CzTime, "\ncz_time_us = nan", "(+0,1): machine.gates.cz_time_us: expected a number greater than 0, found NaN")]
    [InlineData(CzTime, "\ncz_time_us = inf", "(+0,1): machine.gates.cz_time_us: expected a number greater than 0, found Infinity")]
    [InlineData(CzTime, "\ncz_time_us = 1e400", "(+0,1): machine.gates.cz_time_us: expected a number greater than 0, found Infinity")]
    [InlineData(CzTime, "\ncz_time_us = -1", "(+0,1): machine.gates.cz_time_us: expected a number greater than 0, found -1")]
    [InlineData("reset_error = 1e-3", "reset_error = 1.5", "(+0,1): machine.gates.reset_error: expected a number between 0 and 0.5, found 1.5")]
    [InlineData("banks = 2", "banks = 1.5", "(+0,1): machine.readout.second-one.banks: expected a whole number between 1 and 2, found 1.5")]
    [InlineData("name = \"Brindle Fell, 2026 bench\"", "name = 5", "(+0,1): machine.name: expected a text in quotes, found 5")]
    [InlineData("moved_at_once = 2000", "moved_at_once = 0.5", "(+0,1): machine.reach.moved_at_once: expected a number of at least 1, found 0.5")]
    [InlineData("[supply]", "supply = 5\n[control.x]", "(+0,1): machine.control.supply: unknown key; known here are decode_us_per_round, feed_forward_us|(+1,10): machine.control.x: unknown table; known here are decode_us_per_round, feed_forward_us")]
    // ranges
    [InlineData(T2, "t2_s = { likely = 1.5, low = 1.6, high = 2.0 }", "(+0,1): machine.coherence.t2_s: expected low ≤ likely ≤ high")]
    [InlineData(T2, "t2_s = { likely = 1.5, low = 1.0 }", "(+0,1): machine.coherence.t2_s: low and high go together (10th and 90th percentile)")]
    [InlineData(T2, "t2_s = { low = 1.0, high = 2.0 }", "(+0,1): machine.coherence.t2_s: missing likely in the table of this key; expected a number greater than 0")]
    [InlineData(T2, "t2_s = { likly = 1.5 }", "(+0,10): machine.coherence.t2_s: unknown part likly; did you mean likely?")]
    [InlineData(T2, "t2_s = { likely = 1.5, low = 1, high = \"2\" }", "(+0,33): machine.coherence.t2_s: expected a number greater than 0, found the text \"2\"")]
    [InlineData(T2, "t2_s = { likely = 1.5, source = 5 }", "(+0,24): machine.coherence.t2_s: expected a text in quotes as source, found 5")]
    [InlineData("echo_pulses_per_round = 2", "echo_pulses_per_round = { likely = 2, low = 0, high = 3 }", "(+0,39): machine.coherence.echo_pulses_per_round: the low end of a range must be greater than 0")]
    [InlineData("banks = 2", "banks = { likely = 2, low = 1, high = 2 }", "(+0,23): machine.readout.second-one.banks: this key takes no range")]
    // missing
    [InlineData(CzTime, "", "(-3,2): machine.gates.cz_time_us: missing key; expected a number greater than 0 (Duration of a CZ pulse.)")]
    [InlineData("kind = \"in_place\"", "", "(-1,10): machine.readout.bare.kind: missing key; expected \"shelved\", \"second_species\", \"moved_apart\" or \"in_place\" (How the data atoms are kept from the light.)")]
    [InlineData("[control]\ndecode_us_per_round = 50\nfeed_forward_us = 100", "", "(1,1): machine.control: missing table: Decoding and feed-forward.")]
    // syntax
    [InlineData(CzTime, "\ncz_time_us = 0.27 us", "(+0,19): one key or table per line; nothing more was expected here")]
    [InlineData(CzTime, "\ncz_time_us 0.27", "(+0,12): expected = after cz_time_us")]
    [InlineData(CzTime, "\ncz_time_us = ", "(+0,14): expected a value before the end of the line")]
    [InlineData(CzTime, "\ncz_time_us = abc", "(+0,14): unexpected abc; texts stand in quotes, numbers look like 0.5 or 5e-3")]
    [InlineData(CzTime, "\ncz_time_us = 0.27\ncz_time_us = 0.28", "(+1,1): cz_time_us: duplicate key: cz_time_us stands already on line 13")]
    [InlineData("[supply]", "[gates]", "(+0,2): gates: the table gates stands already on line 10|(+1,1)|(+2,1)")]
    [InlineData("profile = \"cubic\"", "profile = \"cubic", "(+0,11): the text has no closing quote on its line")]
    [InlineData("moved_at_once = 2000", "moved_at_once = 99999999999999999999", "(+0,17): the whole number is too long; write it as a decimal such as 1e20")]
    [InlineData("moved_at_once = 2000", "moved_at_once = [1, 2", "(+1,1): expected , or ] in the list")]
    [InlineData("[supply]", "[supply", "(+0,8): expected ] after the name of the table")]
    public void Each_fault_says_where_it_is_and_what_was_expected(string old, string changed, string expected)
    {

        string[] faults = Reading.FaultsOfMachine(old, changed);

        int line = 1 + SampleFiles.Machine[..(SampleFiles.Machine.IndexOf(old, StringComparison.Ordinal) + (old.StartsWith('\n') ? 1 : 0))].Count(letter => letter == '\n');
        string[] starts = [.. expected.Split('|').Select(start => "machines/brindle-fell.toml" + WithLine(start, line))];
        Assert.Equal(starts, faults.Zip(starts, (fault, start) => fault[..Math.Min(fault.Length, start.Length)]).Concat(faults.Skip(starts.Length)));
    }

    // "(+1,5)": one line below the changed text
    private static string WithLine(string start, int line) =>
        start[1] is '+' or '-'
            ? FormattableString.Invariant($"({line + int.Parse(start[1..start.IndexOf(',', StringComparison.Ordinal)], CultureInfo.InvariantCulture)}{start[start.IndexOf(',', StringComparison.Ordinal)..]}")
            : start;

    [Fact]
    public void All_faults_of_all_files_come_at_once_and_in_order()
    {
        string scenario = SampleFiles.Scenario
            .Replace("prefer = \"least-atom-hours\"", "prefer = \"cheapest\"", StringComparison.Ordinal)
            .Replace("title = ", "titel = ", StringComparison.Ordinal);
        string machine = SampleFiles.Machine
            .Replace("\ncz_loss =", "\ncz_los =", StringComparison.Ordinal)
            .Replace("t1_s = 119", "t1_s = = 119", StringComparison.Ordinal)
            .Replace("feed_forward_us = 100", "feed_forward_us = -100", StringComparison.Ordinal);
        string workload = SampleFiles.Workload.Replace("columns = 10\n", "", StringComparison.Ordinal);

        ScenarioReading reading = Reading.Of(scenario, machine, workload, "machine.gates.cz_eror=1");

        Assert.Null(reading.Scenario);
        Assert.Equal(
            [
                "s.toml(1,1): titel: unknown key; did you mean title?",
                "s.toml(7,1): goal.prefer: expected \"least-atom-hours\", \"fewest-atoms\" or \"shortest-run\", found the text \"cheapest\"",
                "machines/brindle-fell.toml(12,1): machine.gates.cz_los: unknown key; did you mean cz_loss?",
                "machines/brindle-fell.toml(35,8): unexpected =; texts stand in quotes, numbers look like 0.5 or 5e-3",
                "machines/brindle-fell.toml(90,1): machine.control.feed_forward_us: expected a number of at least 0, found -100",
                "workloads/spin-lattice.toml(3,2): workload.generate.columns: missing key; expected a whole number between 1 and 10000 (Columns of the lattice.)",
                "--set: machine.gates.cz_eror: unknown key; did you mean cz_error?",
            ],
            Reading.Faults(reading));
    }

    [Fact]
    public void Several_faults_of_syntax_are_found_in_one_go()
    {
        string scenario = "title = \"x\nmachine = \n[goal\nfailure_probability = 0,05\nprefer = shortest-run\n";

        Assert.Equal(
            ["s.toml(1,9)", "s.toml(2,11)", "s.toml(3,6)", "s.toml(4,24)", "s.toml(5,10)"],
            Reading.Faults(Reading.Of(scenario)).Select(fault => fault[..fault.IndexOf(':', StringComparison.Ordinal)]));
    }

    [Fact]
    public void A_missing_machine_file_is_reported_where_it_is_named()
    {
        string scenario = Reading.Changed(SampleFiles.Scenario, "machines/brindle-fell.toml", "machines/nowhere.toml");

        Assert.Equal(["s.toml(2,1): machine: machines/nowhere.toml: no such file"], Reading.Faults(Reading.Of(scenario)));
    }

    [Fact]
    public void A_scenario_cannot_be_its_own_machine()
    {
        string scenario = Reading.Changed(SampleFiles.Scenario, "machines/brindle-fell.toml", "./machines/../s.toml");

        Assert.Equal(
            ["s.toml(2,1): machine: ./machines/../s.toml names a file that is already read here; expected a file of its own for the machine"],
            Reading.Faults(Reading.Of(scenario)));
    }

    [Fact]
    public void A_machine_file_cannot_name_another_machine()
    {
        string machine = "machine = \"brindle-fell.toml\"\n" + SampleFiles.Machine;

        Assert.Equal(
            ["machines/brindle-fell.toml(1,1): machine.machine: only a scenario names a machine; this is the file of a machine"],
            Reading.Faults(Reading.Of(machine: machine)));
    }

    [Fact]
    public void A_machine_that_is_no_path_is_a_fault()
    {
        string scenario = Reading.Changed(SampleFiles.Scenario, "\"machines/brindle-fell.toml\"", "5");

        Assert.Equal(
            ["s.toml(2,1): machine: expected the path of a file in quotes, or a table, found 5"],
            Reading.Faults(Reading.Of(scenario)));
    }

    [Fact]
    public void Deep_nesting_is_a_fault_and_no_crash()
    {
        string scenario = $"title = {new string('[', 100_000)}\n{string.Join('.', Enumerable.Repeat("a", 50_000))} = 1\n";

        Assert.Equal(
            ["values are nested too deeply", "tables are nested too deeply"],
            Reading.Of(scenario).Faults.Select(fault => fault.Message));
    }

    [Fact]
    public void A_file_of_thousands_of_wrong_keys_gets_a_bounded_answer()
    {
        string scenario = string.Concat(Enumerable.Range(0, 50_000).Select(i => $"key_{i} = {i}\n"));

        Assert.Equal(200, Reading.Of(scenario).Faults.Length);
    }
}
