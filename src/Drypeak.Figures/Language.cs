using Drypeak.Figures.Layout;

namespace Drypeak.Figures;

/// <summary>A language that figures speak, with its decimal mark. Immutable, safe on any thread.</summary>
public sealed record Language
{
    private Language(string code, Phrases phrases) => (Code, Phrases) = (code, phrases);

    /// <summary>English, with a decimal point.</summary>
    public static Language English { get; } = new("en", TranslatedPhrases.English);

    /// <summary>All languages, the usual one first; those other than English have a decimal comma.</summary>
    public static IReadOnlyList<Language> All { get; } =
    [
        English,
        new("de", TranslatedPhrases.German),
        new("fr", TranslatedPhrases.French),
        new("es", TranslatedPhrases.Spanish),
        new("pt", TranslatedPhrases.Portuguese),
    ];

    /// <summary>Its code: ISO 639-1.</summary>
    public string Code { get; }

    /// <summary>Its words.</summary>
    internal Phrases Phrases { get; }
}
