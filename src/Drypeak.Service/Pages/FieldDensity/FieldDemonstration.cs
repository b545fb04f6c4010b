using Microsoft.Extensions.Primitives;

namespace Drypeak.Service.Pages.FieldDensity;

/// <summary>A worked field test from the Ternmarsh embankment, an invented site, one click away.</summary>
/// <param name="Name">Its name in the address.</param>
/// <param name="Label">What it shows.</param>
/// <param name="Texts">The form, filled.</param>
internal sealed record FieldDemonstration(string Name, string Label, IReadOnlyList<KeyValuePair<string, StringValues>> Texts)
{
    public static IReadOnlyList<FieldDemonstration> All { get; } =
    [
        new("accepted", "a sand cone test that passes", Filled(
            ("reference", "Ternmarsh, lift 4, 1+240, 3 m left"), ("method", "sand-cone"),
            ("sand-before", "6420"), ("sand-after", "2710"), ("sand-cone", "1530"), ("sand-density", "1.42"),
            ("soil-wet", "3120.5"), ("water-content", "11.8"), ("specific-gravity", "2.68"), ("determined", "measured"),
            ("oversize-percent", "12"), ("oversize-gravity", "2.65"), ("oversize-water", "1.5"),
            ("maximum-dry-density", "1.83"), ("optimum-water-content", "13.9"), ("maximum-uncertainty", "0.010"), ("optimum-uncertainty", "0.3"),
            ("dry-uncertainty", "0.015"), ("water-uncertainty", "0.3"), ("least-compaction", "95"), ("driest", "-2"), ("wettest", "2"))),
        new("rejected", "a gauge test that fails", Filled(
            ("reference", "Ternmarsh, lift 5, 1+310, crest"), ("method", "nuclear-gauge"),
            ("gauge-density", "1.958 1.966"), ("gauge-water", "15.8 16.2"), ("specific-gravity", "2.68"), ("determined", "measured"),
            ("maximum-dry-density", "1.83"), ("optimum-water-content", "13.9"), ("least-compaction", "95"), ("driest", "-2"), ("wettest", "2"))),
        new("undecided", "a test too close to its limit to say", Filled(
            ("reference", "Ternmarsh, lift 5, 1+360, 2 m right"), ("method", "drive-cylinder"),
            ("cylinder-volume", "1000"), ("soil-full", "3272"), ("soil-container", "1280"), ("tin", "31.2"), ("tin-wet", "152.4"), ("tin-dry", "137.9"),
            ("maximum-dry-density", "1.83"), ("optimum-water-content", "13.9"), ("maximum-uncertainty", "0.010"), ("dry-uncertainty", "0.012"),
            ("least-compaction", "95"), ("rule", "guarded"), ("risk", "0.05"))),
    ];

    /// <summary>Its address.</summary>
    public string Address => "/field?demo=" + Name;

    private static IReadOnlyList<KeyValuePair<string, StringValues>> Filled(params (string Name, string Text)[] texts) =>
        [.. texts.Select(text => KeyValuePair.Create(text.Name, new StringValues(text.Text)))];
}
