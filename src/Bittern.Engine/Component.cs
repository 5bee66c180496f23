namespace Bittern.Engine;

/// <summary>
/// A primary species: what the totals count. Water is never one of them; the system carries it separately.
/// </summary>
/// <param name="Name">Unique name, e.g. <c>Ca^2+</c>.</param>
/// <param name="Charge">Charge number.</param>
/// <param name="IsDissolved">False for a bookkeeping component that is no species of the solution (the electron).</param>
public sealed record Component(string Name, int Charge, bool IsDissolved = true);
