using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;
using FluentValidation;

namespace Drypeak.Service.Contracts;

/// <summary>A request that says which water it means: by temperature, by density, or by neither (20 °C).</summary>
internal interface IWaterGiven
{
    UnitsContract? Units { get; }

    double? WaterTemperature { get; }

    double? WaterDensity { get; }
}

/// <summary>The water of a request that passed the rules.</summary>
internal static class WaterGiven
{
    /// <summary>Temperature that the density is taken at, °C; null where the density was given.</summary>
    public static double? Temperature(this IWaterGiven request) =>
        request.WaterDensity is null ? request.WaterTemperature ?? WaterDensity.DefaultTemperature : null;

    /// <summary>Density of the water.</summary>
    public static Density Water(this IWaterGiven request) => request.WaterDensity is { } given
        ? Density.From(given, request.Units.DensityUnit())
        : WaterDensity.At(request.WaterTemperature ?? WaterDensity.DefaultTemperature);
}

/// <summary>Temperature and density of water, each in its range, and agreeing where both are given.</summary>
internal sealed class WaterRules : AbstractValidator<IWaterGiven>
{
    private const double LeastDensity = 950;
    private const double GreatestDensity = 1100;

    public WaterRules()
    {
        RuleFor(request => request.WaterTemperature).Within(WaterDensity.LowestTemperature, WaterDensity.HighestTemperature, " °C");
        RuleFor(request => request.WaterDensity).Custom(CheckDensity);
    }

    private static void CheckDensity(double? value, ValidationContext<IWaterGiven> context)
    {
        var request = context.InstanceToValidate;
        if (value is not { } number || (request.Units?.Density is { } name && !UnitNames.Density.ContainsKey(name)))
        {
            return;
        }

        var unit = request.Units.DensityUnit();
        var given = Density.From(number, unit);
        if (given.KilogramsPerCubicMeter is not (>= LeastDensity and <= GreatestDensity))
        {
            context.Fail(nameof(IWaterGiven.WaterDensity), "out-of-range",
                $"The density of water must lie between {ReaderText.Of(new Density(LeastDensity), unit)} and {ReaderText.Of(new Density(GreatestDensity), unit)}; {RuleWords.Text(number)} {unit.Symbol()} was received.");
        }
        else if (request.WaterTemperature is >= WaterDensity.LowestTemperature and <= WaterDensity.HighestTemperature and var temperature)
        {
            var tabulated = WaterDensity.At(temperature);
            var apart = Math.Abs((given.KilogramsPerCubicMeter / tabulated.KilogramsPerCubicMeter) - 1);
            if (apart > SpecimenReduction.DensityTolerance * (1 + 1e-9))
            {
                context.Fail(nameof(IWaterGiven.WaterDensity), "contradiction",
                    $"The density of water given is {ReaderText.Of(given, unit)}, but at {RuleWords.Text(temperature)} °C it is {ReaderText.Of(tabulated, unit)}: {ReaderText.Percent(apart, 2)} apart, where {ReaderText.Percent(SpecimenReduction.DensityTolerance)} is allowed. Leave one out.");
            }
        }
    }
}
