namespace Bittern.Cli;

/// <summary>What the process returns; scripts and forges rely on these numbers.</summary>
public static class ExitCode
{
    /// <summary>Done, and all limits met.</summary>
    public const int Done = 0;

    /// <summary>A limit failed or could not be decided, or no dose reaches a target.</summary>
    public const int LimitFailed = 1;

    /// <summary>The recipe is wrong.</summary>
    public const int RecipeWrong = 2;

    /// <summary>There is no certified answer.</summary>
    public const int NoAnswer = 3;

    /// <summary>The command line is wrong, or a file that it names cannot be read or written.</summary>
    public const int Usage = 64;

    /// <summary>A bug of ours.</summary>
    public const int Bug = 70;

    /// <summary>Stopped by the user.</summary>
    public const int Cancelled = 130;
}
