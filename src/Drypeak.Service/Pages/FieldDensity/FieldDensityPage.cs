using Drypeak.Service.Field;
using Drypeak.Service.Hosting;
using Drypeak.Service.Pages.Forms;
using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Pages.FieldDensity;

/// <summary>The page of the field test: from the readings to accepted or not.</summary>
internal static class FieldDensityPage
{
    private static readonly ChoiceField Method = new("method", "Method of the test", "/method",
    [
        new(FieldMethodNames.SandCone, "Sand cone"), new(FieldMethodNames.RubberBalloon, "Rubber balloon"), new(FieldMethodNames.DriveCylinder, "Drive cylinder"),
        new(FieldMethodNames.WaterReplacement, "Water replacement"), new(FieldMethodNames.NuclearGauge, "Nuclear gauge"), new(FieldMethodNames.Direct, "Density known"),
    ]);

    private static readonly NumberField SandBefore = new("sand-before", "Jar of sand before", "/sandCone/before");
    private static readonly NumberField SandAfter = new("sand-after", "Jar of sand after", "/sandCone/after");
    private static readonly NumberField SandInCone = new("sand-cone", "Sand in cone and plate", "/sandCone/coneAndPlate");
    private static readonly NumberField SandDensity = new("sand-density", "Density of the sand", "/sandCone/sandDensity") { UnitOf = FormFields.DensityUnit };
    private static readonly NumberField SandInHole = new("sand-in-hole", "or sand in the hole alone", "/sandCone/sandInHole") { UnitOf = FormFields.MassUnit };
    private static readonly NumberField ConeVolume = new("cone-volume", "Volume of cone and plate", "/sandCone/coneVolume") { UnitOf = FormFields.VolumeUnit, Hint = "in place of the sand in it" };
    private static readonly NumberField ReleasedVolume = new("released-volume", "Volume of all the sand", "/sandCone/releasedVolume") { UnitOf = FormFields.VolumeUnit, Hint = "with the cone's, where only volumes were read" };
    private static readonly NumberField BalloonInitial = new("balloon-initial", "Reading before the hole", "/rubberBalloon/initialReading") { UnitOf = FormFields.VolumeUnit };
    private static readonly NumberField BalloonFinal = new("balloon-final", "Reading in the hole", "/rubberBalloon/finalReading") { UnitOf = FormFields.VolumeUnit };
    private static readonly NumberField CylinderVolume = new("cylinder-volume", "Volume", "/driveCylinder/volume") { UnitOf = FormFields.VolumeUnit };
    private static readonly NumbersField GaugeDensity = new("gauge-density", "Wet density, each reading", "/nuclearGauge/wetDensity") { UnitOf = FormFields.DensityUnit, Hint = "with spaces between" };
    private static readonly NumbersField GaugeWater = new("gauge-water", "Water content, each reading", "/nuclearGauge/waterContent") { Unit = "%", Hint = "with spaces between" };
    private static readonly NumbersField GaugeWaterDensity = new("gauge-water-density", "or water per volume, each reading", "/nuclearGauge/waterDensity") { UnitOf = FormFields.DensityUnit, Hint = "with spaces between" };
    private static readonly TableField OvenPairs = new("oven-pairs", "Gauge and oven on the same soil", "/nuclearGauge/ovenPairs",
        [new ColumnKind("Gauge", Measure.Percent, "gauge"), new ColumnKind("Oven", Measure.Percent, "oven")])
    {
        Lines = 3,
        Row = "Pair",
        Hint = "Water contents in %, a pair a line. They give the gauge's moisture offset.",
    };

    private static readonly NumberField SoilWet = new("soil-wet", "Wet soil out of the hole", "/soil/wet") { UnitOf = FormFields.MassUnit, Hint = "alone, or with its container below" };
    private static readonly NumberField SoilFull = new("soil-full", "Container and wet soil", "/soil/containerAndWet") { UnitOf = FormFields.MassUnit };
    private static readonly NumberField SoilContainer = new("soil-container", "Empty container", "/soil/container") { UnitOf = FormFields.MassUnit };
    private static readonly NumberField SoilDry = new("soil-dry", "The same soil, dried", "/soil/dry") { UnitOf = FormFields.MassUnit, Hint = "gives the water content too" };
    private static readonly NumberField Water = new("water-content", "Water content", "/waterContent") { Unit = "%", Hint = "on dry mass, or by tins" };
    private static readonly TableField Tins = WaterFields.Tins("/tins");

    private static readonly NumberField Maximum = new("maximum-dry-density", "Maximum dry density", "/laboratory/maximumDryDensity") { UnitOf = FormFields.DensityUnit };
    private static readonly NumberField Optimum = new("optimum-water-content", "Optimum water content", "/laboratory/optimumWaterContent") { Unit = "%" };
    private static readonly NumberField MaximumUncertainty = new("maximum-uncertainty", "± maximum dry density", "/laboratory/uncertainty/maximumDryDensity") { UnitOf = FormFields.DensityUnit };
    private static readonly NumberField OptimumUncertainty = new("optimum-uncertainty", "± optimum water content", "/laboratory/uncertainty/optimumWaterContent") { Unit = "%" };
    private static readonly NumberField DryUncertainty = new("dry-uncertainty", "± field dry density", "/uncertainty/dryDensity") { UnitOf = FormFields.DensityUnit };
    private static readonly NumberField WaterUncertainty = new("water-uncertainty", "± field water content", "/uncertainty/waterContent") { Unit = "%" };

    private static readonly NumberField OversizePercent = new("oversize-percent", "Share of the dry mass", "/oversize/percent") { Unit = "%" };
    private static readonly NumberField OversizeGravity = new("oversize-gravity", "Gs of the particles, bulk", "/oversize/specificGravity");
    private static readonly NumberField OversizeWater = new("oversize-water", "Their water content", "/oversize/waterContent") { Unit = "%" };

    private static readonly NumberField LeastCompaction = new("least-compaction", "Relative compaction at least", "/specification/requirements/[quantity=relativeCompaction]/minimum") { Unit = "%" };
    private static readonly NumberField Driest = new("driest", "From the optimum, not below", "/specification/requirements/[quantity=waterContentFromOptimum]/minimum") { Unit = "%", Hint = "such as -2" };
    private static readonly NumberField Wettest = new("wettest", "From the optimum, not above", "/specification/requirements/[quantity=waterContentFromOptimum]/maximum") { Unit = "%" };
    private static readonly NumberField MostAirVoids = new("most-air-voids", "Air voids at most", "/specification/requirements/[quantity=airVoids]/maximum") { Unit = "%" };
    private static readonly string[] AllLimits =
    [
        LeastCompaction.Name, Driest.Name, Wettest.Name, MostAirVoids.Name, "most-compaction", "least-dry-density", "driest-water", "wettest-water", "least-saturation",
        "most-saturation", "least-relative-density", "most-void-ratio",
    ];

    private static readonly ChoiceField Rule = new("rule", "Decided by", "/specification/decision/rule", [new(Specification.Simple, "the value"), new(Specification.Guarded, "the value with a guard band")]) { OnlyWith = AllLimits };
    private static readonly NumberField Risk = new("risk", "Risk", "/specification/decision/risk") { Hint = "with a guard band, such as 0.05", OnlyWith = AllLimits };

    private static readonly NumberField Minimum = new("minimum-dry-density", "Minimum dry density", "/laboratory/minimumDryDensity") { UnitOf = FormFields.DensityUnit, Hint = "gives the relative density of a free-draining soil" };

    private static DocumentField LaboratoryTest(Limits limits) => new("laboratory-test", "or a whole laboratory test", "/laboratory/test", new LaboratoryTestText(limits).Read)
    {
        Hint = "Its link from the laboratory page, or the request saved there. It brings its uncertainty, and its curve for the chart.",
    };

    private static NumberField Limit(string name, string label, string quantity, string end, ChoiceField? unit = null) =>
        new(name, label, $"/specification/requirements/[quantity={quantity}]/{end}") { Unit = unit is null && quantity != "voidRatio" ? "%" : null, UnitOf = unit };

    private static readonly NumberField[] FurtherLimits =
    [
        Limit("most-compaction", "Relative compaction at most", "relativeCompaction", "maximum"),
        Limit("least-dry-density", "Dry density at least", "dryDensity", "minimum", FormFields.DensityUnit),
        Limit("driest-water", "Water content, not below", "waterContent", "minimum"),
        Limit("wettest-water", "Water content, not above", "waterContent", "maximum"),
        Limit("least-saturation", "Saturation at least", "saturation", "minimum"),
        Limit("most-saturation", "Saturation at most", "saturation", "maximum"),
        Limit("least-relative-density", "Relative density at least", "relativeDensity", "minimum"),
        Limit("most-void-ratio", "Void ratio at most", "voidRatio", "maximum"),
    ];

    public static FormPage Of(FieldDensityJob job, Limits limits) => new FormPage<FieldDensityRequest, FieldDensityAnswer>
    {
        Address = "/field",
        Heading = "Field density test",
        Lead = "From the readings in the field to accepted or not: by how much, why, and what next.",
        Action = "Decide",
        WhatComesOut = "One word and one sentence that can be read at arm's length, each requirement with its margin, and what a careful reviewer would say.",
        Variant = Method,
        Parts = PartsOf(LaboratoryTest(limits)),
        Demonstrations = Demonstrations,
        View = typeof(FieldAnswerView),
        Check = job.Check,
        Compute = FormAnswer.Of<FieldDensityRequest, FieldDensityAnswer, Figures.CompactionChart>(job.ComputeWithChart, job.Chart),
        Headline = FieldAnswerWords.Headline,
    };

    private static IReadOnlyList<FormPart> PartsOf(FormField laboratoryTest) =>
    [
        new("", [FormFields.Reference]) { Columns = 1 },
        new("Units", [FormFields.MassUnit, FormFields.VolumeUnit, FormFields.DensityUnit, FormFields.LengthUnit, FormFields.TinUnit, FormFields.DecimalMark]) { Columns = 3 },
        OfMethod(FieldMethodNames.SandCone, SandBefore, SandAfter, SandInCone, SandDensity, SandInHole),
        OfMethod(FieldMethodNames.RubberBalloon, BalloonInitial, BalloonFinal),
        OfMethod(FieldMethodNames.DriveCylinder, CylinderVolume,
            new NumberField("cylinder-diameter", "or inside diameter", "/driveCylinder/diameter") { UnitOf = FormFields.LengthUnit },
            new NumberField("cylinder-height", "and height", "/driveCylinder/height") { UnitOf = FormFields.LengthUnit }),
        OfMethod(FieldMethodNames.WaterReplacement,
            new NumberField("water-with-hole", "Water in pit and template", "/waterReplacement/withHole"), new NumberField("water-template", "Water in the template alone", "/waterReplacement/templateOnly")),
        OfMethod(FieldMethodNames.NuclearGauge, GaugeDensity, GaugeWater, GaugeWaterDensity, OvenPairs),
        OfMethod(FieldMethodNames.Direct,
            new NumberField("direct-wet", "Wet density", "/direct/wetDensity") { UnitOf = FormFields.DensityUnit }, new NumberField("direct-dry", "or dry density", "/direct/dryDensity") { UnitOf = FormFields.DensityUnit }),
        new("Soil", [SoilWet, new NumberField("largest-particle", "Largest particle", "/largestParticle") { Unit = "mm", Hint = "the hole must be large enough for it" }, SoilFull, SoilContainer, SoilDry])
        {
            When = texts => FieldMethodNames.WeighsSoil(texts[Method]),
        },
        new("Water", [Water, FormFields.SpecificGravity with { Hint = "gives saturation and air voids" }, Tins]),
        new("Held against the laboratory", [Maximum, Optimum, laboratoryTest]),
        new("Required", [LeastCompaction, MostAirVoids, Driest, Wettest]),
        new("Oversize in the hole",
        [
            OversizePercent, OversizeGravity, OversizeWater,
            new ChoiceField("oversize-apply", "Corrected is", "/oversize/apply", [new(FieldDensityMapping.ToLaboratory, "the laboratory's value"), new(FieldDensityMapping.ToField, "the field's value")]) { OnlyWith = [OversizePercent.Name] },
        ])
        {
            UnderMore = true,
        },
        new("The sand's calibration and volumes",
        [
            new NumberField("container-volume", "Calibration container", "/sandCone/calibration/containerVolume") { UnitOf = FormFields.VolumeUnit, Hint = "in place of the density of the sand" },
            new NumberField("container-sand", "Sand that fills it", "/sandCone/calibration/sandMass") { UnitOf = FormFields.MassUnit },
            ConeVolume, ReleasedVolume,
        ])
        {
            UnderMore = true,
            When = texts => texts[Method] == FieldMethodNames.SandCone,
        },
        new("Water content in other ways", [.. WaterFields.OtherWays(""), FormFields.WaterTemperature]) { UnderMore = true },
        new("Standard uncertainties", [DryUncertainty, WaterUncertainty, MaximumUncertainty, OptimumUncertainty]) { UnderMore = true },
        new("Further requirements", FurtherLimits) { UnderMore = true },
        new("Decision", [Rule, Risk, Minimum]) { UnderMore = true },
    ];

    private static FormPart OfMethod(string code, params FormField[] fields) =>
        new(Method.Choices.First(choice => choice.Value == code).Text, fields) { When = texts => texts[Method] == code };

    private static IReadOnlyList<FormDemonstration> Demonstrations { get; } =
    [
        new("accepted", "a sand cone test that passes",
            (FormFields.Reference, "Ternmarsh, lift 4, 1+240, 3 m left"), (SandBefore, "6420"), (SandAfter, "2710"), (SandInCone, "1530"), (SandDensity, "1.42"),
            (SoilWet, "3120.5"), (Water, "11.8"), (FormFields.SpecificGravity, "2.68"), (FormFields.Determined, "measured"),
            (OversizePercent, "12"), (OversizeGravity, "2.65"), (OversizeWater, "1.5"),
            (Maximum, "1.83"), (Optimum, "13.9"), (MaximumUncertainty, "0.010"), (OptimumUncertainty, "0.3"), (DryUncertainty, "0.015"), (WaterUncertainty, "0.3"),
            (LeastCompaction, "95"), (Driest, "-2"), (Wettest, "2")),
        new("rejected", "a gauge test that fails",
            (FormFields.Reference, "Ternmarsh, lift 5, 1+310, crest"), (Method, FieldMethodNames.NuclearGauge), (GaugeDensity, "1.958 1.966"), (GaugeWater, "15.8 16.2"),
            (FormFields.SpecificGravity, "2.68"), (FormFields.Determined, "measured"), (Maximum, "1.83"), (Optimum, "13.9"), (LeastCompaction, "95"), (Driest, "-2"), (Wettest, "2")),
        new("undecided", "a test too close to its limit to say",
            (FormFields.Reference, "Ternmarsh, lift 5, 1+360, 2 m right"), (Method, FieldMethodNames.DriveCylinder), (CylinderVolume, "1000"), (SoilFull, "3272"), (SoilContainer, "1280"),
            (Tins, "31.2 152.4 137.9"), (Maximum, "1.83"), (Optimum, "13.9"), (MaximumUncertainty, "0.010"), (DryUncertainty, "0.012"),
            (LeastCompaction, "95"), (Rule, Specification.Guarded), (Risk, "0.05")),
        new("on-its-curve", "a balloon test on the curve of its laboratory test",
            (FormFields.Reference, "Ternmarsh, lift 6, 1+180, 4 m left"), (Method, FieldMethodNames.RubberBalloon), (BalloonInitial, "120"), (BalloonFinal, "1655"), (SoilWet, "3145"),
            (Tins, "28.93 164.20 148.11\n33.51 171.86 155.30"), (LaboratoryTest(new Limits()), "/?demo=weighings"), (LeastCompaction, "95"), (Driest, "-2"), (Wettest, "2"), (MostAirVoids, "10")),
    ];
}
