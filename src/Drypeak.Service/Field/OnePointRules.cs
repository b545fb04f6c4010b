using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using FluentValidation;

namespace Drypeak.Service.Field;

/// <summary>The rules of a family and its point.</summary>
internal sealed class OnePointRules : AbstractValidator<OnePointRequest>
{
    private const int MostCurves = 50;

    public OnePointRules(Limits limits)
    {
        RuleFor(request => request.Reference).AtMost(limits.NameCharacters);
        RuleFor(request => request.Units!).SetValidator(new UnitsRules()).When(request => request.Units is { });
        RuleFor(request => request.Family).Needed().Counted(MostCurves);
        RuleForEach(request => request.Family).Needed().SetValidator(new MemberRules(limits));
        RuleFor(request => request.Family).Custom(CheckLabels);
        RuleFor(request => request.Point).Needed();
        RuleFor(request => request.Point!).SetValidator(new PointRules(limits)).When(request => request.Point is { });
    }

    private static void CheckLabels(IReadOnlyList<FamilyMemberContract>? family, ValidationContext<OnePointRequest> context)
    {
        var first = new Dictionary<string, int>(StringComparer.Ordinal);
        for (var i = 0; i < family?.Count; i++)
        {
            if (family[i] is { } member && !first.TryAdd(member.LabelOr(i), i))
            {
                context.Fail($"Family[{i}].Label", "repeated-label", $"Curve {first[member.LabelOr(i)] + 1} has the label \"{member.LabelOr(i)}\" too. Give each its own.");
            }
        }
    }

    private sealed class MemberRules : AbstractValidator<FamilyMemberContract>
    {
        public MemberRules(Limits limits)
        {
            RuleFor(member => member.Label).NotBlank("A label").AtMost(limits.NameCharacters);
            RuleFor(member => member.OptimumWaterContent).Within(0.01, 1000, " %");
            RuleFor(member => member.MaximumDryDensity).Positive();
            RuleFor(member => member.Points).Counted(limits.PointsPerLine);
            RuleForEach(member => member.Points).Must(point => point is [>= 0 and <= 1000, >= RuleWords.Least and <= RuleWords.Greatest])
                .WithErrorCode("not-a-point").WithMessage("A point is two numbers: water content in %, from 0 to 1000, and dry density, over 0.");
            RuleFor(member => member.MaximumDryDensity).NotNull().When(member => member.OptimumWaterContent is { })
                .WithErrorCode("incomplete").WithMessage("An optimum is a water content and a density. Give both.");
            RuleFor(member => member.OptimumWaterContent).NotNull().When(member => member.MaximumDryDensity is { })
                .WithErrorCode("incomplete").WithMessage("An optimum is a water content and a density. Give both.");
            RuleFor(member => member.OptimumWaterContent).NotNull().When(member => member is { MaximumDryDensity: null, Points: null, Test: null })
                .WithErrorCode("not-enough-data").WithMessage("Nothing gives the curve: give optimumWaterContent and maximumDryDensity, points, or a test.");
            When(member => member.Test is { }, () =>
            {
                RuleFor(member => member.OptimumWaterContent).Null().WithErrorCode("not-with-test").WithMessage(Doubled);
                RuleFor(member => member.MaximumDryDensity).Null().WithErrorCode("not-with-test").WithMessage(Doubled);
                RuleFor(member => member.Points).Null().WithErrorCode("not-with-test").WithMessage(Doubled);
            });
        }

        private const string Doubled = "The test brings its curve itself. Leave this out, or leave out the test.";
    }

    private sealed class PointRules : AbstractValidator<OnePointContract>
    {
        public PointRules(Limits limits)
        {
            Include(new WaterContentRules(limits));
            RuleFor(point => point.WetDensity).Positive();
            RuleFor(point => point.DryDensity).Positive();
            RuleFor(point => point.MoldAndWetSoil).Positive();
            RuleFor(point => point.Mold!).SetValidator(new MoldRules()).When(point => point.Mold is { });
        }
    }
}
