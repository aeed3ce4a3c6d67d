using System.Text.RegularExpressions;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Architecture;

/// <summary>A source file of the models, without its comments.</summary>
internal sealed record SourceFile(string Name, string Room, string Text)
{
    public override string ToString() => Name;
}

/// <summary>The source files of the models.</summary>
internal static class SourceFiles
{
    public static IReadOnlyList<SourceFile> OfTheModels { get; } = Read();

    private static SourceFile[] Read()
    {
        string root = RepositoryFiles.At("src", "FtEstimate");
        SourceFile[] files =
        [
            .. from path in Directory.GetFiles(root, "*.cs", SearchOption.AllDirectories)
               let name = Path.GetRelativePath(root, path).Replace('\\', '/')
               let room = name.Split('/')[0]
               where room is not ("bin" or "obj")
               select new SourceFile(name, room, Regex.Replace(File.ReadAllText(path), @"^\s*///?.*$|(?<!:)//.*$", "", RegexOptions.Multiline)),
        ];
        Assert.True(files.Length > 80);
        return files;
    }
}
