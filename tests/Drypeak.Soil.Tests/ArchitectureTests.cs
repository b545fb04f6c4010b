using System.Text.RegularExpressions;
using System.Xml.Linq;
using Drypeak.Soil.Laboratory;
using Xunit;

namespace Drypeak.Soil.Tests;

/// <summary>
/// The arrows of the house: Service knows Figures, Figures knows Soil, never back. Inside Soil, Quantities and Phases know nobody (Phases
/// speaks in quantities), and Curves does not know Laboratory.
/// </summary>
public partial class ArchitectureTests
{
    private static readonly string[] Parts =
        ["Quantities", "Phases", "TestMethods", "Laboratory", "Curves", "FieldDensity", "References", "Acceptance", "Earthwork"];

    [Fact]
    public void The_domain_refers_to_no_web_no_drawing_and_no_other_project()
    {
        var references = typeof(MoistureDensity).Assembly.GetReferencedAssemblies().Select(assembly => assembly.Name!).ToList();
        Assert.NotEmpty(references);
        Assert.All(references, name => Assert.True(
            name.StartsWith("System", StringComparison.Ordinal) || name.StartsWith("MathNet", StringComparison.Ordinal) || name == "netstandard",
            $"Drypeak.Soil refers to {name}."));
    }

    [Theory]
    [InlineData("Drypeak.Soil", "")]
    [InlineData("Drypeak.Figures", "Drypeak.Soil")]
    [InlineData("Drypeak.Service", "Drypeak.Figures Drypeak.Soil")]
    public void A_project_refers_to_those_below_it_only(string project, string allowed)
    {
        var referred = ProjectFile(project).Descendants("ProjectReference")
            .Select(reference => Path.GetFileNameWithoutExtension(reference.Attribute("Include")!.Value.Replace('\\', '/')));
        Assert.Subset(allowed.Split(' ').ToHashSet(), referred.ToHashSet());
    }

    [Theory]
    [InlineData("Drypeak.Soil")]
    [InlineData("Drypeak.Figures")]
    public void Domain_and_figures_are_plain_libraries_that_bring_no_web_framework(string project)
    {
        var file = ProjectFile(project);
        Assert.Equal("Microsoft.NET.Sdk", file.Root!.Attribute("Sdk")!.Value);
        Assert.Empty(file.Descendants("FrameworkReference"));
        Assert.DoesNotContain(file.Descendants("PackageReference"), package => package.Attribute("Include")!.Value.Contains("AspNetCore", StringComparison.Ordinal));
        Assert.All(Sources("src", project), source => Assert.DoesNotContain("Microsoft.AspNetCore", File.ReadAllText(source), StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("Quantities", "")]
    [InlineData("Phases", "Quantities")]
    [InlineData("TestMethods", "Quantities")]
    public void A_part_of_the_domain_knows_only(string part, string allowed) =>
        Assert.All(Sources("src", "Drypeak.Soil", part), source =>
            Assert.Subset($"{part} {allowed}".Split(' ').ToHashSet(), PartsKnownTo(File.ReadAllText(source))));

    [Fact]
    public void The_curves_do_not_know_the_laboratory() =>
        Assert.All(Sources("src", "Drypeak.Soil", "Curves"), source =>
            Assert.DoesNotContain("Laboratory", PartsKnownTo(File.ReadAllText(source))));

    [Theory]
    [InlineData("using Drypeak.Soil.Laboratory;", "Laboratory")]
    [InlineData("using Drypeak.Soil.Laboratory.Review;", "Laboratory")]
    [InlineData("var specimen = new Laboratory.Specimen();", "Laboratory")]
    [InlineData("var specimen = new global::Drypeak.Soil.Laboratory.Specimen();", "Laboratory")]
    [InlineData("using static Drypeak.Soil.Phases.PhaseRelations;", "Phases")]
    [InlineData("// as in Laboratory.Specimen", null)]
    [InlineData("/// <see cref=\"Laboratory.Specimen\"/>", null)]
    [InlineData("var sum = result.Curves.Count;", null)]
    public void What_a_source_knows_is_read_from_its_code(string code, string? known) =>
        Assert.Equal(known is null ? [] : [known], PartsKnownTo(code));

    /// <summary>The parts of the domain that a source names, by a using or by a qualified name.</summary>
    private static HashSet<string> PartsKnownTo(string source)
    {
        var code = Comment().Replace(source, "");
        return [.. Parts.Where(part => Regex.IsMatch(code, $@"(?:Drypeak\.Soil\.|(?<![\w.])){part}(?:\.[A-Z]|;)"))];
    }

    private static XDocument ProjectFile(string project) => XDocument.Load(Repository.At("src", project, project + ".csproj"));

    private static string[] Sources(params string[] folder)
    {
        string[] sources =
        [
            .. Directory.EnumerateFiles(Repository.At(folder), "*.cs", SearchOption.AllDirectories)
                .Where(path => !path.Contains($"{Path.DirectorySeparatorChar}obj{Path.DirectorySeparatorChar}", StringComparison.Ordinal)),
        ];
        Assert.NotEmpty(sources);
        return sources;
    }

    [GeneratedRegex(@"//.*$", RegexOptions.Multiline)]
    private static partial Regex Comment();
}
