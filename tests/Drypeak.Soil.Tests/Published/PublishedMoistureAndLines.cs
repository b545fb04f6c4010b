using System.Globalization;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;
using Xunit;
using static Drypeak.Soil.Tests.Published.Digits;
using static Drypeak.Soil.Tests.Published.PublishedFile;

namespace Drypeak.Soil.Tests.Published;

/// <summary>Published water contents, zero-air-voids lines and the density of water.</summary>
public class PublishedMoistureAndLines
{
    /// <summary>University laboratory data sheet, three tins.</summary>
    [Fact]
    public void M1_three_tins_and_their_mean()
    {
        var entry = Entry("waterContent", "M1");
        var tins = entry.GetProperty("tins_g").Triples().Select(triple => PublishedTests.Tin(triple).WaterContent.Percent).ToArray();
        Printed(entry.Answers().Numbers("w"), tins, 1);
        Printed(entry.Answers().Number("mean"), tins.Average(), 1);
    }

    /// <summary>Soil compaction review notes, worked example 2: water of 62.4 lb/ft³.</summary>
    [Fact]
    public void Z1_the_line_in_pounds_per_cubic_foot()
    {
        var entry = Entry("zeroAirVoids", "Z1");
        var water = Density.From(entry.Number("water_lb_ft3"), DensityUnit.PoundPerCubicFoot);
        foreach (var (w, printed) in Line("Z1"))
        {
            Printed(printed, PhaseRelations.OnZeroAirVoidsLine(w, entry.Number("Gs"), water).In(DensityUnit.PoundPerCubicFoot), 1);
        }
    }

    /// <summary>Laboratory sheet of case P15: water of 1 g/cm³.</summary>
    [Fact]
    public void Z3_the_line_in_grams_per_cubic_centimeter()
    {
        var entry = Entry("zeroAirVoids", "Z3");
        var water = Density.From(entry.Number("water_g_cm3"), DensityUnit.GramPerCubicCentimeter);
        foreach (var (w, printed) in Line("Z3"))
        {
            Printed(printed, PhaseRelations.OnZeroAirVoidsLine(w, entry.Number("Gs"), water).In(DensityUnit.GramPerCubicCentimeter), 2);
        }
    }

    /// <summary>General-science table of the density of pure water, 4 to 30 °C.</summary>
    [Fact]
    public void The_density_of_water_agrees_with_the_table_to_5_grams_in_a_cubic_meter()
    {
        var table = Read("water-density.json").GetProperty("rho").EnumerateObject().ToArray();
        Assert.Equal(7, table.Length);
        Assert.All(table, row => Assert.Equal(
            row.Value.GetDouble(), WaterDensity.At(double.Parse(row.Name, CultureInfo.InvariantCulture)).KilogramsPerCubicMeter, 0.005));
    }

    private static IEnumerable<(WaterContent W, double Printed)> Line(string id) =>
        Entry("zeroAirVoids", id).Answers().EnumerateObject()
            .Select(point => (WaterContent.FromPercent(double.Parse(point.Name, CultureInfo.InvariantCulture)), point.Value.GetDouble()));
}
