using System.Reflection;
using System.Text.RegularExpressions;
using System.Xml.Linq;
using FtEstimate.Sizing;
using FtEstimate.Tests.Files;

namespace FtEstimate.Tests.Architecture;

/// <summary>Rooms use only rooms below them.</summary>
public sealed class RoomOrderTests
{
    private const BindingFlags Own = BindingFlags.DeclaredOnly | BindingFlags.Public | BindingFlags.NonPublic | BindingFlags.Instance | BindingFlags.Static;

    private static readonly string[] LowestFirst =
    [
        "Quantities", "Machines", "Cycles", "Noise", "SurfaceCode", "MagicStates", "Workloads", "Scenarios", "Sizing", "Planning",
    ];

    [Fact]
    public void Every_room_of_the_models_has_its_place_in_the_order()
    {
        string[] rooms = [.. Directory.GetDirectories(RepositoryFiles.At("src", "FtEstimate")).Select(Path.GetFileName)!];

        Assert.Empty(rooms.Except([.. LowestFirst, "bin", "obj"]));
    }

    [Fact]
    public void A_file_lies_in_the_room_of_its_namespace() => Assert.All(SourceFiles.OfTheModels, file =>
    {
        string room = Regex.Match(file.Text, @"^namespace FtEstimate\.([A-Za-z]+)", RegexOptions.Multiline).Groups[1].Value;
        Assert.Equal(file.Room, room);
    });

    [Fact]
    public void No_file_names_a_higher_room() => Assert.All(SourceFiles.OfTheModels, file =>
    {
        IEnumerable<string> named = Regex.Matches(file.Text, @"\bFtEstimate\.([A-Za-z]+)").Select(match => match.Groups[1].Value);
        Assert.DoesNotContain(named, room => IsHigher(room, file.Room));
    });

    // a type can also slip in without its name, through what a method gives back
    [Fact]
    public void No_type_holds_takes_or_gives_a_type_of_a_higher_room()
    {
        Type[] types = typeof(MachineSizing).Assembly.GetTypes();

        Assert.True(types.Length > 100);
        Assert.All(types, type => Assert.DoesNotContain(Used(type), used => IsHigher(RoomOf(used), RoomOf(type))));
    }

    [Theory]
    [InlineData("FtEstimate")]
    [InlineData("FtEstimate.Simulation", "FtEstimate")]
    [InlineData("FtEstimate.Files", "FtEstimate", "FtEstimate.Simulation")]
    [InlineData("FtEstimate.Reports", "FtEstimate", "FtEstimate.Simulation")]
    [InlineData("FtEstimate.Cli", "FtEstimate", "FtEstimate.Simulation", "FtEstimate.Files", "FtEstimate.Reports")]
    public void A_project_refers_only_to_projects_below_it(string project, params string[] expected)
    {
        XDocument file = XDocument.Load(RepositoryFiles.At("src", project, project + ".csproj"));
        IEnumerable<string> referred = file.Descendants("ProjectReference").Select(item => item.Attribute("Include")!.Value.Split('/', '\\')[^1]);

        Assert.Equal(expected.Select(name => name + ".csproj").ToHashSet(), referred.ToHashSet());
    }

    [Fact]
    public void The_models_need_no_package() =>
        Assert.Empty(XDocument.Load(RepositoryFiles.At("src", "FtEstimate", "FtEstimate.csproj")).Descendants("PackageReference"));

    private static bool IsHigher(string? room, string? than) => Array.IndexOf(LowestFirst, room) > Array.IndexOf(LowestFirst, than) && than is not null;

    private static string? RoomOf(Type type) =>
        type.Namespace?.StartsWith("FtEstimate.", StringComparison.Ordinal) == true ? type.Namespace.Split('.')[1] : null;

    private static IEnumerable<Type> Used(Type type)
    {
        IEnumerable<MethodBase> methods = [.. type.GetMethods(Own), .. type.GetConstructors(Own)];
        IEnumerable<Type> used =
        [
            .. type.GetInterfaces(),
            .. type.BaseType is { } parent ? [parent] : Type.EmptyTypes,
            .. type.GetFields(Own).Select(field => field.FieldType),
            .. methods.SelectMany(method => method.GetParameters()).Select(parameter => parameter.ParameterType),
            .. methods.OfType<MethodInfo>().Select(method => method.ReturnType),
            .. methods.SelectMany(method => method.GetMethodBody()?.LocalVariables ?? []).Select(local => local.LocalType),
        ];
        return used.SelectMany(Parts);
    }

    private static IEnumerable<Type> Parts(Type type) =>
        type.HasElementType ? Parts(type.GetElementType()!)
        : type.IsGenericType ? [type, .. type.GetGenericArguments().SelectMany(Parts)]
        : [type];
}
