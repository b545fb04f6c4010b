using System.Runtime.CompilerServices;
using System.Text.Json;
using System.Text.Json.Serialization;
using System.Text.Json.Serialization.Metadata;

namespace Drypeak.Service.Hosting;

/// <summary>What the metadata of a contract type say of its values, in the words of JSON.</summary>
internal static class ContractShape
{
    private static readonly ConditionalWeakTable<JsonSerializerOptions, JsonSerializerOptions> Lenient = [];

    /// <summary>Type information of a member, an item or an entry.</summary>
    public static JsonTypeInfo Of(Type type, JsonSerializerOptions options) =>
        options.GetTypeInfo(Nullable.GetUnderlyingType(type) ?? type);

    /// <summary>"a number", "a list", ... for a sentence that says what was expected.</summary>
    public static string Describe(JsonTypeInfo type) => type.Kind switch
    {
        JsonTypeInfoKind.Object or JsonTypeInfoKind.Dictionary => "an object",
        JsonTypeInfoKind.Enumerable => "a list",
        _ when type.Type == typeof(double) => "a number",
        _ when type.Type == typeof(int) || type.Type == typeof(long) => "a whole number",
        _ when type.Type == typeof(bool) => "true or false",
        _ when type.Type == typeof(string) => "a text",
        _ => "another value",
    };

    /// <summary>
    /// The same contract with everything optional and with a text for a number read as not-a-number: to build what can be
    /// built of a document whose faulty members have been replaced.
    /// </summary>
    public static JsonTypeInfo<T> LenientOf<T>(JsonTypeInfo<T> type) =>
        (JsonTypeInfo<T>)Lenient.GetValue(type.Options, MakeLenient).GetTypeInfo(typeof(T));

    private static JsonSerializerOptions MakeLenient(JsonSerializerOptions strict)
    {
        var options = new JsonSerializerOptions(strict) { RespectNullableAnnotations = false, RespectRequiredConstructorParameters = false };
        options.Converters.Clear();
        options.Converters.Add(new NumberOrNothing());
        options.TypeInfoResolver = options.TypeInfoResolver!.WithAddedModifier(type =>
        {
            foreach (var member in type.Properties)
            {
                member.IsRequired = false;
            }
        });
        return options;
    }

    /// <summary>
    /// Not-a-number stands for a number that was given but cannot be had: the member does not count as missing, and
    /// comparing it finds no fault.
    /// </summary>
    private sealed class NumberOrNothing : JsonConverter<double>
    {
        public override double Read(ref Utf8JsonReader reader, Type typeToConvert, JsonSerializerOptions options) =>
            reader.TokenType == JsonTokenType.Number ? reader.GetDouble() : double.NaN;

        public override void Write(Utf8JsonWriter writer, double value, JsonSerializerOptions options) => writer.WriteNumberValue(value);
    }
}
