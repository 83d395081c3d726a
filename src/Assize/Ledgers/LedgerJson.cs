using System.Text.Json.Serialization;

namespace Assize;

/// <summary>How an entry is written: camel case, infinities by name.</summary>
[JsonSourceGenerationOptions(
    PropertyNamingPolicy = JsonKnownNamingPolicy.CamelCase,
    UseStringEnumConverter = true,
    NumberHandling = JsonNumberHandling.AllowNamedFloatingPointLiterals,
    DefaultIgnoreCondition = JsonIgnoreCondition.WhenWritingNull)]
[JsonSerializable(typeof(LedgerEntry))]
sealed partial class LedgerJson : JsonSerializerContext;
