using Bittern.Cli.Files;
using Xunit;

namespace Bittern.Cli.Tests;

/// <summary>A recipe from a stranger reads its own folder and what lies below it, nothing else.</summary>
public sealed class RecipeFolderTests : IDisposable
{
    private readonly CommandLine _shell = new();
    private readonly RecipeFolder _files;

    public RecipeFolderTests()
    {
        _shell.File("secret.bittern", "// not yours");
        _shell.File("inside/constants/site.bittern", "// yours");
        _files = new RecipeFolder(_shell.File("inside/a.bittern", ""));
    }

    public void Dispose() => _shell.Dispose();

    [Theory]
    [InlineData("constants/site.bittern")]
    [InlineData("./constants/site.bittern")]
    [InlineData("constants/../constants/site.bittern")]
    public void A_file_inside_is_read(string path)
    {
        Assert.Equal("// yours", _files.Include(path, out var fault)?.Text);
        Assert.Null(fault);
    }

    [Theory]
    [InlineData("../secret.bittern")]
    [InlineData("constants/../../secret.bittern")]
    [InlineData("../inside-not/x.bittern")]
    [InlineData("..\\secret.bittern")]
    [InlineData("/etc/hostname")]
    [InlineData("C:/windows/win.ini")]
    [InlineData("~/secret.bittern")]
    [InlineData("constants")]
    [InlineData("missing.bittern")]
    [InlineData("")]
    [InlineData("a\0b")]
    public void Anything_else_is_refused_with_a_reason(string path)
    {
        Assert.Null(_files.Include(path, out var fault));
        Assert.NotNull(fault);
    }

    [Fact]
    public void What_lies_outside_is_not_even_said_to_exist()
    {
        _files.Include("../secret.bittern", out var there);
        _files.Include("../missing.bittern", out var missing);

        Assert.Equal(there, missing);
    }

    [Fact]
    public void Links_that_lead_outside_are_refused()
    {
        if (OperatingSystem.IsWindows())
        {
            return; // Making a link needs a right there that test machines do not have.
        }

        var inside = Path.Combine(_shell.Folder, "inside");
        File.CreateSymbolicLink(
            Path.Combine(inside, "link.bittern"),
            Path.Combine(_shell.Folder, "secret.bittern")
        );
        Directory.CreateSymbolicLink(Path.Combine(inside, "up"), _shell.Folder);

        Assert.Null(_files.Include("link.bittern", out _));
        Assert.Null(_files.Include("up/secret.bittern", out _));
    }

    [Fact]
    public void A_recipe_that_reaches_outside_is_told_so_at_its_line()
    {
        var check = CommandLine.Run(
            "check",
            _shell.File("inside/b.bittern", "use catalogue major\nuse \"../secret.bittern\"\n")
        );

        Assert.Equal(2, check.Code);
        Assert.Contains("b.bittern:2:", check.Out, StringComparison.Ordinal);
        Assert.Contains("outside the recipe's folder", check.Out, StringComparison.Ordinal);
    }
}
