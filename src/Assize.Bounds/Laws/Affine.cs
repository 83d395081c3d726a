using System.Numerics;

namespace Assize.Bounds;

public abstract partial class Law
{
    /// <summary>The law of a draw that is scaled and shifted.</summary>
    /// <param name="scale">The factor, of magnitude in [1e-100, 1e100]; may be negative. The third moment of the image
    /// must be finite.</param>
    /// <param name="shift">What is added after scaling, in [-1e100, 1e100].</param>
    /// <returns>The law of scale · draw + shift.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public Law Image(double scale, double shift)
    {
        Check.Between(Math.Abs(scale), Least, Greatest, nameof(scale));
        Check.Between(shift, -Greatest, Greatest, nameof(shift));
        var image = new Affine(this, scale, shift);
        Check.Finite(image.ThirdAbsoluteCentralMoment, nameof(scale));
        return image;
    }
}

sealed class Affine(Law law, double scale, double shift) : Law, ILattice
{
    /// <summary>The law behind this one, and how it is stretched and moved.</summary>
    internal (Law Law, double Scale, double Shift) Parts => (law, scale, shift);

    double ILattice.Start => law is ILattice inner ? scale * inner.Start + shift : double.NaN;

    double? ILattice.Step => (law as ILattice)?.Step is { } step ? Math.Abs(scale) * step : null;

    Complex ILattice.LogCharacteristic(double angle, double step) =>
        ((ILattice)law).LogCharacteristic(Math.Sign(scale) * angle, step / Math.Abs(scale));

    public override double Mean => scale * law.Mean + shift;

    public override double Variance => scale * scale * law.Variance;

    public override double ThirdAbsoluteCentralMoment =>
        Math.Abs(scale * scale * scale) * law.ThirdAbsoluteCentralMoment;

    public override double Minimum => scale * (scale > 0 ? law.Minimum : law.Maximum) + shift;

    public override double Maximum => scale * (scale > 0 ? law.Maximum : law.Minimum) + shift;

    public override double LogMoment(double tilt) => law.LogMoment(scale * tilt) + tilt * shift;

    public override double CentralLogMoment(double tilt) => law.CentralLogMoment(scale * tilt);

    public override Law Tilted(double tilt) => new Affine(law.Tilted(scale * tilt), scale, shift);
}
