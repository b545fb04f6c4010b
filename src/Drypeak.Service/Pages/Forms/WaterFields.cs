using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Pages.Forms;

/// <summary>The ways to say a water content, below any place of a request.</summary>
internal static class WaterFields
{
    /// <summary>Several tins, a line each.</summary>
    public static TableField Tins(string place) => new("tins", "Moisture tins", place,
    [
        new ColumnKind("Tin", Measure.TinMass, "tin"), new ColumnKind("Tin + wet soil", Measure.TinMass, "wet"), new ColumnKind("Tin + dry soil", Measure.TinMass, "dry"),
    ])
    {
        Lines = 3,
        Row = "Tin",
        Hint = "One or more, a line each. Their mean counts.",
    };

    /// <summary>The tester's dial, and the wet basis.</summary>
    public static IReadOnlyList<FormField> OtherWays(string place) =>
    [
        new NumberField("carbide", "Carbide tester's reading", place + "/carbide/reading") { Unit = "%", Hint = "of the wet mass" },
        new CheckField("half-sample", "Half a sample was used", place + "/carbide/halfSample") { OnlyWith = ["carbide"], Hint = "The reading then counts twice." },
        new NumberField("wet-basis", "Water content on wet mass", place + "/wetBasis") { Unit = "%" },
    ];
}
