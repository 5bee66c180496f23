namespace Bittern.Diagnostics.Codes;

/// <summary>BT0143: a file that cannot be read.</summary>
public static class FileNotRead
{
    public static DiagnosticDescriptor Descriptor { get; } =
        new("BT0143", Severity.Error, "A file that cannot be read", "what it declares is missing")
        {
            Explanation = """
                A recipe reads files in its own folder and below, so that it can be handed on as one folder and cannot reach anything else.
                """,
            Wrong = """
                use "nowhere.bittern"
                """,
            Right = "",
        };

    public static Diagnostic At(SourceSpan span, string path, string reason) =>
        Descriptor.At(
            span,
            $"\"{path}\" was not read: {reason}",
            "give a path inside the recipe's own folder, with forward slashes"
        );
}
