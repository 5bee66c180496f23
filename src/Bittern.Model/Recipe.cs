using System.Collections.Immutable;
using Bittern.Diagnostics;

namespace Bittern.Model;

/// <summary>What a recipe means once names, units and charges are resolved. Immutable; knows no syntax and no layout.</summary>
public sealed record Recipe
{
    public required RecipeHeader Header { get; init; }

    public required ChemicalSystem Chemistry { get; init; }

    public ImmutableArray<Liquor> Liquors { get; init; } = [];

    public ImmutableArray<Reagent> Reagents { get; init; } = [];

    public ImmutableArray<Atmosphere> Atmospheres { get; init; } = [];

    /// <summary>Trains in the order written. A <c>mix</c> line is a train of one stage.</summary>
    public ImmutableArray<Train> Trains { get; init; } = [];

    public ImmutableArray<LimitSet> LimitSets { get; init; } = [];

    public ImmutableArray<ReportText> ReportTexts { get; init; } = [];

    /// <summary>The recipe first, then every file that it names, in order of first use, for hashes in the report.</summary>
    public ImmutableArray<SourceText> Sources { get; init; } = [];
}

/// <summary>The recipe's title block; texts are as written, null when left out.</summary>
public sealed record RecipeHeader
{
    public required string Title { get; init; }

    public string? Client { get; init; }

    public string? Reference { get; init; }

    public string? Revision { get; init; }

    /// <summary>ISO date as the recipe states it; the tool never puts the wall clock here.</summary>
    public string? Date { get; init; }

    public double TemperatureCelsius { get; init; } = 25;

    /// <summary>True when the recipe states no temperature and 25 °C was taken.</summary>
    public bool TemperatureAssumed { get; init; } = true;

    /// <summary>Name of the activity model: <c>ideal</c>, <c>davies</c>, …</summary>
    public string ActivityModel { get; init; } = "davies";

    public bool ActivityModelAssumed { get; init; } = true;
}

/// <summary>Markdown that the recipe adds to its report.</summary>
public sealed record ReportText(string Markdown, SourceSpan Span);
