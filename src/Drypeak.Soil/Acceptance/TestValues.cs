using Drypeak.Soil.FieldDensity;
using Drypeak.Soil.FieldDensity.Review;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.References;

namespace Drypeak.Soil.Acceptance;

/// <summary>The value of each quantity that a test has, in SI; what is unknown is null. Immutable, safe on any thread.</summary>
public sealed class TestValues
{
    /// <summary>Given twice must agree: densities to 0.2 %, water contents to 0.1 percentage points, and the rest as these two allow.</summary>
    private static readonly (double OfDensity, double OfWater) Agreement = (0.002, 0.001);

    private static readonly AcceptedQuantity[] Quantities = Enum.GetValues<AcceptedQuantity>();

    private readonly double?[] _values;

    private TestValues(double?[] values, JudgedSoil soil)
    {
        _values = values;
        Soil = soil;
    }

    /// <summary>The soil beside its reference, as far as it is known.</summary>
    public JudgedSoil Soil { get; }

    /// <summary>The value of a quantity, or null.</summary>
    public double? this[AcceptedQuantity quantity] => _values[(int)quantity];

    /// <summary>Saturation of the reference's optimum: the line of optimums; null without a specific gravity or a reference.</summary>
    public double? SaturationAtOptimum => SaturationOf(Soil);

    /// <summary>Whether the saturation is not below that at the optimum; null where one of the two is unknown.</summary>
    public bool? IsWetOfOptimums =>
        this[AcceptedQuantity.Saturation] is { } here && SaturationAtOptimum is { } line ? here >= line * (1 - 1e-9) : null;

    /// <summary>The values of a field test.</summary>
    public static TestValues Of(JudgedSoil soil) => new([.. Quantities.Select(soil.ValueOf)], soil);

    /// <summary>What follows from values that are known already. A value that is given stands as it was given.</summary>
    /// <param name="given">In SI.</param>
    /// <param name="reference">The test's reference, specific gravity and water, without a soil.</param>
    /// <param name="placeOf">JSON pointer of a value that was given.</param>
    /// <param name="units">The units that texts speak.</param>
    /// <param name="faults">Receives what contradicts itself.</param>
    public static TestValues Complete(
        IReadOnlyDictionary<AcceptedQuantity, double> given, JudgedSoil reference, Func<AcceptedQuantity, string> placeOf, UnitSet units, ICollection<Fault> faults)
    {
        var soil = Solve(given, reference);
        var values = new double?[Quantities.Length];
        foreach (var quantity in Quantities)
        {
            var derived = soil.ValueOf(quantity);
            values[(int)quantity] = given.TryGetValue(quantity, out var known) ? known : derived;
            if (given.ContainsKey(quantity) && derived is { } other && other != known && Allowed(quantity, soil) is var allowed && Math.Abs(other - known) > allowed * (1 + 1e-9))
            {
                faults.Add(new Fault(placeOf(quantity), "contradiction",
                    $"Here the {quantity.Words()} is {JudgementWords.Text(quantity, known, units)}, but by the other values it is {JudgementWords.Text(quantity, other, units)}: more than the {JudgementWords.Amount(quantity, allowed, units)} apart that are allowed. Correct one, or leave one out."));
            }
        }

        if (soil is { DryDensity: { } dry, WetDensityAlone: { } wet } && wet < dry * (1 - Agreement.OfDensity))
        {
            faults.Add(new Fault(placeOf(AcceptedQuantity.WetDensity), "contradiction",
                $"The wet density, {ReaderText.Of(new Density(wet), units.Density)}, is below the dry density, {ReaderText.Of(new Density(dry), units.Density)}. Were the two exchanged?"));
        }

        return new TestValues(values, soil);
    }

    private static double Allowed(AcceptedQuantity quantity, JudgedSoil soil) => soil.StandardUncertaintyOf(quantity, new FieldUncertainty
    {
        DryDensity = soil.DryDensity is { } dry ? new Density(dry * Agreement.OfDensity) : null,
        WaterContent = new WaterContent(Agreement.OfWater),
    }) ?? (quantity.IsDensity() ? soil.ValueOf(quantity)!.Value * Agreement.OfDensity : Agreement.OfWater);

    /// <summary>Dry density and water content by the straightest way that the values offer.</summary>
    private static JudgedSoil Solve(IReadOnlyDictionary<AcceptedQuantity, double> given, JudgedSoil reference)
    {
        double? Given(AcceptedQuantity quantity) => given.TryGetValue(quantity, out var value) ? value : null;
        var wet = Given(AcceptedQuantity.WetDensity);
        var w = Given(AcceptedQuantity.WaterContent) ?? (Given(AcceptedQuantity.WaterContentFromOptimum) + reference.ReferenceWater);
        var dry = Given(AcceptedQuantity.DryDensity)
            ?? (wet / (1 + w))
            ?? (Given(AcceptedQuantity.RelativeCompaction) * reference.ReferenceDensity)
            ?? OfRelativeDensity(Given(AcceptedQuantity.RelativeDensity), reference)
            ?? (reference.SpecificGravity * reference.WaterDensity / (1 + Given(AcceptedQuantity.VoidRatio)));
        w ??= wet >= dry ? (wet / dry) - 1 : null;
        return reference with { DryDensity = dry, WaterContent = w, WetDensityAlone = wet };
    }

    private static double? OfRelativeDensity(double? relative, JudgedSoil reference) =>
        relative is { } share && reference is { ReferenceDensity: { } most, ReferenceMinimum: { } least } && least < most
            && DensityLimits.OfDensities(least, most).VolumeOfRelativeDensity(share) is (> 0 and var volume) ? 1 / volume : null;

    private static double? SaturationOf(JudgedSoil soil) =>
        soil is { SpecificGravity: { } gravity, ReferenceDensity: { } density, ReferenceWater: { } w }
            && PhaseRelations.VoidRatio(new Density(density), gravity, new Density(soil.WaterDensity)) is (> 0 and var e)
            ? PhaseRelations.Saturation(new WaterContent(w), e, gravity) : null;
}
