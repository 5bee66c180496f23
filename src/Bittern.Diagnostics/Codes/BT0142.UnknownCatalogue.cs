namespace Bittern.Diagnostics.Codes;

/// <summary>BT0142: no such catalogue.</summary>
public static class UnknownCatalogue
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new(
            "BT0142",
            Severity.Error,
            "No such catalogue",
            "without its species the recipe cannot be understood"
        )
        {
            Explanation = """
                Catalogues are shipped with the tool; `bittern catalogue` lists them. A file of your own is named in quotation marks: `use
                "constants/site.bittern"`.
                """,
            Wrong = """
                use catalogue mayor
                """,
            Right = """
                use catalogue major
                """,
        };

    public static Diagnostic At(
        SourceSpan span,
        string name,
        string? near,
        IEnumerable<string> names
    ) =>
        Descriptor.At(
            span,
            $"there is no catalogue '{name}'",
            near is null
                ? $"the catalogues are {string.Join(", ", names)}"
                : $"did you mean '{near}'?"
        );
}
