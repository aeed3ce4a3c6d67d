using FtEstimate.Files;

namespace FtEstimate.Tests.Files;

public class AtomicFileTests
{
    [Fact]
    public void A_new_file_holds_the_text_in_utf8_without_a_mark()
    {
        using TemporaryFolder folder = new();
        string path = folder.At("report.md");

        Assert.Null(AtomicFile.Write(path, "Λ = 3\n"));

        Assert.Equal("Λ = 3\n"u8.ToArray(), File.ReadAllBytes(path));
    }

    [Fact]
    public void An_existing_file_is_replaced_and_nothing_is_left_beside_it()
    {
        using TemporaryFolder folder = new();
        string path = folder.Write("report.md", "old and much longer");

        Assert.Null(AtomicFile.Write(path, "new"));

        Assert.Equal("new", File.ReadAllText(path));
        Assert.Equal([path], Directory.GetFileSystemEntries(folder.Root));
    }

    [Fact]
    public void A_missing_folder_is_a_fault()
    {
        using TemporaryFolder folder = new();
        string path = folder.At("nowhere/report.md");

        Assert.Equal($"{path}: cannot be written: its folder does not exist", AtomicFile.Write(path, "x")!.ToString());
    }

    [Fact]
    public void A_folder_in_the_way_is_a_fault_and_stays()
    {
        using TemporaryFolder folder = new();

        Assert.Equal($"{folder.Root}: cannot be written: it is a folder", AtomicFile.Write(folder.Root, "x")!.ToString());
        Assert.Empty(Directory.GetFileSystemEntries(folder.Root));
    }

    [Theory]
    [InlineData("")]
    [InlineData("a\0b")]
    public void A_name_that_is_no_path_is_a_fault(string path) => Assert.NotNull(AtomicFile.Write(path, "x"));

    [Fact]
    public void A_link_stays_a_link_and_permissions_stay()
    {
        if (OperatingSystem.IsWindows())
        {
            return;
        }

        using TemporaryFolder folder = new();
        string target = folder.Write("target.md", "old");
        File.SetUnixFileMode(target, UnixFileMode.UserRead | UnixFileMode.UserWrite | UnixFileMode.GroupRead);
        File.CreateSymbolicLink(folder.At("link.md"), target);

        Assert.Null(AtomicFile.Write(folder.At("link.md"), "new"));

        Assert.Equal("new", File.ReadAllText(target));
        Assert.Equal(target, new FileInfo(folder.At("link.md")).LinkTarget);
        Assert.Equal(UnixFileMode.UserRead | UnixFileMode.UserWrite | UnixFileMode.GroupRead, File.GetUnixFileMode(target));
    }

    [Fact]
    public void A_device_is_written_to_and_not_replaced()
    {
        if (File.Exists("/dev/null"))
        {
            Assert.Null(AtomicFile.Write("/dev/null", "x"));
            Assert.Equal("", File.ReadAllText("/dev/null"));
        }
    }
}
