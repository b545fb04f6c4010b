using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;
using FluentValidation;

namespace Drypeak.Service.Earthwork;

/// <summary>The rules that every job of planning the work keeps.</summary>
internal abstract class EarthworkRules<TRequest> : AbstractValidator<TRequest>
    where TRequest : EarthworkRequest
{
    private readonly Limits _limits;

    protected EarthworkRules(Limits limits)
    {
        _limits = limits;
        RuleFor(request => request.Reference).AtMost(limits.NameCharacters);
        RuleFor(request => request.Units!).SetValidator(new EarthworkUnitsRules()).When(request => request.Units is { });
        Include(new WaterRules());
    }

    /// <summary>Every broken rule. What contradicts itself is looked for once the single values are sound.</summary>
    public IReadOnlyList<Fault> Check(TRequest request)
    {
        var faults = Validate(request).ToFaults().ToList();
        faults.AddRange(Identification.Check(request.Identification, _limits));
        if (faults.Count == 0)
        {
            CheckTogether(request, faults);
        }

        return faults;
    }

    /// <summary>Adds the faults that only the domain sees: numbers that contradict each other.</summary>
    protected virtual void CheckTogether(TRequest request, List<Fault> faults)
    {
    }
}

/// <summary>Rules that several jobs share.</summary>
internal static class EarthworkRuleWords
{
    /// <summary>No earthwork has more, in any of the units.</summary>
    private const double MostEarth = 1e12;

    public static IRuleBuilderOptions<T, double?> VolumeOfEarth<T>(this IRuleBuilder<T, double?> rule) =>
        rule.Must(value => value is null or >= RuleWords.Least).WithErrorCode("not-positive")
            .WithMessage((_, value) => $"A volume of earth must be greater than 0; {RuleWords.Text(value)} was received.")
            .Must(value => !(value > MostEarth)).WithErrorCode("out-of-range")
            .WithMessage((_, value) => $"A volume of earth must not be over {RuleWords.Text(MostEarth)}; {RuleWords.Text(value)} was received. Check the value and units.bulkVolume.");

    public static IRuleBuilderOptions<T, double?> WaterPercent<T>(this IRuleBuilder<T, double?> rule) => rule.Within(0, 1000, " %");

    /// <summary>A share of the hour.</summary>
    public static IRuleBuilderOptions<T, double?> Efficiency<T>(this IRuleBuilder<T, double?> rule) =>
        rule.Must(value => value is null or (>= RuleWords.Least and <= 1)).WithErrorCode("out-of-range")
            .WithMessage((_, value) => $"An efficiency is a fraction, over 0 and up to 1; {RuleWords.Text(value)} was received. 50 minutes in the hour is 0.83.");

    /// <summary>A whole number of things.</summary>
    public static IRuleBuilderOptions<T, int?> Whole<T>(this IRuleBuilder<T, int?> rule, int greatest) =>
        rule.Must(value => value is null || (value >= 1 && value <= greatest)).WithErrorCode("out-of-range")
            .WithMessage((_, value) => $"It must lie between 1 and {greatest}; {value} was received.");

    /// <summary>A water content by one of its forms.</summary>
    public static void NeedsWaterContent<T>(this AbstractValidator<T> rules)
        where T : class, IWaterContentGiven =>
        rules.RuleFor(given => given.WaterContent).NotNull()
            .When(given => given is { Tins: null, WetBasis: null, Carbide: null })
            .WithErrorCode("not-enough-data").WithMessage("The water content is missing. Give waterContent, tins, wetBasis or carbide.");

    /// <summary>A second number for one quantity is held against the first.</summary>
    /// <param name="faults">Receives the contradiction.</param>
    /// <param name="taken">In SI.</param>
    /// <param name="other">In SI.</param>
    /// <param name="place">Where the second stands.</param>
    /// <param name="quantity">What it is, with its article.</param>
    /// <param name="byTaken">How the first was found.</param>
    public static void RefuseApart(this ICollection<Fault> faults, double taken, double other, string place, string quantity, string byTaken)
    {
        if (Math.Abs((other / taken) - 1) is var apart && apart > SpecimenReduction.DensityTolerance * (1 + 1e-9))
        {
            faults.Add(new Fault(place, "contradiction",
                $"Here {quantity} is {ReaderText.Percent(apart, 2)} off what follows from {byTaken}, where {ReaderText.Percent(SpecimenReduction.DensityTolerance)} is allowed. Correct one, or leave one out."));
        }
    }

    /// <summary>The water content of a part that passed the rules.</summary>
    public static WaterContent? WaterContentOf(this IWaterContentGiven? given, EarthworkUnits units, string place, ICollection<Fault> faults) =>
        given?.ToMeasuredWater(units.Basic).Reduce(place, faults);
}
