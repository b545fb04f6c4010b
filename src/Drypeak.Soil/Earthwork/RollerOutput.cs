using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Earthwork;

/// <summary>A roller at work.</summary>
/// <param name="Width">Of the drum, over 0.</param>
/// <param name="Overlap">Of neighboring lanes, 0 to below the width.</param>
/// <param name="Speed">While rolling, over 0.</param>
/// <param name="LiftThickness">Compacted, over 0.</param>
/// <param name="Passes">Over each place, one or more.</param>
/// <param name="Efficiency">Share of the hour that is spent rolling, over 0 up to 1.</param>
public sealed record Roller(Length Width, Length Overlap, Speed Speed, Length LiftThickness, int Passes, double Efficiency)
{
    private const double SecondsPerHour = 3600;
    private const double FastestMetersPerSecond = 12 / 3.6;

    /// <summary>Width that a lane adds.</summary>
    public Length EffectiveWidth => new(Width.Meters - Overlap.Meters);

    /// <summary>Finished area in an hour: width · speed · efficiency/passes.</summary>
    public Area AreaPerHour => new(EffectiveWidth.Meters * Speed.MetersPerSecond * SecondsPerHour * Efficiency / Passes);

    /// <summary>Finished, compacted volume in an hour.</summary>
    public Volume VolumePerHour => new(AreaPerHour.SquareMeters * LiftThickness.Meters);

    /// <summary>What a careful reviewer says.</summary>
    /// <param name="efficiencyGiven">Whether the efficiency is the caller's and not the default.</param>
    /// <param name="units">The units that texts speak.</param>
    public IEnumerable<Finding> Review(bool efficiencyGiven, EarthworkUnits units)
    {
        foreach (var finding in PlausibilityReview.Thickness(LiftThickness, "/liftThickness", units))
        {
            yield return finding;
        }

        if (Speed.MetersPerSecond > FastestMetersPerSecond * (1 + 1e-9))
        {
            yield return EarthworkFindingKinds.RollerFast.At("/speed",
                $"The speed is {ReaderText.Significant(Speed.In(units.Speed))} {units.Speed.Code()}, over {ReaderText.Significant(new Speed(FastestMetersPerSecond).In(units.Speed))}. A roller so fast compacts little at a pass: check the number and its unit, and prove the passes on a test strip.");
        }

        if (!efficiencyGiven)
        {
            yield return EarthworkFindingKinds.EfficiencyNotGiven.At("/efficiency",
                "Without an efficiency the roller is taken to roll all of the hour. Give it: 50 minutes in the hour is 0.83.");
        }
    }

    /// <summary>The working, in the caller's units.</summary>
    public IReadOnlyList<WorkingStep> Working(EarthworkUnits units)
    {
        var sheet = new EarthworkSheet(units);
        var (length, hour) = (units.Length, units.Speed.InMetersPerSecond() * SecondsPerHour);
        sheet.Length(EarthworkFormulas.EffectiveWidth, "effective width", $"{EarthworkSheet.Text(Width.In(length))} - {EarthworkSheet.Text(Overlap.In(length))}", EffectiveWidth);
        sheet.Step(EarthworkFormulas.AreaPerHour, "area in an hour",
            $"{EarthworkSheet.Text(EffectiveWidth.In(length))}*{EarthworkSheet.Text(Speed.In(units.Speed))}*{EarthworkSheet.Text(Efficiency)}/{Passes}{EarthworkSheet.Factor(length.InMeters() * hour / units.Area.InSquareMeters())}",
            AreaPerHour.In(units.Area), units.Area.Symbol() + "/h");
        sheet.Step(EarthworkFormulas.VolumePerHour, "volume in an hour",
            $"{EarthworkSheet.Text(AreaPerHour.In(units.Area))}*{EarthworkSheet.Text(LiftThickness.In(length))}{EarthworkSheet.Factor(units.Area.InSquareMeters() * length.InMeters() / units.BulkVolume.InCubicMeters())}",
            VolumePerHour.In(units.BulkVolume), units.BulkVolume.Symbol() + "/h");
        return sheet.Steps;
    }
}
