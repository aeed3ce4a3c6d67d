using System.Reflection;
using System.Runtime.CompilerServices;
using System.Text.RegularExpressions;
using FtEstimate.Sizing;

namespace FtEstimate.Tests.Architecture;

/// <summary>The models are functions of what they are given: no files, no console, no clock, no state that outlives a call.</summary>
public sealed class ModelPurityTests
{
    private static readonly Type[] Types =
        [.. typeof(MachineSizing).Assembly.GetTypes().Where(type => type.GetCustomAttribute<CompilerGeneratedAttribute>() is null)];

    [Fact]
    public void No_file_console_clock_environment_or_random_number_is_named() => Assert.All(SourceFiles.OfTheModels, file =>
        Assert.DoesNotMatch(
            @"System\.IO|\b(File|Directory|Console|Environment|DateTime|DateTimeOffset|Stopwatch|Process)\.[A-Z]|new Random\b|Random\.Shared|Guid\.NewGuid",
            file.Text));

    [Fact]
    public void No_static_field_can_be_changed() => Assert.All(
        Types.SelectMany(type => type.GetFields(BindingFlags.DeclaredOnly | BindingFlags.Static | BindingFlags.Public | BindingFlags.NonPublic)),
        field => Assert.True(
            field.IsInitOnly || field.IsLiteral || field.GetCustomAttribute<CompilerGeneratedAttribute>() is not null && !field.Name.Contains("k__BackingField", StringComparison.Ordinal),
            $"{field.DeclaringType}.{field.Name}"));

    [Fact]
    public void No_static_property_can_be_set() => Assert.All(
        Types.SelectMany(type => type.GetProperties(BindingFlags.DeclaredOnly | BindingFlags.Static | BindingFlags.Public | BindingFlags.NonPublic)),
        property => Assert.False(property.CanWrite, $"{property.DeclaringType}.{property.Name}"));

    [Fact]
    public void Public_records_and_classes_are_sealed_static_or_abstract() => Assert.All(
        Types.Where(type => type.IsPublic && type.IsClass),
        type => Assert.True(type.IsSealed || type.IsAbstract, type.FullName));

    [Fact]
    public void Public_records_and_classes_cannot_be_changed_once_made() => Assert.All(
        Types.Where(type => type.IsPublic).SelectMany(type => type.GetProperties(BindingFlags.DeclaredOnly | BindingFlags.Instance | BindingFlags.Public)),
        property => Assert.True(property.SetMethod is not { IsPublic: true } || IsInitOnly(property), $"{property.DeclaringType}.{property.Name}"));

    [Fact]
    public void Numbers_are_written_only_with_a_stated_culture() => Assert.All(SourceFiles.OfTheModels, file =>
        Assert.DoesNotMatch(@"\.ToString\(""[^""]*""\)|double\.Parse\([^,)]*\)", Regex.Replace(file.Text, @"\s+", " ")));

    private static bool IsInitOnly(PropertyInfo property) =>
        property.SetMethod!.ReturnParameter.GetRequiredCustomModifiers().Contains(typeof(IsExternalInit));
}
