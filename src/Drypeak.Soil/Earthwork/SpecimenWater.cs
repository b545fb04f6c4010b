using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Earthwork;

/// <summary>A portion of soil that is brought to the water content of its specimen. Dry solids are neither lost nor gained.</summary>
/// <param name="Label">What it is called.</param>
/// <param name="WetMass">Its mass now.</param>
/// <param name="Present">Its water content now.</param>
/// <param name="Target">The water content that it is to have.</param>
public sealed record Portion(string Label, Mass WetMass, WaterContent Present, WaterContent Target)
{
    /// <summary>The solids: m/(1 + w).</summary>
    public Mass DryMass => new(WetMass.Kilograms / (1 + Present.Fraction));

    /// <summary>What the balance shows once the water is in.</summary>
    public Mass FinalMass => new(DryMass.Kilograms * (1 + Target.Fraction));

    /// <summary>The water to add; negative where the portion is to be dried back.</summary>
    public WaterAmount ToAdd(Density water) => WaterAmount.Between(DryMass, Present, Target, water);
}

/// <summary>Water for the specimens of a compaction test: mass and volume for each portion, from its present water content to its target.</summary>
public static class SpecimenWater
{
    /// <summary>What a careful reviewer says of the portions.</summary>
    /// <param name="portions">In the order of the request.</param>
    /// <param name="water">Density of water.</param>
    /// <param name="placeOf">JSON pointer to the target of a portion.</param>
    /// <param name="units">The units that texts speak.</param>
    public static IEnumerable<Finding> Review(IReadOnlyList<Portion> portions, Density water, Func<int, string> placeOf, EarthworkUnits units)
    {
        foreach (var finding in PlausibilityReview.Fractions(portions.SelectMany(portion => new[] { portion.Present, portion.Target }), ""))
        {
            yield return finding;
        }

        foreach (var (i, portion) in portions.Index())
        {
            var toAdd = portion.ToAdd(water);
            if (toAdd.Mass.Kilograms < 0 && !toAdd.IsNoneIn(portion.DryMass))
            {
                yield return EarthworkFindingKinds.DryBack.At(placeOf(i),
                    $"Portion {portion.Label} is at {ReaderText.Of(portion.Present)} and its target is {ReaderText.Of(portion.Target)}: it has to lose {ReaderText.Of(new Mass(-toAdd.Mass.Kilograms), units.Mass)} of water. Spread it out in air, mix it, and weigh it until it comes to {ReaderText.Of(portion.FinalMass, units.Mass)}; do not oven-dry it.");
            }
        }
    }

    /// <summary>The working of every portion, in the caller's units.</summary>
    /// <param name="portions">In the order of the request.</param>
    /// <param name="plasticLimit">That the optimum was estimated from; null where it was not.</param>
    /// <param name="water">Density of water.</param>
    /// <param name="units">The caller's units.</param>
    public static IReadOnlyList<WorkingStep> Working(IReadOnlyList<Portion> portions, WaterContent? plasticLimit, Density water, EarthworkUnits units)
    {
        var sheet = new EarthworkSheet(units);
        if (plasticLimit is { } limit)
        {
            sheet.Step(EarthworkFormulas.OptimumOfPlasticLimit, "estimated optimum water content", $"0.92*{EarthworkSheet.Text(limit)}", ExpectedOptimum.FromPlasticLimit(limit).WaterContent.Percent, "%");
        }

        foreach (var portion in portions)
        {
            var of = $" of portion {portion.Label}";
            var (dry, wet) = (EarthworkSheet.Text(portion.DryMass.In(units.Mass)), EarthworkSheet.Text(portion.WetMass.In(units.Mass)));
            var toAdd = portion.ToAdd(water);
            sheet.Mass(EarthworkFormulas.DryMass, "dry mass" + of, $"{wet}/(1 + {EarthworkSheet.Text(portion.Present)}/100)", portion.DryMass);
            sheet.Mass(EarthworkFormulas.WaterToAdd, "water to add to" + of[3..], $"{dry}*({EarthworkSheet.Text(portion.Target)} - {EarthworkSheet.Text(portion.Present)})/100", toAdd.Mass);
            sheet.Liquid("water to add to" + of[3..] + ", by volume", toAdd, water);
            sheet.Mass(EarthworkFormulas.FinalMass, "final mass" + of, $"{dry}*(1 + {EarthworkSheet.Text(portion.Target)}/100)", portion.FinalMass);
        }

        return sheet.Steps;
    }
}
