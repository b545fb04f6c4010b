using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Earthwork;

/// <summary>The working of an earthwork job as it is written down, in the caller's units. One sheet a job; not for several threads.</summary>
/// <param name="units">The caller's units.</param>
internal sealed class EarthworkSheet(EarthworkUnits units)
{
    private readonly List<WorkingStep> _steps = [];

    public IReadOnlyList<WorkingStep> Steps => _steps;

    public static string Text(double number) => WorkingNumbers.Number(number);

    public static string Text(WaterContent w) => WorkingNumbers.Number(w.Percent);

    /// <summary>A change of unit as it stands in a substitution, or nothing where the units match.</summary>
    public static string Factor(double factor) => Math.Abs(factor - 1) < 1e-12 ? "" : "*" + WorkingNumbers.Number(factor);

    /// <summary>A bulk volume times a density gives a mass in another unit.</summary>
    public string VolumeTimesDensity => Factor(units.BulkVolume.InCubicMeters() * units.Density.InKilogramsPerCubicMeter() / units.Mass.InKilograms());

    /// <summary>A mass over a density gives a bulk volume in another unit.</summary>
    public string MassOverDensity => Factor(units.Mass.InKilograms() / units.Density.InKilogramsPerCubicMeter() / units.BulkVolume.InCubicMeters());

    public void Step(Formula formula, string quantity, string? substitution, double value, string unit) =>
        _steps.Add(formula.Step(quantity, substitution, value, unit));

    public void Mass(Formula formula, string quantity, string substitution, Mass value) =>
        Step(formula, quantity, substitution, value.In(units.Mass), units.Mass.Symbol());

    public void Length(Formula formula, string quantity, string? substitution, Length value) =>
        Step(formula, quantity, substitution, value.In(units.Length), units.Length.Code());

    public void BulkVolume(Formula formula, string quantity, string substitution, Volume value) =>
        Step(formula, quantity, substitution, value.In(units.BulkVolume), units.BulkVolume.Symbol());

    public void Density(Formula formula, string quantity, string substitution, Density value) =>
        Step(formula, quantity, substitution, value.In(units.Density), units.Density.Symbol());

    /// <summary>A quotient of two numbers of one unit.</summary>
    public void Ratio(Formula formula, string quantity, double numerator, double denominator) =>
        Step(formula, quantity, $"{Text(numerator)}/{Text(denominator)}", numerator / denominator, "");

    /// <summary>A mass of water as a volume.</summary>
    public void Liquid(string quantity, WaterAmount amount, Density water)
    {
        var factor = Factor(units.Mass.InKilograms() / units.Density.InKilogramsPerCubicMeter() / units.Liquid.InCubicMeters());
        Step(EarthworkFormulas.VolumeOfWater, quantity, $"{Text(amount.Mass.In(units.Mass))}/{Text(water.In(units.Density))}{factor}", amount.Volume.In(units.Liquid), units.Liquid.Symbol());
    }

    /// <summary>Water for each unit of a volume of earth.</summary>
    public void PerBulkVolume(string quantity, WaterAmount amount, Volume volume, string of = "")
    {
        var (mass, liquid, bulk) = (amount.Mass.In(units.Mass), amount.Volume.In(units.Liquid), volume.In(units.BulkVolume));
        var each = $"{quantity} for each {units.BulkVolume.Symbol()}{of}";
        Step(EarthworkFormulas.PerVolume, each, $"{Text(mass)}/{Text(bulk)}", mass / bulk, $"{units.Mass.Symbol()}/{units.BulkVolume.Symbol()}");
        Step(EarthworkFormulas.PerVolume, each + ", by volume", $"{Text(liquid)}/{Text(bulk)}", liquid / bulk, $"{units.Liquid.Symbol()}/{units.BulkVolume.Symbol()}");
    }
}
