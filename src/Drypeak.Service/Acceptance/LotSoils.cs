using Drypeak.Service.Contracts;
using Drypeak.Service.Field;
using Drypeak.Service.Laboratory;
using Drypeak.Soil.FieldDensity;
using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Acceptance;

/// <summary>A soil of a lot: a field test without readings that has what a laboratory says of it.</summary>
/// <param name="Values">With the laboratory's values alone.</param>
/// <param name="Laboratory">The laboratory's test in their place, or null.</param>
internal sealed record LotSoil(FieldTest Values, (MoistureDensityTest Test, MoistureDensityResult Result)? Laboratory)
{
    /// <summary>Held against the laboratory's test where there is one.</summary>
    public FieldTest Held { get; } = Against(Values, Laboratory);

    /// <summary>Reference, specific gravity and water, without a soil in place.</summary>
    public JudgedSoil Reference => new()
    {
        MaximumDryDensity = Held.Reference.MaximumDryDensity?.KilogramsPerCubicMeter,
        OptimumWaterContent = Held.Reference.OptimumWaterContent?.Fraction,
        MinimumDryDensity = Held.Reference.MinimumDryDensity?.KilogramsPerCubicMeter,
        SpecificGravity = Held.SpecificGravity?.Value,
        WaterDensity = Held.WaterDensity.KilogramsPerCubicMeter,
    };

    /// <summary>Holds a field test against this soil's laboratory, by the field test's own oversize.</summary>
    public FieldTest Hold(FieldTest field) => Against(
        field with
        {
            Reference = Values.Reference,
            Uncertainty = field.Uncertainty with
            {
                MaximumDryDensity = Values.Uncertainty.MaximumDryDensity,
                OptimumWaterContent = Values.Uncertainty.OptimumWaterContent,
            },
        },
        Laboratory);

    private static FieldTest Against(FieldTest field, (MoistureDensityTest Test, MoistureDensityResult Result)? laboratory) =>
        laboratory is { } known ? field.Against(known.Test, known.Result) : field;
}

/// <summary>The soils of a lot: each laboratory's, computed once however many tests of the lot refer to it. Not for several threads.</summary>
internal sealed class LotSoils
{
    private readonly LotAcceptanceRequest _lot;
    private readonly UnitSet _units;
    private readonly Dictionary<LaboratoryContract, LotSoil> _known = [];
    private readonly List<Finding> _findings = [];

    public LotSoils(LotAcceptanceRequest lot, UnitSet units)
    {
        (_lot, _units) = (lot, units);
        OfLot = Found(lot.Laboratory, "/laboratory");
    }

    /// <summary>The lot's own.</summary>
    public LotSoil OfLot { get; }

    /// <summary>What a reviewer says of the laboratory tests.</summary>
    public IReadOnlyList<Finding> Findings => _findings;

    /// <summary>A test's soil: by its own laboratory, specific gravity and uncertainty where it brings them, else by the lot's.</summary>
    public LotSoil Of(LotTestContract test, string place)
    {
        var soil = test.Laboratory is null ? OfLot : Found(test.Laboratory, place + "/laboratory");
        return test is { SpecificGravity: null, Uncertainty: null } ? soil : soil with
        {
            Values = soil.Values with
            {
                SpecificGravity = GravityOf(test.SpecificGravity) ?? soil.Values.SpecificGravity,
                Uncertainty = test.Uncertainty is null ? soil.Values.Uncertainty : test.Uncertainty.ToUncertainty(test.Laboratory ?? _lot.Laboratory, _units),
            },
        };
    }

    private LotSoil Found(LaboratoryContract? laboratory, string place)
    {
        if (laboratory is { } && _known.TryGetValue(laboratory, out var known))
        {
            return known;
        }

        var soil = new LotSoil(
            new FieldTest
            {
                Method = new DirectDensity(null, null),
                Water = new MeasuredWater([], null, null, null),
                WaterDensity = _lot.Water(),
                SpecificGravity = GravityOf(_lot.SpecificGravity),
                Reference = laboratory.ToReference(_units),
                Uncertainty = _lot.Uncertainty.ToUncertainty(laboratory, _units),
            },
            laboratory?.Test is { } test ? MoistureDensityJob.Analyze(test) : null);
        if (soil.Laboratory is { } embedded)
        {
            _findings.AddRange(embedded.Result.Findings.Select(finding => finding with { Place = place + "/test" + finding.Place }));
            if (soil.Held.Reference.MaximumDryDensity is null)
            {
                _findings.Add(FieldFindingKinds.ReferenceWithoutPeak.At(place + "/test", "The laboratory test has no optimum, so that there is nothing to hold tests against. See its own findings."));
            }
        }

        if (laboratory is { })
        {
            _known.Add(laboratory, soil);
        }

        return soil;
    }

    private static SpecificGravity? GravityOf(SpecificGravityContract? gravity) =>
        gravity is { Value: { } value } ? new SpecificGravity(value, gravity.Determined == "measured") : null;
}
