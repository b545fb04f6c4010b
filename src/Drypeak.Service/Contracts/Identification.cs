using Drypeak.Service.Hosting;

namespace Drypeak.Service.Contracts;

/// <summary>The caller's own labels on a test, bounded in number and length.</summary>
internal static class Identification
{
    private const string Place = "/identification";

    /// <summary>Every broken rule. The labels are the caller's: no path of property names could hold them, so their places are built here.</summary>
    public static IEnumerable<Fault> Check(IReadOnlyDictionary<string, string>? labels, Limits limits)
    {
        if (labels?.Count > limits.IdentificationLabels)
        {
            yield return new Fault(Place, "too-many", $"There may be up to {limits.IdentificationLabels} labels; there are {labels.Count}.");
        }

        foreach (var (label, text) in labels ?? new Dictionary<string, string>())
        {
            if (label.Length > limits.NameCharacters || text?.Length > limits.TextCharacters)
            {
                yield return new Fault(Places.Member(Place, label), "too-long",
                    $"A label may have up to {limits.NameCharacters} characters and its text up to {limits.TextCharacters}. Shorten it.");
            }
        }
    }
}
