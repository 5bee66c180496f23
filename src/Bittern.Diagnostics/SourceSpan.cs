namespace Bittern.Diagnostics;

/// <summary>A stretch of one source. Value equality; a length of zero marks a place between characters.</summary>
public readonly record struct SourceSpan(SourceText Source, int Start, int Length)
{
    public int End => Start + Length;

    public string Text =>
        Source.Text.Substring(Start, Math.Min(Length, Source.Text.Length - Start));

    /// <summary>The smallest span that holds both; they lie in one source.</summary>
    public SourceSpan To(SourceSpan other)
    {
        var start = Math.Min(Start, other.Start);
        return new SourceSpan(Source, start, Math.Max(End, other.End) - start);
    }

    public override string ToString()
    {
        var (line, column) = Source.Position(Start);
        return $"{Source.Name}:{line + 1}:{column + 1}";
    }
}
