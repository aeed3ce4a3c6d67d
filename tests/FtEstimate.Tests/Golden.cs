using FtEstimate.Tests.Files;

namespace FtEstimate.Tests;

/// <summary>Compares an output with a file kept in the repository; UPDATE_GOLDEN=1 rewrites the files.</summary>
internal static class Golden
{
    private static readonly string Folder = RepositoryFiles.At("tests", "FtEstimate.Tests", "Golden");

    public static void Match(string actual, string name)
    {
        string path = Path.Combine(Folder, name);
        actual = actual.ReplaceLineEndings("\n");
        if (RepositoryFiles.AreRenewed)
        {
            File.WriteAllText(path, actual);
            return;
        }

        string expected = File.Exists(path) ? File.ReadAllText(path).ReplaceLineEndings("\n") : "";
        Assert.Equal(expected, actual);
    }
}
