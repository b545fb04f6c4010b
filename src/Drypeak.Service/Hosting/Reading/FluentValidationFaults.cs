using System.Text;
using System.Text.Json;
using FluentValidation.Results;

namespace Drypeak.Service.Hosting;

/// <summary>Turns what FluentValidation finds into faults.</summary>
public static class FluentValidationFaults
{
    /// <summary>
    /// One fault for each failure, in its order: the property path as a pointer with the contract's names, the code from
    /// <c>WithErrorCode</c>, the message as it stands.
    /// </summary>
    public static IReadOnlyList<Fault> ToFaults(this ValidationResult result) =>
        [.. result.Errors.Select(failure => new Fault(PlaceOf(failure.PropertyName), failure.ErrorCode, failure.ErrorMessage))];

    /// <summary><c>Specimens[0].Tins[1].Dry</c> gives <c>/specimens/0/tins/1/dry</c>; what stands in brackets is taken as it is.</summary>
    internal static string PlaceOf(string propertyPath)
    {
        var place = new StringBuilder();
        var rest = propertyPath.AsSpan();
        while (rest.Length > 0)
        {
            var isIndex = rest[0] == '[';
            var end = isIndex ? rest.IndexOf(']') : rest.IndexOfAny('.', '[');
            var name = (end < 0 ? rest[(isIndex ? 1 : 0)..] : rest[(isIndex ? 1 : 0)..end]).ToString();
            place.Append(Places.Member(Places.Whole, isIndex ? name : JsonNamingPolicy.CamelCase.ConvertName(name)));
            rest = end < 0 ? [] : rest[(isIndex ? end + 1 : end)..];
            rest = rest.TrimStart('.');
        }

        return place.ToString();
    }
}
