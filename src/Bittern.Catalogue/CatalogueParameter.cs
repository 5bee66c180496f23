using Bittern.Model;

namespace Bittern.Catalogue;

/// <summary>One parameter of an activity model in the catalogue. Immutable.</summary>
/// <param name="Domain">The file, as <c>use catalogue …</c> names it.</param>
/// <param name="Parameter">The parameter as bound.</param>
/// <param name="Remark">The comment lines right above it; empty when there are none.</param>
public sealed record CatalogueParameter(string Domain, ActivityParameter Parameter, string Remark);
