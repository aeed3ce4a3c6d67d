using FtEstimate.Cli;
using FtEstimate.Files.Calibration;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Cli;

public sealed class CalibrateCommandTests
{
    private static readonly string[] Committed = File.ReadAllLines(RepositoryFiles.At("src", "FtEstimate", "Noise", CalibrationTable.FileName));

    [Fact]
    public async Task A_complete_table_is_only_fitted()
    {
        string folder = Directory.CreateTempSubdirectory().FullName;
        File.WriteAllLines(Path.Combine(folder, CalibrationTable.FileName), Committed);

        CommandRun run = await CommandRun.Of("calibrate", folder);

        Assert.Equal(ExitStatus.Answer, run.Status);
        Assert.StartsWith("name,value,standard_error\nPrefactor,", File.ReadAllText(Path.Combine(folder, FittedLawFile.FileName)), StringComparison.Ordinal);
        Directory.Delete(folder, recursive: true);
    }

    public static TheoryData<string> Damages => ["a line of another grid", "a line cut short", "a number that is none"];

    [Theory]
    [MemberData(nameof(Damages))]
    public async Task A_damaged_table_is_refused_and_left_alone(string damage)
    {
        string[] lines = [.. Committed];
        lines[3] = damage switch
        {
            "a line of another grid" => lines[3].Replace(",3,X,", ",5,X,", StringComparison.Ordinal).Replace(",3,Z,", ",5,Z,", StringComparison.Ordinal),
            "a line cut short" => lines[3][..20],
            _ => lines[3][..lines[3].LastIndexOf(',')] + ",many",
        };
        string folder = Directory.CreateTempSubdirectory().FullName;
        string path = Path.Combine(folder, CalibrationTable.FileName);
        File.WriteAllLines(path, lines);

        CommandRun run = await CommandRun.Of("calibrate", folder);

        Assert.Equal(ExitStatus.WrongInput, run.Status);
        Assert.Contains(CalibrationTable.FileName, run.Error, StringComparison.Ordinal);
        Assert.Equal(lines, File.ReadAllLines(path));
        Assert.False(File.Exists(Path.Combine(folder, FittedLawFile.FileName)));
        Directory.Delete(folder, recursive: true);
    }
}
