namespace Assize.Bounds;

public abstract partial class Law
{
    /// <summary>A normal draw.</summary>
    /// <param name="mean">The mean; in [-1e100, 1e100].</param>
    /// <param name="standardDeviation">The standard deviation, in [1e-100, 1e100].</param>
    /// <returns>The normal law.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Law Normal(double mean, double standardDeviation)
    {
        Check.Between(mean, -Greatest, Greatest, nameof(mean));
        Check.Between(standardDeviation, Least, Greatest, nameof(standardDeviation));
        return new Normal(mean, standardDeviation);
    }
}

sealed class Normal(double mean, double deviation) : Law
{
    internal double Deviation => deviation;

    public override double Mean => mean;

    public override double Variance => deviation * deviation;

    // 2√(2/π) = 1.59577…
    public override double ThirdAbsoluteCentralMoment => 1.595769121605730712 * deviation * deviation * deviation;

    public override double Minimum => double.NegativeInfinity;

    public override double Maximum => double.PositiveInfinity;

    public override double LogMoment(double tilt) => tilt * mean + CentralLogMoment(tilt);

    public override double CentralLogMoment(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        double scaled = tilt * deviation;
        return scaled * scaled / 2;
    }

    public override Law Tilted(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        return new Normal(mean + tilt * deviation * deviation, deviation);
    }
}
