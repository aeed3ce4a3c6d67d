using System.Diagnostics;
using System.Text;
using FtEstimate.Files;
using FtEstimate.Files.Scenarios;

namespace FtEstimate.Tests.Files;

public class InputTextTests
{
    [Fact]
    public void A_missing_file_is_a_fault() => Assert.Equal("nowhere.toml: no such file", FaultOf("nowhere.toml"));

    [Fact]
    public void A_name_that_is_no_path_is_a_fault() => Assert.EndsWith("this is not a file name", FaultOf("a\0b.toml"), StringComparison.Ordinal);

    [Fact]
    public void A_folder_is_a_fault()
    {
        using TemporaryFolder folder = new();

        Assert.EndsWith(": this is a folder, not a file", FaultOf(folder.Root), StringComparison.Ordinal);
    }

    public static TheoryData<byte[], string> BadContents => new()
    {
        { [], ": the file is empty" },
        { Encoding.UTF8.GetBytes(" \n\t\n"), ": the file is empty" },
        { [0x7F, (byte)'E', (byte)'L', (byte)'F', 0, 1, 2], ": this is a binary file; expected TOML text" },
        { Encoding.Unicode.GetPreamble().Concat(Encoding.Unicode.GetBytes("title = \"x\"")).ToArray(), ": the file is encoded as UTF-16; expected UTF-8" },
        { [.. "title = \"a\"\n# caf"u8, 0xE9, .. "\n"u8], "(2,1): this line is not encoded as UTF-8" },
    };

    [Theory]
    [MemberData(nameof(BadContents))]
    public void Contents_that_are_no_text_are_one_fault(byte[] content, string expected)
    {
        using TemporaryFolder folder = new();

        Assert.EndsWith(expected, FaultOf(folder.Write("s.toml", content)), StringComparison.Ordinal);
    }

    [Fact]
    public void A_large_file_is_refused_without_reading_it()
    {
        using TemporaryFolder folder = new();
        string path = folder.Write("s.toml", new byte[(1 << 20) + 1]);
        Stopwatch watch = Stopwatch.StartNew();

        Assert.EndsWith(": the file is larger than 1 MiB; input files are short texts", FaultOf(path), StringComparison.Ordinal);

        // parsing a megabyte takes far longer than this
        Assert.True(watch.ElapsedMilliseconds < 500);
    }

    [Fact]
    public void A_file_that_never_ends_is_refused()
    {
        if (File.Exists("/dev/zero"))
        {
            Assert.Contains("larger than 1 MiB", FaultOf("/dev/zero"), StringComparison.Ordinal);
        }
    }

    [Fact]
    public void A_file_without_permission_is_a_fault()
    {
        using TemporaryFolder folder = new();
        string path = folder.Write("s.toml", "title = \"x\"");
        // the superuser may read everything
        if (OperatingSystem.IsWindows() || Environment.IsPrivilegedProcess)
        {
            return;
        }

        File.SetUnixFileMode(path, UnixFileMode.None);
        Assert.EndsWith(": the file cannot be read: permission denied", FaultOf(path), StringComparison.Ordinal);
    }

    private static string FaultOf(string path) => Assert.Single(ScenarioReader.Read(path, []).Faults).ToString();
}
