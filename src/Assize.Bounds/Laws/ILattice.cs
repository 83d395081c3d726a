using System.Numerics;

namespace Assize.Bounds;

/// <summary>A law whose values are equally spaced.</summary>
interface ILattice
{
    /// <summary>The least value.</summary>
    double Start { get; }

    /// <summary>The distance between neighbouring values; null when the values are not equally spaced.</summary>
    double? Step { get; }

    /// <summary>ln E exp(i·angle·(draw - mean)/step), accurate near 0.</summary>
    Complex LogCharacteristic(double angle, double step);
}
