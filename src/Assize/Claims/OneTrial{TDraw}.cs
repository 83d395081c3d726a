namespace Assize;

/// <summary>One trial that yields many draws.</summary>
/// <typeparam name="TDraw">What each draw is.</typeparam>
/// <param name="random">The generator to draw from, and nothing else.</param>
/// <param name="outputs">To be filled, every place of it.</param>
public delegate void OneTrial<TDraw>(Random random, Span<TDraw> outputs);
