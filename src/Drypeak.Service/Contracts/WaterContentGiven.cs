using Drypeak.Service.Hosting;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;
using FluentValidation;

namespace Drypeak.Service.Contracts;

/// <summary>A part of a request that says a water content, in one way or in several that must agree.</summary>
internal interface IWaterContentGiven
{
    double? WaterContent { get; }

    IReadOnlyList<TinContract>? Tins { get; }

    double? WetBasis { get; }

    CarbideContract? Carbide { get; }
}

/// <summary>The water content of a request that passed the rules.</summary>
internal static class WaterContentGiven
{
    public static MeasuredWater ToMeasuredWater(this IWaterContentGiven given, UnitSet units) => new(
        [.. (given.Tins ?? []).Select(tin => tin.ToTin(units))],
        given.WaterContent is { } w ? WaterContent.FromPercent(w) : null,
        given.WetBasis is { } wetBasis ? WaterContent.FromPercentOfWetMass(wetBasis) : null,
        given.Carbide is { Reading: { } reading } carbide ? CarbideTester.WaterContent(reading, carbide.HalfSample is true) : null);

    private static MoistureTin ToTin(this TinContract tin, UnitSet units) => new(
        Mass.From(tin.Tin!.Value, units.TinMass), Mass.From(tin.Wet!.Value, units.TinMass), Mass.From(tin.Dry!.Value, units.TinMass));
}

/// <summary>Each form of a water content in its range.</summary>
internal sealed class WaterContentRules : AbstractValidator<IWaterContentGiven>
{
    public WaterContentRules(Limits limits)
    {
        RuleFor(given => given.WaterContent).Within(0, 1000, " %");
        RuleFor(given => given.Tins).Counted(limits.TinsPerSpecimen);
        RuleForEach(given => given.Tins).Needed().SetValidator(new TinRules());
        RuleFor(given => given.WetBasis).PercentBelow100();
        RuleFor(given => given.Carbide!).SetValidator(new CarbideRules()).When(given => given.Carbide is { });
    }
}
