namespace Assize.Bounds;

public abstract partial class Law
{
    /// <summary>A gamma draw.</summary>
    /// <param name="shape">The shape, in [1e-3, 1e9].</param>
    /// <param name="scale">The scale, in [1e-100, 1e90]; unit of the draw. The mean is shape times scale.</param>
    /// <returns>The gamma law.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Law Gamma(double shape, double scale)
    {
        Check.Between(shape, 1e-3, 1e9, nameof(shape));
        Check.Between(scale, Least, 1e90, nameof(scale));
        return new Gamma(shape, scale);
    }

    /// <summary>An exponential draw.</summary>
    /// <param name="mean">The mean, in [1e-100, 1e90]; unit of the draw.</param>
    /// <returns>The exponential law: gamma of shape 1.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The mean lies outside its domain, or is NaN.</exception>
    public static Law Exponential(double mean)
    {
        Check.Between(mean, Least, 1e90, nameof(mean));
        return new Gamma(1, mean);
    }
}

sealed class Gamma(double shape, double scale) : Law
{
    internal (double Shape, double Scale) Parts => (shape, scale);

    public override double Mean => shape * scale;

    public override double Variance => shape * scale * scale;

    // By parts, E(X - k)³1{X > k} = 2k·Q(k, k) + 2k(k + 1)·k^k e^-k / Γ(k + 1), and the third central moment is 2k.
    public override double ThirdAbsoluteCentralMoment
    {
        get
        {
            double upper = IncompleteGamma.UpperTail(shape, shape);
            double factor = Elementary.Exp(-StirlingError.Of(shape)) / Math.Sqrt(2 * Math.PI * shape);
            return scale * scale * scale * (2 * shape * (2 * upper - 1) + 4 * shape * (shape + 1) * factor);
        }
    }

    public override double Minimum => 0;

    public override double Maximum => double.PositiveInfinity;

    public override double LogMoment(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        return tilt * scale < 1 ? -shape * Elementary.LogOnePlus(-tilt * scale) : double.PositiveInfinity;
    }

    public override double CentralLogMoment(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        return tilt * scale < 1 ? shape * Elementary.LogShortfall(-tilt * scale) : double.PositiveInfinity;
    }

    public override Law Tilted(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        Check.Between(tilt, double.MinValue, (1 - 1e-15) / scale, nameof(tilt));
        return new Gamma(shape, scale / (1 - tilt * scale));
    }
}
