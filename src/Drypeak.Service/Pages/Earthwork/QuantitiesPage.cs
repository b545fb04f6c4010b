using Drypeak.Service.Earthwork;
using Drypeak.Service.Hosting;
using Drypeak.Service.Pages.Forms;
using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Pages.Earthwork;

/// <summary>The page of quantities and haulage.</summary>
internal static class QuantitiesPage
{
    private static readonly NumberField FillVolume = new("fill-volume", "Compacted volume", "/fill/volume") { UnitOf = SiteFields.BulkVolume };
    private static readonly NumberField FillDensity = new("fill-density", "Dry density", "/fill/dryDensity") { UnitOf = FormFields.DensityUnit };
    private static readonly NumberField FillWater = new("fill-water", "Water content to have", "/fill/waterContent") { Unit = "%" };
    private static readonly NumberField BankDry = new("bank-dry", "Dry density", "/borrow/dryDensity") { UnitOf = FormFields.DensityUnit };
    private static readonly NumberField BankWet = new("bank-wet", "or wet density", "/borrow/wetDensity") { UnitOf = FormFields.DensityUnit };
    private static readonly NumberField BankWater = new("bank-water", "Water content", "/borrow/waterContent") { Unit = "%" };

    /// <summary>The borrow areas as they are pasted; the printed sheet repeats them.</summary>
    public static readonly TableField Areas = new("borrow-areas", "Borrow areas, a row each", "/borrowAreas",
    [
        new ColumnKind("Borrow area", Measure.Text, "label"), ColumnKind.WetDensity, ColumnKind.DryDensity, ColumnKind.WaterContent,
        new ColumnKind("Capacity", Measure.Ratio, "capacity"), new ColumnKind("Haul distance", Measure.Ratio, "haulDistance"), new ColumnKind("Share", Measure.Percent, "share"),
    ])
    {
        Row = "Borrow area",
        Example = "Borrow area\tWet density\tWater content\tCapacity\tHaul distance\nborrow area 7\t1.79\t11.2\t32000\t850",
    };

    private static readonly NumberField Swell = new("swell", "Swell", "/loose/swell") { Unit = "%", Hint = "of the bank volume" };
    private static readonly NumberField LooseWet = new("loose-wet", "or loose wet density", "/loose/wetDensity") { UnitOf = FormFields.DensityUnit };
    private static readonly NumberField LooseDry = new("loose-dry", "or loose dry density", "/loose/dryDensity") { UnitOf = FormFields.DensityUnit };
    private static readonly NumberField LooseWater = new("loose-water", "Water content in the truck", "/loose/waterContent") { Unit = "%", Hint = "the bank's where it is left open" };
    private static readonly NumberField TruckVolume = new("truck-volume", "Truck, loose volume", "/truck/volume") { UnitOf = SiteFields.BulkVolume };
    private static readonly NumberField TruckMass = new("truck-mass", "Truck, wet mass", "/truck/mass") { UnitOf = SiteFields.Mass };

    private static readonly NumberField LoadingTime = new("loading-time", "Loading a truck", "/fleet/loadingTime") { Unit = "min" };
    private static readonly NumberField DumpTime = new("dump-time", "Turning and dumping", "/fleet/dumpTime") { Unit = "min" };
    private static readonly NumberField HaulSpeed = new("haul-speed", "Speed loaded", "/fleet/haulSpeed") { UnitOf = SiteFields.Speed };
    private static readonly NumberField ReturnSpeed = new("return-speed", "Speed empty", "/fleet/returnSpeed") { UnitOf = SiteFields.Speed };
    private static readonly NumberField Distance = new("distance", "Distance", "/fleet/distance") { UnitOf = SiteFields.Distance, Hint = "borrow areas have their own" };
    private static readonly NumberField Trucks = new("trucks", "Trucks", "/fleet/trucks") { Hint = "as many as balance the loader where it is left open" };
    private static readonly NumberField Efficiency = new("efficiency", "Efficiency", "/fleet/efficiency") { Hint = "50 minutes in the hour is 0.83" };

    public static FormPage Of(Limits limits) => new FormPage<QuantitiesRequest, QuantitiesAnswer>
    {
        Address = "/earthwork/quantities",
        Heading = "Quantities and haulage",
        Lead = "From the fill to what is dug, hauled and wetted for it.",
        WhatComesOut = "Bank, loose and compacted volumes, shrinkage and swell by both definitions, water to add, truck loads with the bound that governs, and trucks to balance a loader.",
        Parts =
        [
            new("", [FormFields.Reference]) { Columns = 1 },
            new("Units", [SiteFields.BulkVolume, SiteFields.Mass, FormFields.DensityUnit, SiteFields.Liquid, SiteFields.Distance, SiteFields.Speed, FormFields.DecimalMark]) { Columns = 3 },
            new("The fill", [FillVolume, FillDensity, FillWater]) { Columns = 3 },
            new("The soil in the bank", [BankDry, BankWet, BankWater]) { Columns = 3 },
            new("or several borrow areas", [Areas]) { Columns = 1, Note = "The nearest gives first, each up to its capacity; or each gives its share of the dry mass." },
            new("The soil in a truck", [Swell, LooseWet, LooseDry, LooseWater]),
            new("Trucks", [TruckVolume, TruckMass]),
            new("Cycle of a fleet", [LoadingTime, DumpTime, HaulSpeed, ReturnSpeed, Distance, Trucks, Efficiency]) { UnderMore = true },
            new("Water temperature", [SiteFields.WaterTemperature]) { UnderMore = true },
        ],
        Demonstrations =
        [
            new("two-areas", "a reach from two borrow areas, with its trucks",
                (FormFields.Reference, "Ternmarsh, reach 2, stations 1200 to 1900"), (FillVolume, "48000"), (FillDensity, "1.78"), (FillWater, "13.5"),
                (Areas, "Borrow area\tWet density\tWater content\tCapacity\tHaul distance\nborrow area 7\t1.79\t11.2\t32000\t850\nborrow area 9\t1.82\t14.6\t60000\t2100"),
                (Swell, "22"), (TruckVolume, "14"), (TruckMass, "19"), (LoadingTime, "4"), (DumpTime, "2"), (HaulSpeed, "25"), (ReturnSpeed, "35"), (Efficiency, "0.83")),
            new("one-borrow", "one borrow pit, water and loads",
                (FormFields.Reference, "Ternmarsh, ramp at station 2050"), (FillVolume, "3600"), (FillDensity, "1.78"), (FillWater, "13.5"), (BankWet, "1.74"), (BankWater, "10.4"),
                (LooseWet, "1.41"), (TruckVolume, "14"), (TruckMass, "19")),
        ],
        View = typeof(QuantitiesView),
        Check = new QuantitiesRules(limits).Check,
        Compute = FormAnswer.Of<QuantitiesRequest, QuantitiesAnswer>(QuantitiesJob.Compute),
        Headline = answer => Sentence(answer).ToString(),
    };

    /// <summary>The answer in a few words.</summary>
    public static SiteSentence Sentence(QuantitiesAnswer answer) => new("", SiteNumbers.Text(answer.Borrow.Volume, answer.Units.BulkVolume!), "in the bank");

    /// <summary>What a form rests on, for the printed sheet.</summary>
    public static IEnumerable<(string Name, string Text)> Given(FormTexts texts) => SiteSheet.Given(texts,
        FillVolume, FillDensity with { Label = "Dry density of the fill" }, FillWater with { Label = "Water content of the fill" },
        BankDry with { Label = "Dry density in the bank" }, BankWet with { Label = "Wet density in the bank" }, BankWater with { Label = "Water content in the bank" },
        Swell, LooseWet, LooseDry, LooseWater, TruckVolume, TruckMass, LoadingTime, DumpTime, HaulSpeed, ReturnSpeed, Distance, Trucks, Efficiency);
}
