using System.Collections.Immutable;
using System.Globalization;
using FtEstimate.Noise;
using FtEstimate.Simulation.Calibration;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;

namespace FtEstimate.Files.Calibration;

/// <summary>The table of calibration results: one line per experiment with all its rates, its seed, its shots and failures.</summary>
public static class CalibrationTable
{
    /// <summary>Name of the file.</summary>
    public const string FileName = "simulated-cells.csv";

    /// <summary>The first line.</summary>
    public const string Header =
        "mix,uniform,cz,gate_on_data,waiting_x,waiting_y,waiting_z,data_x,data_y,data_z,check_outside,check_between,flip,reset,"
        + "data_loss,data_told,check_loss,check_told,looks,distance,basis,seed,shots,failures,simulator";

    /// <summary>One line.</summary>
    public static string Line(CalibrationResult result)
    {
        RoundErrors e = result.Cell.Errors;
        return string.Join(',',
        [
            result.Cell.Mix,
            .. new[]
            {
                result.Cell.UniformError, e.CzGate, e.GateOnData, e.WaitingInLayer.X, e.WaitingInLayer.Y, e.WaitingInLayer.Z, e.OnData.X, e.OnData.Y, e.OnData.Z,
                e.OnCheckOutsideLayers.Total, e.OnCheckBetweenLayers.Total, e.CheckFlip, e.CheckReset, e.DataLossPerSlot,
            }.Select(Number),
            Flag(e.DataLossTold), Number(e.CheckLossPerSlot), Flag(e.CheckLossTold), Number(e.RoundsBetweenLooks), Number(result.Cell.Distance),
            result.Cell.Basis.ToString(), result.Seed.ToString(CultureInfo.InvariantCulture), Number(result.Count.Shots), Number(result.Count.Failures),
            Number(MemoryRun.Version),
        ]);
    }

    /// <summary>Reads a file; none there: no results. Its lines must be the first experiments of the grid.</summary>
    public static CalibrationReading ReadFile(string path)
    {
        if (!File.Exists(path))
        {
            return new CalibrationReading([], []);
        }

        try
        {
            string[] lines = File.ReadAllLines(path);
            if (lines is [] || lines[0] != Header)
            {
                return Wrong(path, 1, "is not the first line of a table of calibration results");
            }

            ImmutableArray<CalibrationResult> results = Read(lines);
            for (int index = 0; index < results.Length; index++)
            {
                if (index >= CalibrationGrid.Cells.Length || Line(results[index] with { Count = default }) != Line(new CalibrationResult(CalibrationGrid.Cells[index], (ulong)index + 1, default)))
                {
                    return Wrong(path, index + 2, "is not an experiment of this version's grid at this place; remove the file to start anew");
                }
            }

            return new CalibrationReading(results, []);
        }
        catch (Exception exception) when (exception is FormatException or IOException or UnauthorizedAccessException or ArgumentException or OverflowException)
        {
            return Wrong(path, 0, "cannot be read as a table of calibration results: " + exception.Message);
        }
    }

    /// <summary>Writes the file into a folder.</summary>
    public static Fault? WriteFile(string folder, IEnumerable<CalibrationResult> results) =>
        AtomicFile.Write(Path.Combine(folder, FileName), string.Join('\n', results.Select(Line).Prepend(Header)) + "\n");

    /// <summary>Reads the lines after the first.</summary>
    /// <exception cref="FormatException">A line is not as this class writes it.</exception>
    public static ImmutableArray<CalibrationResult> Read(IEnumerable<string> lines) => [.. lines.Skip(1).Where(line => line.Length > 0).Select(Parse)];

    private static CalibrationReading Wrong(string path, int line, string message) => new([], [new Fault(path, line, 0, "", message)]);

    private static CalibrationResult Parse(string line)
    {
        string[] fields = line.Split(',');
        if (fields.Length != Header.Split(',').Length)
        {
            throw new FormatException($"a line of the calibration table has {fields.Length} fields");
        }

        double At(int index) => double.Parse(fields[index], NumberStyles.Float, CultureInfo.InvariantCulture);
        RoundErrors errors = new()
        {
            CzGate = At(2),
            GateOnData = At(3),
            WaitingInLayer = new PauliChannel(At(4), At(5), At(6)),
            OnData = new PauliChannel(At(7), At(8), At(9)),
            OnCheckOutsideLayers = PauliChannel.Depolarising(At(10)),
            OnCheckBetweenLayers = PauliChannel.Depolarising(At(11)),
            CheckFlip = At(12),
            CheckReset = At(13),
            DataLossPerSlot = At(14),
            DataLossTold = At(15) != 0,
            CheckLossPerSlot = At(16),
            CheckLossTold = At(17) != 0,
            RoundsBetweenLooks = (int)At(18),
        };
        if (At(24) != MemoryRun.Version || !(At(23) >= 0 && At(23) <= At(22) && At(22) >= 1))
        {
            throw new FormatException("a line of the calibration table comes from another version of the simulator, or has more failures than shots");
        }

        CalibrationCell cell = new(fields[0], At(1), errors, (int)At(19), Enum.Parse<PauliBasis>(fields[20]));
        return new CalibrationResult(cell, ulong.Parse(fields[21], CultureInfo.InvariantCulture), new ShotCount((long)At(22), (long)At(23)));
    }

    private static string Number(double value) => value.ToString("R", CultureInfo.InvariantCulture);

    private static string Flag(bool value) => value ? "1" : "0";
}

/// <summary>What a table of calibration results holds.</summary>
/// <param name="Results">The results.</param>
/// <param name="Faults">What is wrong with the file.</param>
public sealed record CalibrationReading(ImmutableArray<CalibrationResult> Results, ImmutableArray<Fault> Faults);
