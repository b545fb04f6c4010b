using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using FluentValidation;

namespace Drypeak.Service.Earthwork;

/// <summary>All that a request for quantities must keep.</summary>
internal sealed class QuantitiesRules : EarthworkRules<QuantitiesRequest>
{
    private const int MostAreas = 100;
    private const int MostTrucks = 10_000;
    private const double MostSwell = 1000;
    private const double WholeShare = 100;

    public QuantitiesRules(Limits limits)
        : base(limits)
    {
        RuleFor(request => request.Fill).Needed();
        RuleFor(request => request.Fill!).SetValidator(new FillRules(limits)).When(request => request.Fill is { });
        RuleFor(request => request.Borrow).NotNull().When(request => request.BorrowAreas is null)
            .WithErrorCode("not-enough-data").WithMessage("Nothing says where the soil comes from. Give borrow, or borrowAreas.");
        RuleFor(request => request.Borrow).Null().When(request => request.BorrowAreas is { })
            .WithErrorCode("given-twice").WithMessage("One borrow is given, and several borrow areas. Leave one out.");
        RuleFor(request => request.Borrow!).SetValidator(new BorrowRules(limits)).When(request => request.Borrow is { });
        RuleFor(request => request.BorrowAreas).Counted(MostAreas);
        RuleForEach(request => request.BorrowAreas).Needed().SetValidator(new BorrowAreaRules(limits));
        RuleFor(request => request.BorrowAreas).Custom(CheckAreas);
        RuleFor(request => request.Loose!).SetValidator(new LooseRules(limits)).When(request => request.Loose is { });
        RuleFor(request => request.Truck!).SetValidator(new TruckRules()).When(request => request.Truck is { });
        RuleFor(request => request.Fleet!).SetValidator(new FleetRules()).When(request => request.Fleet is { });
        RuleFor(request => request.Fleet!.Distance).NotNull()
            .When(request => request.Fleet is { } && request.BorrowAreas?.All(area => area?.HaulDistance is { }) != true)
            .WithErrorCode("not-enough-data").WithMessage("The fleet has no distance. Give it, or give every borrow area its haulDistance.");
    }

    protected override void CheckTogether(QuantitiesRequest request, List<Fault> faults) => request.ToQuantities(faults);

    private static void CheckAreas(IReadOnlyList<BorrowAreaContract>? areas, ValidationContext<QuantitiesRequest> context)
    {
        if (areas is null or { Count: 0 } || areas.Any(area => area is null))
        {
            return;
        }

        var seen = new HashSet<string>();
        var shared = areas.Any(area => area.Share is { });
        foreach (var (i, area) in areas.Index())
        {
            if (!seen.Add(area.Label ?? $"{i + 1}"))
            {
                context.Fail($"BorrowAreas[{i}].Label", "repeated-label", "Another borrow area has this label. Give each its own.");
            }

            if (shared && area.Share is null)
            {
                context.Fail($"BorrowAreas[{i}].Share", "not-enough-data", "Other areas have a share. Give each one, or none.");
            }
            else if (!shared && areas.Count > 1 && area.HaulDistance is null)
            {
                context.Fail($"BorrowAreas[{i}].HaulDistance", "not-enough-data", "Without shares the nearest area gives first. Give each its haulDistance, or its share.");
            }
        }

        if (areas.Sum(area => area.Share) is { } sum && areas.All(area => area.Share is >= 0) && Math.Abs(sum - WholeShare) > WholeShare * 1e-9)
        {
            context.Fail("BorrowAreas", "shares-not-100", $"The shares come to {RuleWords.Text(sum)} %; together they must be 100 %.");
        }
    }

    private sealed class FillRules : AbstractValidator<FillContract>
    {
        public FillRules(Limits limits)
        {
            RuleFor(fill => fill.Volume).Needed().VolumeOfEarth();
            RuleFor(fill => fill.DryDensity).Needed().Positive();
            Include(new WaterContentRules(limits));
        }
    }

    private sealed class BorrowRules : AbstractValidator<BorrowContract>
    {
        public BorrowRules(Limits limits)
        {
            RuleFor(borrow => borrow.WetDensity).Positive();
            RuleFor(borrow => borrow.DryDensity).Positive();
            RuleFor(borrow => borrow.DryDensity).NotNull().When(borrow => borrow.WetDensity is null)
                .WithErrorCode("not-enough-data").WithMessage("The density in the bank is missing. Give dryDensity or wetDensity.");
            Include(new WaterContentRules(limits));
            this.NeedsWaterContent();
        }
    }

    private sealed class BorrowAreaRules : AbstractValidator<BorrowAreaContract>
    {
        public BorrowAreaRules(Limits limits)
        {
            Include(new BorrowRules(limits));
            RuleFor(area => area.Label).NotBlank("A label").AtMost(limits.NameCharacters);
            RuleFor(area => area.Capacity).VolumeOfEarth();
            RuleFor(area => area.HaulDistance).NotNegative();
            RuleFor(area => area.Share).Within(0, WholeShare, " %");
        }
    }

    private sealed class LooseRules : AbstractValidator<LooseContract>
    {
        public LooseRules(Limits limits)
        {
            RuleFor(loose => loose.WetDensity).Positive();
            RuleFor(loose => loose.DryDensity).Positive();
            RuleFor(loose => loose.Swell).Within(0, MostSwell, " % of the bank volume");
            RuleFor(loose => loose.Swell).NotNull().When(loose => loose is { WetDensity: null, DryDensity: null })
                .WithErrorCode("not-enough-data").WithMessage("Nothing says how loose the soil is. Give wetDensity, dryDensity or swell.");
            Include(new WaterContentRules(limits));
        }
    }

    private sealed class TruckRules : AbstractValidator<TruckContract>
    {
        public TruckRules()
        {
            RuleFor(truck => truck.Volume).Positive();
            RuleFor(truck => truck.Mass).Positive();
            RuleFor(truck => truck.Volume).NotNull().When(truck => truck.Mass is null)
                .WithErrorCode("not-enough-data").WithMessage("The truck has no bound. Give volume, mass or both.");
        }
    }

    private sealed class FleetRules : AbstractValidator<FleetContract>
    {
        private const double MostMinutes = 1440;

        public FleetRules()
        {
            RuleFor(fleet => fleet.LoadingTime).Needed().Within(0.01, MostMinutes, " minutes");
            RuleFor(fleet => fleet.DumpTime).Needed().Within(0, MostMinutes, " minutes");
            RuleFor(fleet => fleet.HaulSpeed).Needed().Positive();
            RuleFor(fleet => fleet.ReturnSpeed).Needed().Positive();
            RuleFor(fleet => fleet.Distance).NotNegative();
            RuleFor(fleet => fleet.Trucks).Whole(MostTrucks);
            RuleFor(fleet => fleet.Efficiency).Efficiency();
        }
    }
}
