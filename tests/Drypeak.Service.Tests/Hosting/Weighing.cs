using System.Text.Json.Serialization;
using System.Text.Json.Serialization.Metadata;
using Drypeak.Service.Hosting;
using FluentValidation;
using FluentValidation.Results;

namespace Drypeak.Service.Tests.Hosting;

/// <summary>A small contract with a member of each kind, for the tests of the reader.</summary>
public sealed record Weighing
{
    [JsonRequired]
    public required IReadOnlyList<Portion> Portions { get; init; }

    [JsonRequired]
    public double? Balance { get; init; }

    public string? Reference { get; init; }

    public int? Layers { get; init; }

    public long? Serial { get; init; }

    public bool? Trace { get; init; }

    public Ring? Ring { get; init; }

    public IReadOnlyList<IReadOnlyList<double>>? Curve { get; init; }

    public IReadOnlyList<double?>? Readings { get; init; }

    public IReadOnlyDictionary<string, string>? Identification { get; init; }
}

public sealed record Portion
{
    [JsonRequired]
    public string? Label { get; init; }

    [JsonRequired]
    public double Wet { get; init; }

    [JsonRequired]
    public double Dry { get; init; }

    public IReadOnlyList<Ring>? Rings { get; init; }
}

public sealed record Ring
{
    public double? Volume { get; init; }

    public double? Diameter { get; init; }

    public double? Height { get; init; }
}

[JsonSerializable(typeof(Weighing))]
internal sealed partial class WeighingJson : JsonSerializerContext;

internal static class WeighingContract
{
    public static readonly JsonTypeInfo<Weighing> Json = StrictJson.Options(WeighingJson.Default).Contract<Weighing>();
}

/// <summary>Rules of each kind: of a value, between neighbors, between items, about what is missing.</summary>
internal sealed class WeighingRules : AbstractValidator<Weighing>
{
    public WeighingRules()
    {
        RuleFor(weighing => weighing.Balance).Must(mass => mass is null or >= 0).WithErrorCode("negative").WithMessage("A mass is not negative.");
        RuleFor(weighing => weighing.Portions).NotEmpty().WithErrorCode("empty-list").WithMessage("Give one portion or more.");
        RuleForEach(weighing => weighing.Portions).ChildRules(portion =>
        {
            portion.RuleFor(each => each.Dry).Must((each, dry) => !(dry > each.Wet)).WithErrorCode("dry-over-wet").WithMessage("Dry soil weighs less than wet soil.");
            portion.RuleForEach(each => each.Rings).SetValidator(new RingRules());
        });
        RuleFor(weighing => weighing.Portions).Custom((portions, context) =>
        {
            foreach (var (index, portion) in portions.Index())
            {
                if (portions.Take(index).Any(earlier => earlier.Label == portion.Label))
                {
                    context.AddFailure(new ValidationFailure($"Portions[{index}].Label", "Each label stands once.") { ErrorCode = "repeated-label" });
                }
            }
        });
        RuleFor(weighing => weighing.Ring!).SetValidator(new RingRules()).When(weighing => weighing.Ring is not null);
    }

    public static IReadOnlyList<Fault> Check(Weighing weighing) => new WeighingRules().Validate(weighing).ToFaults();

    private sealed class RingRules : AbstractValidator<Ring>
    {
        public RingRules()
        {
            RuleFor(ring => ring.Volume).GreaterThan(0).WithErrorCode("not-positive").WithMessage("A volume is above 0.");
            RuleFor(ring => ring.Height).NotNull().When(ring => ring.Volume is null).WithErrorCode("height-missing").WithMessage("Give a height with a diameter.");
        }
    }
}
