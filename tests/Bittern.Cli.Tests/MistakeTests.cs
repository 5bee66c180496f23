using Xunit;

namespace Bittern.Cli.Tests;

/// <summary>Two deliberate mistakes from the file to the screen; the language's own tests hold one for each code.</summary>
public sealed class MistakeTests : IDisposable
{
    private readonly CommandLine _shell = new();

    public void Dispose() => _shell.Dispose();

    [Fact]
    public void Both_mistakes_of_a_recipe_are_shown_in_one_pass_with_line_caret_reason_and_suggestion()
    {
        var recipe = _shell.File("pond.bittern", Samples.TwoMistakes);
        var check = CommandLine.Run("check", recipe);

        // The path as given, so that an editor finds the file.
        var output = check.Out.Replace(recipe, "pond.bittern", StringComparison.Ordinal);
        Assert.Equal(2, check.Code);
        Assert.Contains(
            """
            error BT0102: '7,0' has a comma between digits
              --> pond.bittern:2:18
               |
             2 | liquor pond { pH 7,0; Ca 800 mg/L; SO4 1900 mg/L }
               |                  ^^^
              why: 0,5 could be a list of two numbers or one number
              try: write 7.0 for a decimal, or a comma and a space between two entries
            """,
            output,
            StringComparison.Ordinal
        );
        Assert.Contains(
            """
            error BT0160: there is no liquor 'pund'
              --> pond.bittern:4:10
               |
             4 |     feed pund at 1 m3/h
               |          ^^^^
              why: a misspelt name would otherwise calculate something else
              try: did you mean 'pond'?
            """,
            output,
            StringComparison.Ordinal
        );
        Assert.Contains("2 errors", check.Out, StringComparison.Ordinal);
    }

    [Fact]
    public void A_run_shows_the_same_mistakes_as_a_check()
    {
        var recipe = _shell.File("pond.bittern", Samples.TwoMistakes);

        Assert.Equal(
            CommandLine
                .Run("check", recipe)
                .Out.Replace(recipe, "pond.bittern", StringComparison.Ordinal)
                .TrimEnd(),
            CommandLine.Run("run", recipe).Error.TrimEnd()
        );
    }

    [Fact]
    public void Of_several_recipes_every_one_is_checked()
    {
        var check = CommandLine.Run(
            "check",
            _shell.File("pond.bittern", Samples.TwoMistakes),
            _shell.File("mix.bittern", Samples.Mixture)
        );

        Assert.Equal(2, check.Code);
        Assert.Contains("mix.bittern: no errors", check.Out, StringComparison.Ordinal);
    }

    [Fact]
    public void Any_bytes_are_answered_with_diagnostics()
    {
        var path = _shell.File("bytes.bittern", "");
        var bytes = new byte[20_000];
        new Random(7).NextBytes(bytes);
        File.WriteAllBytes(path, bytes);

        Assert.Equal(2, CommandLine.Run("run", path).Code);
    }

    [Fact]
    public void Texts_of_a_recipe_cannot_steer_the_terminal()
    {
        var recipe = Samples.LimitFails.Replace(
            "Softened",
            "Soft\u001b[2Jened",
            StringComparison.Ordinal
        );

        var run = CommandLine.Run("run", _shell.File("a.bittern", recipe));

        Assert.DoesNotContain('\u001b', run.Out + run.Error);
    }
}
