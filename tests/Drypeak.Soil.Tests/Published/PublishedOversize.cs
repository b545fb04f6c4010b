using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;
using Xunit;
using static Drypeak.Soil.Tests.Published.Digits;
using static Drypeak.Soil.Tests.Published.PublishedFile;

namespace Drypeak.Soil.Tests.Published;

/// <summary>Published corrections for oversize.</summary>
public class PublishedOversize
{
    /// <summary>As case P02: Smith and Smith, Elements of Soil Mechanics (attribution not certain).</summary>
    [Fact]
    public void O2_dry_oversize_of_10_percent()
    {
        var entry = Entry("oversize", "O2");
        var total = OversizeCorrection.ToTotal(
            new DensityAndWater(Density.From(entry.Number("dryF"), DensityUnit.MegagramPerCubicMeter), WaterContent.FromPercent(entry.Number("wF"))),
            entry.Number("PC") / 100,
            entry.Number("Gc"),
            WaterContent.FromPercent(entry.Number("wC")),
            Density.From(entry.Number("rho_w"), DensityUnit.MegagramPerCubicMeter));
        var (dry, w) = (total.DryDensity.In(DensityUnit.MegagramPerCubicMeter), total.WaterContent.Percent);
        Printed(entry.Answers().Number("dryT"), dry, 2);
        Printed(entry.Answers().Number("wT"), w, 0);
        Printed(entry.GetProperty("exact").Number("dryT"), dry, 4);
        Assert.Equal(entry.GetProperty("exact").Number("wT"), w, 1e-12);
    }

    /// <summary>North Dakota Department of Transportation field manual, T 224, rev. 16 June 2011, p. 1-2. It prints water contents only; the density here is any.</summary>
    [Fact]
    public void O3_water_contents_mix_by_dry_mass()
    {
        var entry = Entry("oversize", "O3");
        var total = OversizeCorrection.ToTotal(
            new DensityAndWater(new Density(1900), WaterContent.FromPercent(entry.Number("wF"))),
            entry.Number("PC") / 100,
            2.65,
            WaterContent.FromPercent(entry.Number("wC")),
            new Density(1000));
        Printed(entry.Answers().Number("wT"), total.WaterContent.Percent, 1);
    }

    /// <summary>FROM MEMORY, not read: western states field operating procedure for T 99/T 180, annex A; water of 62.4 lb/ft³.</summary>
    [Fact]
    public void O4_from_memory_27_percent_in_pounds_per_cubic_foot()
    {
        var entry = Entry("oversize", "O4");
        var total = OversizeCorrection.ToTotal(
            new DensityAndWater(Density.From(entry.Number("dryF"), DensityUnit.PoundPerCubicFoot), WaterContent.FromPercent(entry.Number("wF"))),
            entry.Number("PC") / 100,
            entry.Number("Gc"),
            WaterContent.FromPercent(entry.Number("wC")),
            Density.From(62.4, DensityUnit.PoundPerCubicFoot));
        Printed(entry.Answers().Number("dryT"), total.DryDensity.In(DensityUnit.PoundPerCubicFoot), 1);
        Printed(entry.Answers().Number("wT"), total.WaterContent.Percent, 1);
    }
}
