using System.Diagnostics.CodeAnalysis;
using System.Text.Json;
using System.Text.Json.Serialization.Metadata;

namespace Drypeak.Service.Hosting;

/// <summary>
/// Bytes to a contract. A right request takes one pass of the framework's own reader, and its rules. Only where the
/// reader or a rule objects is the document walked, to find all that is wrong with it and not just the first.
/// </summary>
public static class JsonReading
{
    /// <summary>Reads one JSON text.</summary>
    /// <typeparam name="T">The contract type.</typeparam>
    /// <param name="bytes">JSON in UTF-8; a byte order mark is skipped.</param>
    /// <param name="contract">Type information by <see cref="StrictJson"/>.</param>
    /// <param name="rules">
    /// What the contract's form does not say: bounds, contradictions. They are asked about documents with faults of form too,
    /// once with the optional faulty members absent and once with stand-ins for them: an empty text, false, 0, not-a-number
    /// for a number that may be a fraction. So rules between members compare numbers by operators that are false for
    /// not-a-number (<c>dry &gt; wet</c> is a fault).
    /// </param>
    /// <returns>The value; or 400 where the form is wrong, with the rules' faults that do not merely follow; or 422 where only rules are broken.</returns>
    public static Read<T> Read<T>(ReadOnlyMemory<byte> bytes, JsonTypeInfo<T> contract, Func<T, IReadOnlyList<Fault>> rules)
        where T : class
    {
        var text = JsonText.WithoutByteOrderMark(bytes);
        if (JsonText.EncodingFault(text.Span) is { } unreadable)
        {
            return Problems.InvalidForm([unreadable]);
        }

        return IsPlain(text.Span) && TryDeserialize(text.Span, contract, out var value)
            ? Judge(value, text, rules)
            : Inspect(text, contract, rules);
    }

    /// <summary>Without a null and without escaped letters the framework's reader misses nothing: it takes null items, and does not look into names.</summary>
    private static bool IsPlain(ReadOnlySpan<byte> text) => text.IndexOf("null"u8) < 0 && text.IndexOf("\\u"u8) < 0;

    private static bool TryDeserialize<T>(ReadOnlySpan<byte> text, JsonTypeInfo<T> contract, [NotNullWhen(true)] out T? value)
        where T : class
    {
        try
        {
            value = JsonSerializer.Deserialize(text, contract);
            return value is not null;
        }
        catch (JsonException)
        {
            // What it says is in the words of .NET and only about the first fault: the walk says it better.
            value = null;
            return false;
        }
    }

    private static Read<T> Judge<T>(T value, ReadOnlyMemory<byte> text, Func<T, IReadOnlyList<Fault>> rules)
        where T : class
    {
        var broken = rules(value);
        if (broken.Count == 0)
        {
            return value;
        }

        using var document = Parse(text);
        return Problems.InvalidValues(DocumentOrder.Sort(broken, document.RootElement));
    }

    private static Read<T> Inspect<T>(ReadOnlyMemory<byte> text, JsonTypeInfo<T> contract, Func<T, IReadOnlyList<Fault>> rules)
        where T : class
    {
        if (JsonText.SyntaxFault(text.Span) is { } broken)
        {
            return Problems.InvalidForm([broken]);
        }

        using var document = Parse(text);
        var form = FormInspection.Of(document.RootElement, contract);
        if (form.Faults.Count == 0)
        {
            return TryDeserialize(text.Span, contract, out var value)
                ? Judge(value, text, rules)
                : throw new NotSupportedException($"The reader of {typeof(T)} refuses what its metadata allow.");
        }

        var faults = form.Faults.Count > Problems.MaximumFaults ? form.Faults : [.. form.Faults, .. Unexplained(form, contract, rules)];
        return Problems.InvalidForm(DocumentOrder.Sort(faults, document.RootElement));
    }

    /// <summary>
    /// The broken rules that do not follow from the faults of form: they are broken whether the faulty members are taken
    /// as given or as absent, and in another place.
    /// </summary>
    private static IEnumerable<Fault> Unexplained<T>(FormInspection form, JsonTypeInfo<T> contract, Func<T, IReadOnlyList<Fault>> rules)
        where T : class
    {
        var lenient = ContractShape.LenientOf(contract);
        IReadOnlyList<Fault> Broken(ReadOnlyMemory<byte> text) => rules(JsonSerializer.Deserialize(text.Span, lenient)!);
        var whereGiven = Broken(form.WithStandIns).Select(fault => (fault.Place, fault.Code)).ToHashSet();
        return Broken(form.Without).Where(fault => whereGiven.Contains((fault.Place, fault.Code)) && !form.MayExplain(fault));
    }

    private static JsonDocument Parse(ReadOnlyMemory<byte> text) =>
        JsonDocument.Parse(text, new JsonDocumentOptions { MaxDepth = StrictJson.MaximumDepth });
}
