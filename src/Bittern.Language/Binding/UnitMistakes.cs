using Bittern.Chemistry;
using Bittern.Diagnostics;
using Bittern.Diagnostics.Codes;

namespace Bittern.Language.Binding;

/// <summary>Units that do not fit, with the dimension that they do have.</summary>
internal static class UnitMistakes
{
    public static Diagnostic Wrong(SourceSpan span, string unit, string what, string example)
    {
        var dimension = UnitReader.TryRead(unit, out var read, out _)
            ? read!.Dimension.ToString()
            : "no unit";
        return WrongUnit.At(span, unit, dimension, what, example);
    }
}
