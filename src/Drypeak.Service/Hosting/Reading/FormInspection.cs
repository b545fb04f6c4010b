using System.Buffers;
using System.Globalization;
using System.Text.Json;
using System.Text.Json.Serialization.Metadata;

namespace Drypeak.Service.Hosting;

/// <summary>
/// Walks a document against the metadata of its contract and collects every fault of form: unknown, repeated, missing and
/// mistyped members, null where there is none, numbers out of range. Beside it the document is written anew with something
/// else in each faulty place, so that the rules can be asked about the rest.
/// </summary>
internal sealed class FormInspection
{
    /// <summary>Contracts may contain themselves (a field test a laboratory test, a lot field tests): stand-ins end here.</summary>
    private const int DeepestStandIn = 3;

    private readonly JsonSerializerOptions options;
    private readonly Utf8JsonWriter writer;
    private readonly bool standsIn;
    private readonly List<Fault> faults = [];
    private readonly List<string> doubtful = [];

    private FormInspection(JsonSerializerOptions options, Utf8JsonWriter writer, bool standsIn) =>
        (this.options, this.writer, this.standsIn) = (options, writer, standsIn);

    /// <summary>
    /// The faults in the order of the document, a missing member after the members that are there; at most one more than
    /// <see cref="Problems.MaximumFaults"/>, so that it can be said that there are more.
    /// </summary>
    public IReadOnlyList<Fault> Faults => faults;

    /// <summary>The document with a stand-in in each faulty place.</summary>
    public ReadOnlyMemory<byte> WithStandIns { get; private set; }

    /// <summary>The document without the faulty members; those that have to be there have their stand-in here too.</summary>
    public ReadOnlyMemory<byte> Without { get; private set; }

    private bool IsFull => faults.Count > Problems.MaximumFaults;

    public static FormInspection Of(JsonElement document, JsonTypeInfo contract)
    {
        var inspection = Of(document, contract, standsIn: true, out var withStandIns);
        inspection.WithStandIns = withStandIns;
        if (inspection.faults.Count > 0)
        {
            Of(document, contract, standsIn: false, out var without);
            inspection.Without = without;
        }

        return inspection;
    }

    private static FormInspection Of(JsonElement document, JsonTypeInfo contract, bool standsIn, out ReadOnlyMemory<byte> written)
    {
        var buffer = new ArrayBufferWriter<byte>();
        using var writer = new Utf8JsonWriter(buffer);
        var inspection = new FormInspection(contract.Options, writer, standsIn);
        inspection.Inspect(document, contract, Places.Whole, isOptional: false);
        writer.Flush();
        written = buffer.WrittenMemory;
        return inspection;
    }

    /// <summary>
    /// Whether a fault that a rule has found at a place may only follow from a fault of form: at, below or above a
    /// faulty place, or at the place of the member that an unknown name was probably meant for.
    /// </summary>
    public bool MayExplain(Fault fault) =>
        doubtful.Exists(place => Places.IsWithin(fault.Place, place) || Places.IsWithin(place, fault.Place));

    private void Inspect(JsonElement value, JsonTypeInfo type, string place, bool isOptional)
    {
        switch (type.Kind, value.ValueKind)
        {
            case (JsonTypeInfoKind.Object, JsonValueKind.Object):
                InspectMembers(value, type, place);
                break;
            case (JsonTypeInfoKind.Enumerable, JsonValueKind.Array):
                InspectItems(value, type, place);
                break;
            case (JsonTypeInfoKind.Dictionary, JsonValueKind.Object):
                InspectEntries(value, type, place);
                break;
            case (JsonTypeInfoKind.None, _):
                InspectScalar(value, type, place, isOptional);
                break;
            default:
                Refuse(WrongType(value, type, place), type, isOptional);
                break;
        }
    }

    private void InspectMembers(JsonElement value, JsonTypeInfo type, string place)
    {
        var members = type.Properties.Where(member => member.Set is not null || member.AssociatedParameter is not null).ToDictionary(member => member.Name);
        var seen = new HashSet<string>();
        var meant = new HashSet<string>();
        writer.WriteStartObject();
        foreach (var given in value.EnumerateObject())
        {
            var here = Places.Member(place, given.Name);
            if (!seen.Add(given.Name))
            {
                Report(new Fault(here, "repeated-member", $"\"{Received.Shorten(given.Name)}\" stands here more than once. Give it once."));
            }
            else if (members.TryGetValue(given.Name, out var member))
            {
                writer.WritePropertyName(given.Name);
                InspectNullable(given.Value, ContractShape.Of(member.PropertyType, options), here, allowsNull: member.IsSetNullable && AcceptsNull(member.PropertyType));
            }
            else if (ReportUnknown(given.Name, members.Keys, place) is { } name)
            {
                meant.Add(name);
            }
        }

        foreach (var absent in members.Values.Where(member => !seen.Contains(member.Name) && (member.IsRequired || meant.Contains(member.Name))))
        {
            var shape = ContractShape.Of(absent.PropertyType, options);
            writer.WritePropertyName(absent.Name);
            WriteInPlace(shape, isOptional: !absent.IsRequired);
            if (absent.IsRequired)
            {
                Report(new Fault(Places.Member(place, absent.Name), "missing-member", $"\"{absent.Name}\" is missing. Give it: {ContractShape.Describe(shape)}."));
            }
        }

        writer.WriteEndObject();
    }

    private void InspectItems(JsonElement value, JsonTypeInfo type, string place)
    {
        var item = ContractShape.Of(type.ElementType!, options);
        var allowsNull = Nullable.GetUnderlyingType(type.ElementType!) is not null;
        writer.WriteStartArray();
        foreach (var (index, given) in value.EnumerateArray().Index())
        {
            InspectNullable(given, item, Places.Item(place, index), allowsNull);
        }

        writer.WriteEndArray();
    }

    private void InspectEntries(JsonElement value, JsonTypeInfo type, string place)
    {
        var entry = ContractShape.Of(type.ElementType!, options);
        var allowsNull = Nullable.GetUnderlyingType(type.ElementType!) is not null;
        var seen = new HashSet<string>();
        writer.WriteStartObject();
        foreach (var given in value.EnumerateObject())
        {
            var here = Places.Member(place, given.Name);
            if (!seen.Add(given.Name))
            {
                Report(new Fault(here, "repeated-member", $"\"{Received.Shorten(given.Name)}\" stands here more than once. Give it once."));
                continue;
            }

            writer.WritePropertyName(given.Name);
            InspectNullable(given.Value, entry, here, allowsNull);
        }

        writer.WriteEndObject();
    }

    private void InspectNullable(JsonElement value, JsonTypeInfo type, string place, bool allowsNull)
    {
        if (value.ValueKind != JsonValueKind.Null)
        {
            Inspect(value, type, place, allowsNull);
        }
        else if (allowsNull)
        {
            writer.WriteNullValue();
        }
        else
        {
            Refuse(new Fault(place, "null-not-allowed", $"null cannot stand here. Give {ContractShape.Describe(type)}."), type, isOptional: false);
        }
    }

    private void InspectScalar(JsonElement value, JsonTypeInfo type, string place, bool isOptional)
    {
        if (ScalarFault(value, type, place) is { } fault)
        {
            Refuse(fault, type, isOptional);
        }
        else
        {
            value.WriteTo(writer);
        }
    }

    private static Fault? ScalarFault(JsonElement value, JsonTypeInfo type, string place)
    {
        if (type.Type == typeof(double))
        {
            return value.ValueKind != JsonValueKind.Number ? WrongType(value, type, place)
                : double.IsFinite(value.GetDouble()) ? null
                : OutOfRange(value, place, "Numbers may have a magnitude of up to 1.7e308.");
        }

        if (type.Type == typeof(int) || type.Type == typeof(long))
        {
            return value.ValueKind != JsonValueKind.Number || value.GetRawText().AsSpan().ContainsAny('.', 'e', 'E') ? WrongType(value, type, place)
                : (type.Type == typeof(int) ? value.TryGetInt32(out _) : value.TryGetInt64(out _)) ? null
                : OutOfRange(value, place, type.Type == typeof(int) ? "Whole numbers here lie between -2147483648 and 2147483647." : "Whole numbers here have up to 18 digits.");
        }

        if (type.Type == typeof(string))
        {
            return value.ValueKind == JsonValueKind.String ? null : WrongType(value, type, place);
        }

        if (type.Type == typeof(bool))
        {
            return value.ValueKind is JsonValueKind.True or JsonValueKind.False ? null : WrongType(value, type, place);
        }

        throw new NotSupportedException($"A contract has a member of the type {type.Type}, for which there is no reading.");
    }

    private static Fault WrongType(JsonElement value, JsonTypeInfo type, string place)
    {
        var looksLikeNumber = value.ValueKind == JsonValueKind.String
            && double.TryParse(value.GetString()!.Replace(',', '.'), NumberStyles.Float, CultureInfo.InvariantCulture, out _);
        var advice = looksLikeNumber && type.Type == typeof(double) ? " Write it without quotes, with a decimal point." : "";
        return new Fault(place, "wrong-type", $"Expected {ContractShape.Describe(type)}, received {Received.Describe(value)}.{advice}");
    }

    private static Fault OutOfRange(JsonElement value, string place, string bounds) =>
        new(place, "number-out-of-range", $"Received {Received.Describe(value)}. {bounds}");

    /// <returns>The name that was probably meant, or null.</returns>
    private string? ReportUnknown(string name, IReadOnlyCollection<string> known, string place)
    {
        if (IsFull)
        {
            return null;
        }

        var meant = NearestName.Of(name, known);
        var advice = meant is not null ? $"Did you mean \"{meant}\"?" : $"The members here are {string.Join(", ", known)}.";
        Report(new Fault(Places.Member(place, name), "unknown-member", $"There is no member \"{Received.Shorten(name)}\" here. {advice}"));
        if (meant is not null)
        {
            doubtful.Add(Places.Member(place, meant));
        }

        return meant;
    }

    private void Refuse(Fault fault, JsonTypeInfo type, bool isOptional)
    {
        Report(fault);
        WriteInPlace(type, isOptional);
    }

    private void WriteInPlace(JsonTypeInfo type, bool isOptional)
    {
        if (isOptional && !standsIn)
        {
            writer.WriteNullValue();
        }
        else
        {
            WriteStandIn(type);
        }
    }

    private void Report(Fault fault)
    {
        if (!IsFull)
        {
            faults.Add(fault);
            doubtful.Add(fault.Place);
        }
    }

    /// <summary>
    /// A value that counts as given, and of which nothing is known: an object with all its members, a list of one item.
    /// What the rules say of it is dropped; what stands elsewhere and needs it finds that it is there. For a number a text
    /// is written, see <see cref="ContractShape.LenientOf"/>.
    /// </summary>
    private void WriteStandIn(JsonTypeInfo type, int depth = 0)
    {
        switch (type.Kind)
        {
            case JsonTypeInfoKind.Object:
                writer.WriteStartObject();
                foreach (var member in type.Properties.Where(member => member.IsRequired || depth < DeepestStandIn))
                {
                    writer.WritePropertyName(member.Name);
                    WriteStandIn(ContractShape.Of(member.PropertyType, options), depth + 1);
                }

                writer.WriteEndObject();
                break;
            case JsonTypeInfoKind.Enumerable:
                writer.WriteStartArray();
                if (depth < DeepestStandIn)
                {
                    WriteStandIn(ContractShape.Of(type.ElementType!, options), depth + 1);
                }

                writer.WriteEndArray();
                break;
            case JsonTypeInfoKind.Dictionary:
                writer.WriteStartObject();
                writer.WriteEndObject();
                break;
            case var _ when type.Type == typeof(string) || type.Type == typeof(double):
                writer.WriteStringValue("");
                break;
            case var _ when type.Type == typeof(bool):
                writer.WriteBooleanValue(false);
                break;
            default:
                writer.WriteNumberValue(0);
                break;
        }
    }

    private static bool AcceptsNull(Type type) => !type.IsValueType || Nullable.GetUnderlyingType(type) is not null;
}
