using Assize.Bounds;

namespace Assize;

/// <summary>What a claim says, in numbers: for the texts, the ledger and the tool.</summary>
/// <param name="Family">The kind of claim: "rate", "mean", …</param>
/// <param name="Quantity">What the target is a value of, as a text names it: "rate", "mean", "90 % quantile", …</param>
/// <param name="Target">The value claimed; null when the claim is about many values.</param>
/// <param name="Tolerance">How far from the target is still right.</param>
/// <param name="Defect">How far from the target is caught.</param>
/// <param name="Edges">The target, the edges and the defects of a claim about one value; else null.</param>
sealed record Statement(
    string Family, string Quantity, double? Target, double Tolerance, double Defect, Edges? Edges);
