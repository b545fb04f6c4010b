using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Laboratory;

/// <summary>A water content as it was found, in one way or in several that must agree. The laboratory's specimens and the field's tests share it.</summary>
/// <param name="Tins">Moisture tins; the water content is the mean over them. May be empty.</param>
/// <param name="Given">As a number on dry mass.</param>
/// <param name="FromWetBasis">Converted from a number on wet mass.</param>
/// <param name="FromCarbide">Converted from a calcium-carbide tester's reading.</param>
public sealed record MeasuredWater(IReadOnlyList<MoistureTin> Tins, WaterContent? Given, WaterContent? FromWetBasis, WaterContent? FromCarbide)
{
    /// <summary>Water contents given twice may differ by this, as a fraction (0.1 percentage points).</summary>
    public const double Tolerance = 0.001;

    /// <summary>The greatest water content that is taken, as a fraction (1000 %), however it was found.</summary>
    public const double Greatest = 10;

    /// <summary>Room for the arithmetic at an inclusive limit.</summary>
    private const double Arithmetic = 1e-9;

    /// <summary>The first way that was given, each other held against it; null where none was.</summary>
    /// <param name="place">JSON pointer of the object that holds the members.</param>
    /// <param name="faults">Receives each contradiction, and what is beyond the range.</param>
    public WaterContent? Reduce(string place, ICollection<Fault> faults)
    {
        ReadOnlySpan<(WaterContent? Water, string Name, string Member)> ways =
        [
            (Tins.Count > 0 ? new WaterContent(Tins.Average(tin => tin.WaterContent.Fraction)) : null, "the tins", "/tins"),
            (Given, "the water content given", "/waterContent"),
            (FromWetBasis, "the number on wet mass", "/wetBasis"),
            (FromCarbide, "the carbide tester", "/carbide"),
        ];

        (WaterContent Water, string Name)? first = null;
        foreach (var (water, name, member) in ways)
        {
            if (water is not { } other)
            {
                continue;
            }

            RefuseBeyondRange(other, place + member, faults);
            if (first is { } taken)
            {
                RefuseApart(taken.Water, taken.Name, other, name, place + member, faults);
            }
            else
            {
                first = (other, name);
            }
        }

        return first?.Water;
    }

    /// <summary>Adds a fault where two water contents that should be one are over <see cref="Tolerance"/> apart.</summary>
    public static void RefuseApart(WaterContent taken, string byTaken, WaterContent other, string byOther, string place, ICollection<Fault> faults)
    {
        if (Math.Abs(other.Fraction - taken.Fraction) is var apart && apart > Tolerance * (1 + Arithmetic))
        {
            faults.Add(new Fault(place, "contradiction",
                $"The water content is {ReaderText.Of(taken)} by {byTaken}, but {ReaderText.Of(other)} by {byOther}: {ReaderText.Fixed(apart * 100, 2)} percentage points apart, where {ReaderText.Fixed(Tolerance * 100, 1)} is allowed. Correct one, or leave one out."));
        }
    }

    /// <summary>Adds a fault where a water content is over <see cref="Greatest"/>.</summary>
    public static void RefuseBeyondRange(WaterContent w, string place, ICollection<Fault> faults)
    {
        if (w.Fraction > Greatest * (1 + Arithmetic))
        {
            faults.Add(new Fault(place, "out-of-range",
                $"The water content comes to {ReaderText.Significant(w.Percent)} %, where {ReaderText.Significant(Greatest * 100)} % is the most. Check the values and their units."));
        }
    }
}
