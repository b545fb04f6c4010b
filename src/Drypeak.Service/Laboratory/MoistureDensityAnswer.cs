using System.Text.Json.Serialization;
using Drypeak.Service.Contracts;
using Drypeak.Soil.Laboratory.Workings;

namespace Drypeak.Service.Laboratory;

/// <summary>What the test says. Numbers are unrounded, in the units that the request asked for; percentages in %.</summary>
public sealed record MoistureDensityAnswer
{
    /// <summary>As in the request.</summary>
    /// <example>Ternmarsh, borrow area 7, sample 3</example>
    public string? Reference { get; init; }

    /// <summary>As in the request; absent where it had none.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyDictionary<string, string>? Identification { get; init; }

    /// <summary>The test method, or null where none was named.</summary>
    public MethodAnswer? Method { get; init; }

    /// <summary>All units that were used.</summary>
    public required UnitsContract Units { get; init; }

    /// <summary>The specimens, in the order of the request.</summary>
    public required IReadOnlyList<SpecimenAnswer> Specimens { get; init; }

    /// <summary>The fitted peak, or null where there is none: a finding says why.</summary>
    public OptimumAnswer? Optimum { get; init; }

    /// <summary>The engineer's own peak; absent where none was given.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public AdoptedAnswer? Adopted { get; init; }

    /// <summary>The reported peak corrected for oversize: absent where no oversize was given, null where it cannot be computed.</summary>
    public CorrectedAnswer? Corrected { get; init; }

    /// <summary>The curve, or null where every specimen is set aside.</summary>
    public CurveAnswer? Curve { get; init; }

    /// <summary>The zero-air-voids line as [water content, dry density]; empty without a specific gravity.</summary>
    public required IReadOnlyList<double[]> ZeroAirVoids { get; init; }

    /// <summary>The other lines asked for; empty without a specific gravity.</summary>
    public required IReadOnlyList<LineAnswer> Lines { get; init; }

    /// <summary>Where one more specimen would tell most, or null where it would tell little.</summary>
    public NextSpecimenAnswer? NextSpecimen { get; init; }

    /// <summary>The working, where it was asked for.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyList<TraceStep>? Trace { get; init; }

    /// <summary>What a careful reviewer says, worst first.</summary>
    public required IReadOnlyList<FindingContract> Findings { get; init; }

    /// <summary>Addresses of the chart.</summary>
    public required LinksContract Links { get; init; }

    /// <summary>Version and digest.</summary>
    public required ProvenanceContract Provenance { get; init; }

    /// <summary>What to bear in mind.</summary>
    public required IReadOnlyList<string> Cautions { get; init; }

    /// <summary>Whether the request had an oversize: without it <see cref="Corrected"/> is not written.</summary>
    [JsonIgnore]
    public bool OversizeGiven { get; init; }
}

/// <summary>A test method.</summary>
/// <param name="Code" example="astm-d698-a">Its code.</param>
/// <param name="Title" example="ASTM D698, method A">Its name.</param>
/// <param name="Summary" example="Standard effort, 101.6 mm mold, soil passing 4.75 mm">What it is.</param>
/// <param name="Standard" example="ASTM D698">The standard; null for custom.</param>
/// <param name="Effort">Compactive effort.</param>
public sealed record MethodAnswer(string Code, string Title, string? Summary, string? Standard, EffortAnswer? Effort);

/// <summary>Compactive effort, kJ/m³.</summary>
/// <param name="Computed" example="593.5">From rammer, drop, layers, blows and the mold's volume; null where one is unknown.</param>
/// <param name="Nominal" example="600">As published; null where none is.</param>
public sealed record EffortAnswer(double? Computed, double? Nominal);

/// <summary>A specimen's reduced quantities; percentages in %.</summary>
/// <param name="Label" example="1">Its name.</param>
/// <param name="WaterContent" example="10.38">% of dry mass.</param>
/// <param name="WetDensity" example="1.878">In units.density.</param>
/// <param name="DryDensity" example="1.701">In units.density.</param>
/// <param name="VoidRatio" example="0.573">Ratio; null without a specific gravity above what the density asks.</param>
/// <param name="Porosity" example="36.4">%.</param>
/// <param name="Saturation" example="48.6">%.</param>
/// <param name="AirVoids" example="18.7">% of the total volume.</param>
/// <param name="SetAside" example="mold not full">Why it was not fitted, or null.</param>
public sealed record SpecimenAnswer(
    string Label, double WaterContent, double WetDensity, double DryDensity,
    double? VoidRatio, double? Porosity, double? Saturation, double? AirVoids, string? SetAside);

/// <summary>The peak of the curve.</summary>
/// <param name="WaterContent" example="13.87">Optimum water content, %.</param>
/// <param name="MaximumDryDensity" example="1.832">In units.density.</param>
/// <param name="Saturation" example="84.2">At the peak, %; null without a specific gravity.</param>
/// <param name="Uncertainty">How sure it is; null where nothing supports an uncertainty.</param>
/// <param name="Reported">Rounded as the method says.</param>
public sealed record OptimumAnswer(
    double WaterContent, double MaximumDryDensity, double? Saturation, OptimumUncertaintyAnswer? Uncertainty, ReportedAnswer Reported);

/// <summary>How sure the peak is.</summary>
public sealed record OptimumUncertaintyAnswer
{
    /// <summary>Of the optimum water content, percentage points.</summary>
    public UncertaintyAnswer? WaterContent { get; init; }

    /// <summary>Of the maximum dry density, in units.density.</summary>
    public UncertaintyAnswer? MaximumDryDensity { get; init; }

    /// <summary>Trials of the propagation; absent where no measurement uncertainties were given.</summary>
    /// <example>2000</example>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public int? Trials { get; init; }

    /// <summary>Which measurement matters most; absent where no measurement uncertainties were given.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyList<ContributionAnswer>? Contributions { get; init; }
}

/// <summary>A standard uncertainty with its interval.</summary>
/// <param name="Standard" example="0.38">Standard uncertainty.</param>
/// <param name="Interval" example="[13.4, 14.9]">Lower and upper end; null where nothing supports one.</param>
/// <param name="Coverage" example="0.95">Of the interval.</param>
public sealed record UncertaintyAnswer(double Standard, double[]? Interval, double Coverage);

/// <summary>A measured quantity's share of the propagated variance.</summary>
/// <param name="Quantity" example="volume">As in the request's uncertainty.</param>
/// <param name="Share" example="0.62">0 to 1; mean of the two that follow.</param>
/// <param name="OfWaterContent" example="0.31">Share of the optimum water content's variance.</param>
/// <param name="OfMaximumDryDensity" example="0.93">Share of the maximum dry density's variance.</param>
public sealed record ContributionAnswer(string Quantity, double Share, double OfWaterContent, double OfMaximumDryDensity);

/// <summary>A peak as it is reported: rounded half to even, with its unit.</summary>
/// <param name="WaterContent" example="13.9 %">Optimum water content.</param>
/// <param name="MaximumDryDensity" example="1.83 Mg/m³">Maximum dry density.</param>
public sealed record ReportedAnswer(string WaterContent, string MaximumDryDensity);

/// <summary>The engineer's own peak.</summary>
/// <param name="WaterContent" example="14.0">%.</param>
/// <param name="MaximumDryDensity" example="1.84">In units.density.</param>
/// <param name="Reason" example="drawn by hand through the wet leg">Why.</param>
/// <param name="Reported">Rounded as the method says.</param>
public sealed record AdoptedAnswer(double WaterContent, double MaximumDryDensity, string Reason, ReportedAnswer Reported);

/// <summary>The reported peak corrected for oversize.</summary>
/// <param name="WaterContent" example="12.7">%.</param>
/// <param name="MaximumDryDensity" example="1.89">In units.density.</param>
/// <param name="Reported">Rounded as the method says.</param>
public sealed record CorrectedAnswer(double WaterContent, double MaximumDryDensity, ReportedAnswer Reported);

/// <summary>The curve.</summary>
public sealed record CurveAnswer
{
    /// <summary>The model.</summary>
    /// <example>averaged</example>
    public required string Model { get; init; }

    /// <summary>Why this model.</summary>
    /// <example>The model asked for.</example>
    public required string Chosen { get; init; }

    /// <summary>The model's parameters by name.</summary>
    public required IReadOnlyDictionary<string, ParameterAnswer> Parameters { get; init; }

    /// <summary>Root mean square residual, in units.density.</summary>
    /// <example>0.0034</example>
    public double? RootMeanSquareError { get; init; }

    /// <summary>Root mean square leave-one-out error, in units.density; null where the points are too few.</summary>
    /// <example>0.0087</example>
    public double? LeaveOneOutError { get; init; }

    /// <summary>Points less parameters; null for the averaged model.</summary>
    /// <example>2</example>
    public int? DegreesOfFreedom { get; init; }

    /// <summary>The chance that the peak lies outside the tested range, 0 to 1; null for a model that does not tell.</summary>
    /// <example>0.004</example>
    public double? ChanceOfPeakOutside { get; init; }

    /// <summary>Each specimen kept against the curve, in the order of the request.</summary>
    public required IReadOnlyList<ResidualAnswer> Residuals { get; init; }

    /// <summary>The curve over the tested range as [water content, dry density].</summary>
    public required IReadOnlyList<double[]> Points { get; init; }

    /// <summary>Every other model.</summary>
    public required IReadOnlyList<AlternativeAnswer> Alternatives { get; init; }
}

/// <summary>A parameter of the model.</summary>
/// <param name="Value" example="0.91">In its unit.</param>
/// <param name="Unit" example="%">Empty for a ratio.</param>
/// <param name="StandardError" example="0.03">Null where nothing supports one.</param>
/// <param name="Meaning" example="Saturation far wet of the optimum">What it is.</param>
public sealed record ParameterAnswer(double Value, string Unit, double? StandardError, string Meaning);

/// <summary>A specimen against the curve; densities in units.density.</summary>
/// <param name="Label" example="3">The specimen.</param>
/// <param name="Fitted" example="1.829">The curve at its water content.</param>
/// <param name="Residual" example="0.003">Measured less fitted.</param>
/// <param name="LeaveOneOut" example="1.821">What the other specimens alone say; null where they cannot.</param>
/// <param name="LeaveOneOutStandard" example="0.016">Standard uncertainty of that.</param>
public sealed record ResidualAnswer(string Label, double Fitted, double Residual, double? LeaveOneOut, double? LeaveOneOutStandard);

/// <summary>Another model's answer.</summary>
/// <param name="Model" example="parabola">The model.</param>
/// <param name="Admissible" example="true">Whether it could stand for the answer.</param>
/// <param name="WhyNot" example="Its maximum is not inside the tested range.">Why it could not, or null.</param>
/// <param name="Optimum">Its peak, or null.</param>
/// <param name="RootMeanSquareError" example="0.0041">In units.density.</param>
/// <param name="LeaveOneOutError" example="0.0121">In units.density.</param>
public sealed record AlternativeAnswer(
    string Model, bool Admissible, string? WhyNot, OptimumAnswer? Optimum, double? RootMeanSquareError, double? LeaveOneOutError);

/// <summary>A line of constant saturation or air voids.</summary>
/// <param name="Kind" example="saturation">saturation or airVoids.</param>
/// <param name="Value" example="90">%.</param>
/// <param name="Points">As [water content, dry density].</param>
public sealed record LineAnswer(string Kind, double Value, IReadOnlyList<double[]> Points);

/// <summary>The specimen to make next.</summary>
/// <param name="WaterContent" example="15.5">%; a multiple of 0.5.</param>
/// <param name="Reason" example="One more specimen here narrows the optimum most.">Why.</param>
/// <param name="StandardNow" example="0.56">Standard uncertainty of the optimum water content now, percentage points; null where the step only brackets the peak.</param>
/// <param name="StandardAfter" example="0.52">The same after that specimen.</param>
public sealed record NextSpecimenAnswer(double WaterContent, string Reason, double? StandardNow, double? StandardAfter);

/// <summary>One step of the working.</summary>
/// <param name="Quantity" example="dry density of specimen 1">What is computed.</param>
/// <param name="Formula" example="ρd = ρ/(1 + w/100)">How.</param>
/// <param name="Substitution" example="1.878/(1+10.38/100)">The same with the numbers put in: bare arithmetic; null where a fit gives the value.</param>
/// <param name="Value" example="1.7014">Unrounded.</param>
/// <param name="Unit" example="Mg/m³">Its unit; empty for a ratio.</param>
/// <param name="Source" example="ASTM D698">Where the formula stands.</param>
/// <param name="Mathml" example="&lt;math&gt;…&lt;/math&gt;">The formula as MathML.</param>
public sealed record TraceStep(string Quantity, string Formula, string? Substitution, double Value, string Unit, string Source, string Mathml)
{
    internal static TraceStep Of(WorkingStep step) =>
        new(step.Quantity, step.Formula, step.Substitution, step.Value, step.Unit, step.Source, step.MathMl);
}
