using System.Text.Json;
using System.Text.Json.Serialization;
using System.Text.Json.Serialization.Metadata;
using Drypeak.Figures;
using Drypeak.Service.Acceptance;
using Drypeak.Service.Earthwork;
using Drypeak.Service.Exchange.Ags;
using Drypeak.Service.Exchange.Batch;
using Drypeak.Service.Exchange.Csv;
using Drypeak.Service.Field;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;

namespace Drypeak.Service;

/// <summary>How the contracts are read and written: generated code under the strict options, made once.</summary>
internal static class ServiceJson
{
    /// <summary>The options of every contract. The corrected peak is not written where no oversize was given.</summary>
    public static JsonSerializerOptions Options { get; } = StrictJson.Options(ContractsJson.Default.WithAddedModifier(OmitUnasked));

    /// <summary>Type information of a contract.</summary>
    public static JsonTypeInfo<T> Of<T>() => Options.Contract<T>();

    private static void OmitUnasked(JsonTypeInfo type)
    {
        if (type.Type == typeof(MoistureDensityAnswer))
        {
            type.Properties.Single(member => member.Name == "corrected").ShouldSerialize =
                static (answer, _) => ((MoistureDensityAnswer)answer).OversizeGiven;
        }
    }
}

[JsonSourceGenerationOptions(JsonSerializerDefaults.Strict, PropertyNamingPolicy = JsonKnownNamingPolicy.CamelCase)]
[JsonSerializable(typeof(MoistureDensityRequest))]
[JsonSerializable(typeof(MoistureDensityAnswer))]
[JsonSerializable(typeof(ComparisonRequest))]
[JsonSerializable(typeof(ComparisonAnswer))]
[JsonSerializable(typeof(IReadOnlyList<FindingKindAnswer>))]
[JsonSerializable(typeof(SaturationLinesRequest))]
[JsonSerializable(typeof(SaturationLinesAnswer))]
[JsonSerializable(typeof(OversizeCorrectionRequest))]
[JsonSerializable(typeof(OversizeCorrectionAnswer))]
[JsonSerializable(typeof(EffortSeriesRequest))]
[JsonSerializable(typeof(EffortSeriesAnswer))]
[JsonSerializable(typeof(IReadOnlyList<TestMethodAnswer>))]
[JsonSerializable(typeof(FieldDensityRequest))]
[JsonSerializable(typeof(FieldDensityAnswer))]
[JsonSerializable(typeof(RelativeDensityRequest))]
[JsonSerializable(typeof(RelativeDensityAnswer))]
[JsonSerializable(typeof(OnePointRequest))]
[JsonSerializable(typeof(OnePointAnswer))]
[JsonSerializable(typeof(RapidMethodRequest))]
[JsonSerializable(typeof(RapidMethodAnswer))]
[JsonSerializable(typeof(LotAcceptanceRequest))]
[JsonSerializable(typeof(LotAcceptanceAnswer))]
[JsonSerializable(typeof(AcceptancePlanRequest))]
[JsonSerializable(typeof(AcceptancePlanAnswer))]
[JsonSerializable(typeof(AgsAnswer))]
[JsonSerializable(typeof(BatchSummaryLine))]
[JsonSerializable(typeof(LaboratoryFileAnswer))]
[JsonSerializable(typeof(FieldFileAnswer))]
[JsonSerializable(typeof(SpecimenWaterRequest))]
[JsonSerializable(typeof(SpecimenWaterAnswer))]
[JsonSerializable(typeof(LiftWaterRequest))]
[JsonSerializable(typeof(LiftWaterAnswer))]
[JsonSerializable(typeof(QuantitiesRequest))]
[JsonSerializable(typeof(QuantitiesAnswer))]
[JsonSerializable(typeof(TestLocationsRequest))]
[JsonSerializable(typeof(TestLocationsAnswer))]
[JsonSerializable(typeof(RollerOutputRequest))]
[JsonSerializable(typeof(RollerOutputAnswer))]
[JsonSerializable(typeof(TestStripRequest))]
[JsonSerializable(typeof(TestStripAnswer))]
[JsonSerializable(typeof(CompactionChart))]
[JsonSerializable(typeof(PlotChart))]
internal sealed partial class ContractsJson : JsonSerializerContext;
