using System.Collections.Immutable;
using System.Security.Cryptography;
using System.Text;
using Bittern.Diagnostics;
using Bittern.Model;

namespace Bittern.Reports;

/// <summary>What ties a report to its inputs. No clock, no host: the same inputs give the same stamp.</summary>
/// <param name="ToolVersion">Version of Bittern, e.g. <c>0.1.0</c>.</param>
/// <param name="Inputs">Every input file, the recipe first.</param>
public sealed record ReportStamp(string ToolVersion, ImmutableArray<FileHash> Inputs)
{
    /// <summary>A stamp of a recipe's sources as they were read.</summary>
    public static ReportStamp Of(Recipe recipe, string toolVersion) =>
        new(toolVersion, [.. recipe.Sources.Select(FileHash.Of)]);
}

/// <summary>The SHA-256 of an input file.</summary>
/// <param name="Name">Name as shown to the user, forward slashes.</param>
/// <param name="Sha256">64 lower-case hexadecimal digits.</param>
public sealed record FileHash(string Name, string Sha256)
{
    /// <summary>Hash of a source's text as UTF-8 without byte order mark: what <c>sha256sum</c> prints for a file saved that way.</summary>
    public static FileHash Of(SourceText source) =>
        Of(source.Name, Encoding.UTF8.GetBytes(source.Text));

    /// <summary>Hash of a file's bytes.</summary>
    public static FileHash Of(string name, ReadOnlySpan<byte> bytes) =>
        new(name, Convert.ToHexStringLower(SHA256.HashData(bytes)));
}
