using System.Collections.Immutable;

namespace Bittern.Diagnostics;

/// <summary>A file's text under the name that messages show. Immutable; the text may be any characters.</summary>
public sealed class SourceText
{
    private readonly ImmutableArray<int> _lineStarts;

    public SourceText(string name, string text)
    {
        Name = name;
        Text = text;
        var starts = ImmutableArray.CreateBuilder<int>();
        starts.Add(0);
        for (var i = 0; i < text.Length; i++)
        {
            if (text[i] == '\n')
            {
                starts.Add(i + 1);
            }
        }

        _lineStarts = starts.ToImmutable();
    }

    /// <summary>Path as the user gave it, with forward slashes.</summary>
    public string Name { get; }

    public string Text { get; }

    public int LineCount => _lineStarts.Length;

    /// <summary>Zero-based line and column (UTF-16 code units) of an offset; offsets past the end give the end.</summary>
    public (int Line, int Column) Position(int offset)
    {
        offset = Math.Clamp(offset, 0, Text.Length);
        var line = _lineStarts.BinarySearch(offset);
        if (line < 0)
        {
            line = ~line - 1;
        }

        return (line, offset - _lineStarts[line]);
    }

    /// <summary>Offset at which a zero-based line starts.</summary>
    public int LineStart(int line) => _lineStarts[line];

    /// <summary>Text of a zero-based line without its line break.</summary>
    public string Line(int line)
    {
        var start = _lineStarts[line];
        var end = line + 1 < _lineStarts.Length ? _lineStarts[line + 1] : Text.Length;
        return Text[start..end].TrimEnd('\r', '\n');
    }
}
