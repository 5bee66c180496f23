using System.Text.Json;
using System.Text.RegularExpressions;

namespace Bittern.Reports.Tests.Machine;

/// <summary>
/// As much of JSON Schema 2020-12 as the published schema uses: type, properties, required, additionalProperties false, items, enum, const, pattern, anyOf, local $ref.
/// A keyword that it does not know is a fault of its own.
/// </summary>
internal sealed class MiniSchema(JsonElement root)
{
    private static readonly string[] Known =
    [
        "$schema",
        "$id",
        "$defs",
        "$ref",
        "title",
        "description",
        "type",
        "properties",
        "required",
        "additionalProperties",
        "items",
        "enum",
        "const",
        "pattern",
        "anyOf",
    ];

    public List<string> Faults(JsonElement value) => Check(root, value, "$");

    private List<string> Check(JsonElement schema, JsonElement value, string path)
    {
        var faults = new List<string>();
        foreach (var keyword in schema.EnumerateObject())
        {
            if (!Known.Contains(keyword.Name, StringComparer.Ordinal))
            {
                faults.Add(
                    $"{path}: the schema uses '{keyword.Name}', which this check does not know"
                );
            }
        }

        if (schema.TryGetProperty("$ref", out var reference))
        {
            return Check(
                root.GetProperty("$defs").GetProperty(reference.GetString()!["#/$defs/".Length..]),
                value,
                path
            );
        }

        if (
            schema.TryGetProperty("anyOf", out var choices)
            && !choices.EnumerateArray().Any(c => Check(c, value, path).Count == 0)
        )
        {
            faults.Add(
                $"{path}: matches none of its alternatives: {value.GetRawText()[..Math.Min(80, value.GetRawText().Length)]}"
            );
        }

        if (
            schema.TryGetProperty("type", out var type)
            && !Types(type).Contains(TypeOf(value), StringComparer.Ordinal)
        )
        {
            faults.Add($"{path}: is {TypeOf(value)}");
            return faults;
        }

        if (
            schema.TryGetProperty("const", out var constant)
            && !JsonElement.DeepEquals(constant, value)
        )
        {
            faults.Add($"{path}: is not {constant}");
        }

        if (
            schema.TryGetProperty("enum", out var allowed)
            && !allowed.EnumerateArray().Any(a => JsonElement.DeepEquals(a, value))
        )
        {
            faults.Add($"{path}: '{value}' is not in the list");
        }

        if (
            schema.TryGetProperty("pattern", out var pattern)
            && !Regex.IsMatch(
                value.GetString()!,
                pattern.GetString()!,
                RegexOptions.None,
                TimeSpan.FromSeconds(1)
            )
        )
        {
            faults.Add($"{path}: '{value}' does not match {pattern}");
        }

        if (schema.TryGetProperty("items", out var items))
        {
            faults.AddRange(
                value.EnumerateArray().SelectMany((v, i) => Check(items, v, $"{path}[{i}]"))
            );
        }

        if (schema.TryGetProperty("properties", out var properties))
        {
            faults.AddRange(
                schema
                    .GetProperty("required")
                    .EnumerateArray()
                    .Where(r => !value.TryGetProperty(r.GetString()!, out _))
                    .Select(r => $"{path}: lacks '{r}'")
            );
            foreach (var field in value.EnumerateObject())
            {
                faults.AddRange(
                    properties.TryGetProperty(field.Name, out var inner)
                        ? Check(inner, field.Value, $"{path}.{field.Name}")
                        : [$"{path}: '{field.Name}' is not in the schema"]
                );
            }
        }

        return faults;
    }

    private static IEnumerable<string> Types(JsonElement type) =>
        type.ValueKind == JsonValueKind.Array
            ? type.EnumerateArray().Select(t => t.GetString()!)
            : [type.GetString()!];

    private static string TypeOf(JsonElement value) =>
        value.ValueKind switch
        {
            JsonValueKind.Object => "object",
            JsonValueKind.Array => "array",
            JsonValueKind.String => "string",
            JsonValueKind.Number => "number",
            JsonValueKind.Null => "null",
            _ => "boolean",
        };
}
