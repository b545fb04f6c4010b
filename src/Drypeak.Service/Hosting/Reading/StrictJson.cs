using System.Text.Encodings.Web;
using System.Text.Json;
using System.Text.Json.Serialization;
using System.Text.Json.Serialization.Metadata;

namespace Drypeak.Service.Hosting;

/// <summary>How the service reads and writes JSON: camelCase, exact names, nothing unknown, nothing twice, no number that is not finite.</summary>
public static class StrictJson
{
    /// <summary>Objects and lists may lie this deep in one another.</summary>
    public const int MaximumDepth = 16;

    /// <summary>Options over contexts of generated contract types, such as <c>StrictJson.Options(LaboratoryJson.Default)</c>. To be made once and kept.</summary>
    public static JsonSerializerOptions Options(params IEnumerable<IJsonTypeInfoResolver> contracts)
    {
        var options = new JsonSerializerOptions();
        Configure(options, contracts);
        return options;
    }

    /// <summary>Type information of a contract by these options.</summary>
    public static JsonTypeInfo<T> Contract<T>(this JsonSerializerOptions options) => (JsonTypeInfo<T>)options.GetTypeInfo(typeof(T));

    /// <summary>Sets the rules on options that someone else has made, such as those of the HTTP endpoints.</summary>
    public static void Configure(JsonSerializerOptions options, params IEnumerable<IJsonTypeInfoResolver> contracts)
    {
        options.PropertyNamingPolicy = JsonNamingPolicy.CamelCase;
        options.PropertyNameCaseInsensitive = false;
        options.UnmappedMemberHandling = JsonUnmappedMemberHandling.Disallow;
        options.AllowDuplicateProperties = false;
        options.RespectNullableAnnotations = true;
        options.RespectRequiredConstructorParameters = true;
        options.NumberHandling = JsonNumberHandling.Strict;
        options.MaxDepth = MaximumDepth;
        options.Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping;
        options.Converters.Add(new FiniteNumber());
        options.TypeInfoResolver = JsonTypeInfoResolver.Combine([.. contracts]).WithAddedModifier(RefuseNullWhereRequired);
    }

    /// <summary>A member that is marked as required has to have a value, even where its type could be null; a constructor's parameter says by its own type.</summary>
    private static void RefuseNullWhereRequired(JsonTypeInfo type)
    {
        foreach (var member in type.Properties.Where(member => member.IsSetNullable && member.AttributeProvider?.IsDefined(typeof(JsonRequiredAttribute), false) is true))
        {
            member.IsSetNullable = false;
        }
    }

    /// <summary>The framework reads 1e999 as infinity; here it is refused.</summary>
    private sealed class FiniteNumber : JsonConverter<double>
    {
        public override double Read(ref Utf8JsonReader reader, Type typeToConvert, JsonSerializerOptions options) =>
            reader.TokenType == JsonTokenType.Number && reader.GetDouble() is var number && double.IsFinite(number)
                ? number
                : throw new JsonException();

        public override void Write(Utf8JsonWriter writer, double value, JsonSerializerOptions options) => writer.WriteNumberValue(value);
    }
}
