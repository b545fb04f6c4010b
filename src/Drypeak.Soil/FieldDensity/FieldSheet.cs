using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Laboratory.Review;
using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.FieldDensity;

/// <summary>
/// What a reduction writes down as it goes: its working, what contradicts itself, and what a reviewer would say of the numbers. Numbers stand
/// in the caller's units. One sheet a test; not for several threads.
/// </summary>
/// <param name="units">The caller's units.</param>
internal sealed class FieldSheet(UnitSet units)
{
    private const double Arithmetic = 1e-9;

    private readonly List<WorkingStep> _steps = [];
    private readonly List<Fault> _faults = [];
    private readonly List<Finding> _findings = [];

    public UnitSet Units => units;

    public IReadOnlyList<WorkingStep> Steps => _steps;

    public List<Fault> Faults => _faults;

    public IReadOnlyList<Finding> Findings => _findings;

    public string Text(Mass mass) => WorkingNumbers.Number(mass.In(units.Mass));

    public string Text(Volume volume) => WorkingNumbers.Number(volume.In(units.Volume));

    public string Text(Density density) => WorkingNumbers.Number(density.In(units.Density));

    public static string Text(WaterContent w) => WorkingNumbers.Number(w.Percent);

    public static string Text(double number) => WorkingNumbers.Number(number);

    public void Step(Formula formula, string quantity, string substitution, Mass value) =>
        _steps.Add(formula.Step(quantity, substitution, value.In(units.Mass), units.Mass.Code()));

    public void Step(Formula formula, string quantity, string substitution, Volume value) =>
        _steps.Add(formula.Step(quantity, substitution, value.In(units.Volume), units.Volume.Symbol()));

    public void Step(Formula formula, string quantity, string substitution, Density value) =>
        _steps.Add(formula.Step(quantity, substitution, value.In(units.Density), units.Density.Symbol()));

    public void Step(Formula formula, string quantity, string substitution, WaterContent value) =>
        _steps.Add(formula.Step(quantity, substitution, value.Percent, "%"));

    public void Step(Formula formula, string quantity, string substitution, double value, string unit) =>
        _steps.Add(formula.Step(quantity, substitution, value, unit));

    public void Append(IEnumerable<WorkingStep> steps) => _steps.AddRange(steps);

    /// <summary>A mass over a volume gives a density in another unit: the factor between, as it stands in a substitution; nothing where it is 1.</summary>
    public string MassOverVolumeFactor => Factor(units.Mass.InKilograms() / units.Volume.InCubicMeters() / units.Density.InKilogramsPerCubicMeter());

    /// <summary>A mass over a density gives a volume in another unit.</summary>
    public string MassOverDensityFactor => Factor(units.Mass.InKilograms() / units.Density.InKilogramsPerCubicMeter() / units.Volume.InCubicMeters());

    /// <summary>A volume times a density gives a mass in another unit.</summary>
    public string VolumeTimesDensityFactor => Factor(units.Volume.InCubicMeters() * units.Density.InKilogramsPerCubicMeter() / units.Mass.InKilograms());

    /// <summary>A change of unit, or nothing where the units match.</summary>
    public static string Factor(double factor) => Math.Abs(factor - 1) < 1e-12 ? "" : "*" + WorkingNumbers.Number(factor);

    public void Find(FindingKind kind, string place, string message) => _findings.Add(kind.At(place, message));

    public void Missing(string place, string message) => _faults.Add(new Fault(place, "not-enough-data", message));

    public void Contradiction(string place, string message) => _faults.Add(new Fault(place, "contradiction", message));

    /// <summary>Two numbers for one quantity: the second is held against the first.</summary>
    /// <param name="taken">In SI.</param>
    /// <param name="other">In SI.</param>
    /// <param name="place">Where the second stands.</param>
    /// <param name="quantity">What it is, with its article: "the volume".</param>
    /// <param name="text">A number of it in the caller's unit.</param>
    /// <param name="byTaken">How the first was found: "diameter and height".</param>
    public void HoldAgainst(double taken, double other, string place, string quantity, Func<double, string> text, string byTaken)
    {
        if (Math.Abs((other / taken) - 1) is var apart && apart > SpecimenReduction.DensityTolerance * (1 + Arithmetic))
        {
            Contradiction(place,
                $"Here {quantity} is {text(other)}, but by {byTaken} it is {text(taken)}: {ReaderText.Percent(apart, 2)} apart, where {ReaderText.Percent(SpecimenReduction.DensityTolerance)} is allowed. Correct one, or leave one out.");
        }
    }

    public string ReaderMass(double kilograms) => ReaderText.Of(new Mass(kilograms), units.Mass);

    public string ReaderVolume(double cubicMeters) => ReaderText.Of(new Volume(cubicMeters), units.Volume);

    public string ReaderDensity(double kilogramsPerCubicMeter) => ReaderText.Of(new Density(kilogramsPerCubicMeter), units.Density);
}
