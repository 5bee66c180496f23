using System.Text.Json;
using System.Text.RegularExpressions;
using Bittern.Language.Lexing;
using Xunit;

namespace Bittern.Cli.Tests;

/// <summary>Editors colour the words that the language has, and their files can be read.</summary>
public sealed class EditorSupportTests
{
    private static string Text(string file) =>
        File.ReadAllText(Path.Combine(Golden.Repository, "editor-support", file));

    [Theory]
    [InlineData("vscode/syntaxes/bittern.tmLanguage.json")]
    [InlineData("neovim/syntax/bittern.vim")]
    public void Every_keyword_is_coloured(string file)
    {
        var words = Regex
            .Matches(
                Text(file),
                "[A-Za-z]+(?:-[a-z]+)*",
                RegexOptions.ExplicitCapture | RegexOptions.CultureInvariant,
                TimeSpan.FromSeconds(5)
            )
            .Select(m => m.Value)
            .ToHashSet(StringComparer.Ordinal);

        var missing = string.Join(", ", Keywords.All.Where(k => !words.Contains(k)));
        Assert.True(missing.Length == 0, $"{file} does not know: {missing}");
    }

    [Theory]
    [InlineData("vscode/package.json")]
    [InlineData("vscode/language-configuration.json")]
    [InlineData("vscode/syntaxes/bittern.tmLanguage.json")]
    public void Files_of_the_extension_are_json(string file)
    {
        using var json = JsonDocument.Parse(Text(file));
        Assert.Equal(JsonValueKind.Object, json.RootElement.ValueKind);
    }

    [Fact]
    public void Every_pattern_of_the_grammar_compiles_and_every_include_exists()
    {
        using var json = JsonDocument.Parse(Text("vscode/syntaxes/bittern.tmLanguage.json"));
        var parts = json.RootElement.GetProperty("repository");
        foreach (var pattern in json.RootElement.GetProperty("patterns").EnumerateArray())
        {
            var include = pattern.GetProperty("include").GetString()!;
            Assert.True(parts.TryGetProperty(include[1..], out _), include);
        }

        foreach (var part in parts.EnumerateObject())
        {
            foreach (var key in new[] { "match", "begin", "end" })
            {
                if (part.Value.TryGetProperty(key, out var pattern))
                {
                    _ = new Regex(
                        pattern.GetString()!,
                        RegexOptions.CultureInvariant,
                        TimeSpan.FromSeconds(1)
                    );
                }
            }
        }
    }
}
