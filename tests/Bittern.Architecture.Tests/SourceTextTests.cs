using System.Text;
using System.Text.RegularExpressions;
using Xunit;

namespace Bittern.Architecture.Tests;

/// <summary>What no file of the repository may hold: unfinished work, places on somebody's machine, hosts that nobody agreed to.</summary>
public sealed class SourceTextTests
{
    private static readonly TimeSpan Patience = TimeSpan.FromSeconds(10);

    private static readonly HashSet<string> TextFiles = new(StringComparer.OrdinalIgnoreCase)
    {
        "",
        ".bittern",
        ".cs",
        ".csproj",
        ".css",
        ".csv",
        ".html",
        ".js",
        ".json",
        ".lua",
        ".md",
        ".mjs",
        ".props",
        ".py",
        ".sh",
        ".slnx",
        ".svg",
        ".targets",
        ".txt",
        ".vim",
        ".xml",
        ".yaml",
        ".yml",
    };

    // Names of schemas and publications, addresses kept for examples, this machine; nothing that a build or a run would fetch.
    private static readonly string[] AgreedHosts =
    [
        "doi.org",
        "json-schema.org",
        "json.schemastore.org",
        "www.w3.org",
        "docs.oasis-open.org",
        "schemas.microsoft.com",
        "creativecommons.org",
        "example.org",
        "127.0.0.1",
    ];

    [Fact]
    public void No_file_names_a_place_on_a_machine()
    {
        // Written in pieces, so that this file passes its own test.
        var place = new Regex(
            @"(?<![\w.~-])/"
                + @"(work|home|root|tmp|Users|mnt)/\w|\b[A-Z]:\\"
                + @"\w|\.\./"
                + "shared",
            RegexOptions.CultureInvariant | RegexOptions.ExplicitCapture,
            Patience
        );
        Findings.None(Found(place, _ => true));
    }

    [Fact]
    public void No_file_names_a_host_that_is_not_agreed()
    {
        var host = new Regex(
            @"https?://(?<host>[\w-]+(\.[\w-]+)+)",
            RegexOptions.CultureInvariant | RegexOptions.ExplicitCapture,
            Patience
        );
        Findings.None(
            Found(host, m => !AgreedHosts.Contains(m.Groups["host"].Value, StringComparer.Ordinal))
        );
    }

    [Fact]
    public void No_work_is_left_for_later()
    {
        var later = new Regex(
            @"\bTO" + @"DO\b|\bFIX" + @"ME\b|\bNotImplemented" + @"Exception\b|\bSkip\s*=\s*""",
            RegexOptions.CultureInvariant | RegexOptions.ExplicitCapture,
            Patience
        );
        Findings.None(Found(later, _ => true));
    }

    [Fact]
    public void Texts_are_utf8_without_a_mark_and_with_plain_line_ends()
    {
        var strict = new UTF8Encoding(
            encoderShouldEmitUTF8Identifier: false,
            throwOnInvalidBytes: true
        );
        var faults = new List<string>();
        foreach (var (name, full) in Texts())
        {
            var bytes = File.ReadAllBytes(full);
            if (bytes.AsSpan().StartsWith("\uFEFF"u8))
            {
                faults.Add(name + ": starts with a byte order mark");
            }

            if (bytes.AsSpan().Contains((byte)'\r'))
            {
                faults.Add(name + ": has carriage returns");
            }

            try
            {
                _ = strict.GetCharCount(bytes);
            }
            catch (DecoderFallbackException)
            {
                faults.Add(name + ": is not UTF-8");
            }
        }

        Findings.None(faults);
    }

    private static IEnumerable<(string Name, string Full)> Texts() =>
        House.Files().Where(f => TextFiles.Contains(Path.GetExtension(f.Name)));

    private static List<string> Found(Regex pattern, Func<Match, bool> counts)
    {
        var found = new List<string>();
        foreach (var (name, full) in Texts())
        {
            var text = File.ReadAllText(full);
            foreach (Match match in pattern.Matches(text))
            {
                if (counts(match))
                {
                    var line = text.AsSpan(0, match.Index).Count('\n') + 1;
                    found.Add($"{name}:{line}: {match.Value}");
                }
            }
        }

        return found;
    }
}
