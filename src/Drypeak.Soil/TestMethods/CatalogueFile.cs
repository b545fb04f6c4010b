using System.Collections.Immutable;
using System.Text.Json;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.TestMethods;

/// <summary>
/// The form of <c>test-methods.json</c>: a row a method, each value an object that carries its unit and its source. Reading is strict:
/// an unknown member, a missing source or another unit than the one expected is a fault of the file, and of nobody who calls.
/// </summary>
internal static class CatalogueFile
{
    private static readonly JsonSerializerOptions Strict = new(JsonSerializerOptions.Strict)
    {
        PropertyNamingPolicy = JsonNamingPolicy.CamelCase,
    };

    /// <summary>The methods, in the file's order.</summary>
    /// <exception cref="JsonException">The file is not of this form.</exception>
    /// <exception cref="InvalidDataException">A value has another unit than the one expected.</exception>
    public static ImmutableArray<TestMethod> Read()
    {
        using var file = typeof(CatalogueFile).Assembly.GetManifestResourceStream("test-methods.json")
            ?? throw new InvalidDataException("The catalogue of test methods is not embedded.");
        var rows = JsonSerializer.Deserialize<Row[]>(file, Strict)!;
        return [.. rows.Select(row => row.ToMethod())];
    }

    /// <summary>One value as it stands in the file.</summary>
    private sealed record Entry(double Value, string Source, bool Read, string? Unit = null, double? Tolerance = null)
    {
        public Sourced<Length> Millimeters() => In("mm", value => Length.From(value, LengthUnit.Millimeter));

        public Sourced<Volume> CubicCentimeters() => In("cm3", value => Volume.From(value, VolumeUnit.CubicCentimeter));

        public Sourced<Mass> Kilograms() => In("kg", value => new Mass(value));

        /// <summary>A whole number without a unit.</summary>
        public Sourced<int> Count() => In(null, value =>
            double.IsInteger(value) ? (int)value : throw new InvalidDataException($"{value} is no whole number."));

        /// <summary>A number that keeps the unit in the name of its property.</summary>
        public Sourced<double> Number(string unit) => In(unit, value => value);

        /// <summary>An effort in the unit that the standard prints.</summary>
        public Sourced<CompactiveEffort> Effort() => Unit == "ft.lbf/in3"
            ? In("ft.lbf/in3", value => new CompactiveEffort(value * CompactiveEffort.FootPoundForcePerCubicInch))
            : In("kJ/m3", value => new CompactiveEffort(value));

        private Sourced<T> In<T>(string? unit, Func<double, T> convert)
            where T : struct
        {
            if (Unit != unit)
            {
                throw new InvalidDataException($"A value of {Source} is in '{Unit}' where '{unit}' is expected.");
            }

            return new Sourced<T>(convert(Value), Tolerance is { } tolerance ? convert(tolerance) : null, new ValueSource(Source, Read));
        }
    }

    private sealed record RoundingEntry(decimal? Step = null, int? SignificantFigures = null)
    {
        public Rounding ToRounding() => this switch
        {
            { Step: { } step, SignificantFigures: null } => Rounding.ToStep(step),
            { Step: null, SignificantFigures: { } figures } => Rounding.ToSignificantFigures(figures),
            _ => throw new InvalidDataException("A rounding is either a step or a count of significant figures."),
        };
    }

    private sealed record ReportingEntry(RoundingEntry WaterContent, RoundingEntry DryDensity, string DensityUnit, string Source, bool Read)
    {
        public ReportingRule ToRule() => new(
            WaterContent.ToRounding(),
            DryDensity.ToRounding(),
            Enum.GetValues<DensityUnit>().Single(unit => unit.Code() == DensityUnit),
            new ValueSource(Source, Read));
    }

    private sealed record Row(
        string Code,
        string Standard,
        string Clause,
        string Summary,
        Entry Layers,
        Entry? MoldVolume = null,
        Entry? MoldDiameter = null,
        Entry? MoldHeight = null,
        Entry? RammerMass = null,
        Entry? Drop = null,
        Entry? BlowsPerLayer = null,
        Entry? VibrationPerLayer = null,
        Entry? NominalEffort = null,
        Entry? LargestParticle = null,
        Entry? OversizeSieve = null,
        Entry? OversizeLimit = null,
        Entry? MinimumSpecimens = null,
        Entry? RecommendedSpacing = null,
        Entry? GreatestSpacing = null,
        ReportingEntry? Reporting = null)
    {
        public TestMethod ToMethod() => new()
        {
            Code = Code,
            Standard = Standard,
            Clause = Clause,
            Summary = Summary,
            MoldVolume = MoldVolume?.CubicCentimeters() ?? VolumeOfItsDimensions(),
            MoldDiameter = MoldDiameter?.Millimeters(),
            MoldHeight = MoldHeight?.Millimeters(),
            RammerMass = RammerMass?.Kilograms(),
            Drop = Drop?.Millimeters(),
            Layers = Layers.Count(),
            BlowsPerLayer = BlowsPerLayer?.Count(),
            VibrationSecondsPerLayer = VibrationPerLayer?.Number("s"),
            NominalEffort = NominalEffort?.Effort(),
            LargestParticleMillimeters = LargestParticle?.Number("mm"),
            OversizeSieveMillimeters = OversizeSieve?.Number("mm"),
            OversizeLimitPercent = OversizeLimit?.Number("%"),
            MinimumSpecimens = MinimumSpecimens?.Count(),
            RecommendedSpacingPercent = RecommendedSpacing?.Number("%"),
            GreatestSpacingPercent = GreatestSpacing?.Number("%"),
            Reporting = Reporting?.ToRule(),
        };

        private Sourced<Volume> VolumeOfItsDimensions()
        {
            if (MoldDiameter?.Millimeters() is not { } diameter || MoldHeight?.Millimeters() is not { } height)
            {
                throw new InvalidDataException($"{Code} has neither the volume of its mold nor both dimensions.");
            }

            var source = new ValueSource(
                $"{diameter.Source.Origin}, from diameter and height", diameter.Source.Read && height.Source.Read);
            return new Sourced<Volume>(Volume.OfCylinder(diameter.Value, height.Value), null, source);
        }
    }
}
