using Drypeak.Service.Field;
using Drypeak.Service.Pages.Forms;

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
    private static readonly NumberField CylinderVolume = new("cylinder-volume", "Volume", "/driveCylinder/volume") { UnitOf = FormFields.VolumeUnit };
    private static readonly NumbersField GaugeDensity = new("gauge-density", "Wet density, each reading", "/nuclearGauge/wetDensity") { UnitOf = FormFields.DensityUnit, Hint = "with spaces between" };
    private static readonly NumbersField GaugeWater = new("gauge-water", "Water content, each reading", "/nuclearGauge/waterContent") { Unit = "%", Hint = "with spaces between" };

    private static readonly NumberField SoilWet = new("soil-wet", "Wet soil out of the hole", "/soil/wet") { UnitOf = FormFields.MassUnit, Hint = "alone, or with its container below" };
    private static readonly NumberField SoilFull = new("soil-full", "Container and wet soil", "/soil/containerAndWet") { UnitOf = FormFields.MassUnit };
    private static readonly NumberField SoilContainer = new("soil-container", "Empty container", "/soil/container") { UnitOf = FormFields.MassUnit };
    private static readonly NumberField Water = new("water-content", "Water content", "/waterContent") { Unit = "%", Hint = "on dry mass, or by a tin" };
    private static readonly NumberField Tin = new("tin", "Tin", "/tins/0/tin");
    private static readonly NumberField TinWet = new("tin-wet", "Tin and wet soil", "/tins/0/wet");
    private static readonly NumberField TinDry = new("tin-dry", "Tin and dry soil", "/tins/0/dry");

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
    private static readonly string[] Limits = [LeastCompaction.Name, Driest.Name, Wettest.Name, MostAirVoids.Name];

    private static readonly ChoiceField Rule = new("rule", "Decided by", "/specification/decision/rule", [new(Specification.Simple, "the value"), new(Specification.Guarded, "the value with a guard band")]) { OnlyWith = Limits };
    private static readonly NumberField Risk = new("risk", "Risk", "/specification/decision/risk") { Hint = "with a guard band, such as 0.05", OnlyWith = Limits };

    public static FormPage Of(FieldDensityJob job) => new FormPage<FieldDensityRequest, FieldDensityAnswer>
    {
        Address = "/field",
        Heading = "Field density test",
        Lead = "From the readings in the field to accepted or not: by how much, why, and what next.",
        Action = "Decide",
        WhatComesOut = "One word and one sentence that can be read at arm's length, each requirement with its margin, and what a careful reviewer would say.",
        Variant = Method,
        Parts = Parts,
        Demonstrations = Demonstrations,
        View = typeof(FieldAnswerView),
        Check = job.Check,
        Compute = FormAnswer.Of<FieldDensityRequest, FieldDensityAnswer>(FieldDensityJob.Compute),
        Headline = FieldAnswerWords.Headline,
    };

    private static IReadOnlyList<FormPart> Parts { get; } =
    [
        new("", [FormFields.Reference]) { Columns = 1 },
        new("Units", [FormFields.MassUnit, FormFields.VolumeUnit, FormFields.DensityUnit, FormFields.LengthUnit, FormFields.DecimalMark]) { Columns = 3 },
        OfMethod(FieldMethodNames.SandCone, SandBefore, SandAfter, SandInCone, SandDensity),
        OfMethod(FieldMethodNames.RubberBalloon,
            new NumberField("balloon-initial", "Reading before the hole", "/rubberBalloon/initialReading"), new NumberField("balloon-final", "Reading in the hole", "/rubberBalloon/finalReading")),
        OfMethod(FieldMethodNames.DriveCylinder, CylinderVolume,
            new NumberField("cylinder-diameter", "or inside diameter", "/driveCylinder/diameter") { UnitOf = FormFields.LengthUnit },
            new NumberField("cylinder-height", "and height", "/driveCylinder/height") { UnitOf = FormFields.LengthUnit }),
        OfMethod(FieldMethodNames.WaterReplacement,
            new NumberField("water-with-hole", "Water in pit and template", "/waterReplacement/withHole"), new NumberField("water-template", "Water in the template alone", "/waterReplacement/templateOnly")),
        OfMethod(FieldMethodNames.NuclearGauge, GaugeDensity, GaugeWater),
        OfMethod(FieldMethodNames.Direct,
            new NumberField("direct-wet", "Wet density", "/direct/wetDensity") { UnitOf = FormFields.DensityUnit }, new NumberField("direct-dry", "or dry density", "/direct/dryDensity") { UnitOf = FormFields.DensityUnit }),
        new("Soil", [SoilWet, new NumberField("largest-particle", "Largest particle", "/largestParticle") { Unit = "mm", Hint = "the hole must be large enough for it" }, SoilFull, SoilContainer])
        {
            When = texts => FieldMethodNames.WeighsSoil(texts[Method]),
        },
        new("Water", [Water, FormFields.SpecificGravity with { Hint = "gives saturation and air voids" }]),
        new("", [Tin, TinWet, TinDry]) { Columns = 3 },
        new("Held against the laboratory", [Maximum, Optimum]),
        new("Required", [LeastCompaction, MostAirVoids, Driest, Wettest]),
        new("Oversize in the hole",
        [
            OversizePercent, OversizeGravity, OversizeWater,
            new ChoiceField("oversize-apply", "Corrected is", "/oversize/apply", [new(FieldDensityMapping.ToLaboratory, "the laboratory's value"), new(FieldDensityMapping.ToField, "the field's value")]) { OnlyWith = [OversizePercent.Name] },
        ])
        {
            UnderMore = true,
        },
        new("Standard uncertainties", [DryUncertainty, WaterUncertainty, MaximumUncertainty, OptimumUncertainty]) { UnderMore = true },
        new("Decision",
        [
            Rule, Risk,
            new NumberField("minimum-dry-density", "Minimum dry density", "/laboratory/minimumDryDensity") { UnitOf = FormFields.DensityUnit, Hint = "gives the relative density of a free-draining soil" },
        ])
        {
            UnderMore = true,
        },
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
            (Tin, "31.2"), (TinWet, "152.4"), (TinDry, "137.9"), (Maximum, "1.83"), (Optimum, "13.9"), (MaximumUncertainty, "0.010"), (DryUncertainty, "0.012"),
            (LeastCompaction, "95"), (Rule, Specification.Guarded), (Risk, "0.05")),
    ];
}
