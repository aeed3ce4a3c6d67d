namespace FtEstimate.Tests;

/// <summary>Compares an output with a file kept in the repository; UPDATE_GOLDEN=1 rewrites the files.</summary>
internal static class Golden
{
    private static readonly string Folder = Path.Combine(FindRoot(), "tests", "FtEstimate.Tests", "Golden");

    public static void Match(string actual, string name)
    {
        string path = Path.Combine(Folder, name);
        actual = actual.ReplaceLineEndings("\n");
        if (Environment.GetEnvironmentVariable("UPDATE_GOLDEN") == "1")
        {
            File.WriteAllText(path, actual);
            return;
        }

        string expected = File.Exists(path) ? File.ReadAllText(path).ReplaceLineEndings("\n") : "";
        Assert.Equal(expected, actual);
    }

    private static string FindRoot()
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "FtEstimate.sln")))
        {
            folder = folder.Parent;
        }

        return folder?.FullName ?? throw new InvalidOperationException("repository root not found above the test binaries");
    }
}
