namespace Assize;

/// <summary>Fills every place of a span with the draw of an independent trial: a vectorised simulator.</summary>
/// <typeparam name="TDraw">What one trial yields.</typeparam>
/// <param name="random">The generator of this batch.</param>
/// <param name="draws">The places to fill, all of them.</param>
public delegate void FillDraws<TDraw>(Random random, Span<TDraw> draws);
