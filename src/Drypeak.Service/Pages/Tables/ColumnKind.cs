namespace Drypeak.Service.Pages.Tables;

/// <summary>What a column's cells are, which decides the units that its header may name.</summary>
public enum Measure
{
    Text,
    Mass,
    TinMass,
    Volume,
    Length,
    Density,
    Percent,
    Ratio,
}

/// <summary>A column that the table of specimens may have.</summary>
/// <param name="Heading">Its name in the trade's words.</param>
/// <param name="Measure">What its cells are.</param>
/// <param name="Member">Where its cells go in a specimen of the request; <c>{tin}</c> stands for the number of the tin, from 0.</param>
public sealed record ColumnKind(string Heading, Measure Measure, string Member)
{
    public static readonly ColumnKind Specimen = new("Specimen", Measure.Text, "label");
    public static readonly ColumnKind MoldAndWetSoil = new("Mold + wet soil", Measure.Mass, "moldAndWetSoil");
    public static readonly ColumnKind MoldMass = new("Mold", Measure.Mass, "mold/mass");
    public static readonly ColumnKind MoldVolume = new("Mold volume", Measure.Volume, "mold/volume");
    public static readonly ColumnKind DepthBelowRim = new("Depth below the rim", Measure.Length, "depthBelowRim");
    public static readonly ColumnKind WetMass = new("Wet mass", Measure.Mass, "wetMass");
    public static readonly ColumnKind WetDensity = new("Wet density", Measure.Density, "wetDensity");
    public static readonly ColumnKind DryDensity = new("Dry density", Measure.Density, "dryDensity");
    public static readonly ColumnKind WaterContent = new("Water content", Measure.Percent, "waterContent");
    public static readonly ColumnKind WetBasis = new("Water content on wet mass", Measure.Percent, "wetBasis");
    public static readonly ColumnKind Tin = new("Tin", Measure.TinMass, "tins/{tin}/tin");
    public static readonly ColumnKind TinAndWet = new("Tin + wet soil", Measure.TinMass, "tins/{tin}/wet");
    public static readonly ColumnKind TinAndDry = new("Tin + dry soil", Measure.TinMass, "tins/{tin}/dry");
    public static readonly ColumnKind SetAside = new("Set aside", Measure.Text, "setAside");

    public static IReadOnlyList<ColumnKind> All { get; } =
    [
        Specimen, MoldAndWetSoil, MoldMass, MoldVolume, DepthBelowRim, WetMass, WetDensity, DryDensity, WaterContent, WetBasis, Tin, TinAndWet, TinAndDry, SetAside,
    ];

    /// <summary>Whether a specimen may have several of it.</summary>
    public bool OfTin => Measure == Measure.TinMass;
}

/// <summary>A column of a table that was read.</summary>
/// <param name="Kind">What it holds.</param>
/// <param name="Tin">Number of the tin, from 0; 0 for other columns.</param>
/// <param name="Unit">Code of the unit that the header names, or null: then the unit is the form's.</param>
public sealed record Column(ColumnKind Kind, int Tin = 0, string? Unit = null)
{
    /// <summary>Its heading, with the number of the tin from the second on.</summary>
    public string Heading => Tin == 0 ? Kind.Heading : Kind.Heading.Replace("Tin", $"Tin {Tin + 1}", StringComparison.Ordinal);
}
