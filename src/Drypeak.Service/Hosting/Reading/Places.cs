using System.Globalization;

namespace Drypeak.Service.Hosting;

/// <summary>Builds and compares places in a JSON document, written as pointers by RFC 6901.</summary>
public static class Places
{
    /// <summary>The whole document.</summary>
    public const string Whole = "";

    /// <summary>The place of a member; <c>~</c> and <c>/</c> in its name are escaped (RFC 6901, section 3).</summary>
    public static string Member(string parent, string name) =>
        $"{parent}/{name.Replace("~", "~0", StringComparison.Ordinal).Replace("/", "~1", StringComparison.Ordinal)}";

    /// <summary>The place of an item of a list, counted from 0.</summary>
    public static string Item(string parent, int index) =>
        string.Create(CultureInfo.InvariantCulture, $"{parent}/{index}");

    /// <summary>The place one level up, or null for the whole.</summary>
    public static string? Parent(string place) =>
        place.LastIndexOf('/') is var slash and >= 0 ? place[..slash] : null;

    /// <summary>Whether <paramref name="place"/> is <paramref name="ancestor"/> or lies below it.</summary>
    public static bool IsWithin(string place, string ancestor) =>
        place.StartsWith(ancestor, StringComparison.Ordinal)
        && (place.Length == ancestor.Length || place[ancestor.Length] == '/');
}
