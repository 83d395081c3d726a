using System.Numerics;

namespace Assize.Bounds;

public abstract partial class Law
{
    /// <summary>A Poisson count.</summary>
    /// <param name="mean">The mean, in (0, 1e9].</param>
    /// <returns>The Poisson law.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The mean lies outside its domain, or is NaN.</exception>
    public static Law Poisson(double mean)
    {
        Check.Between(mean, double.Epsilon, 1e9, nameof(mean));
        return new PoissonCount(mean);
    }
}

sealed class PoissonCount(double mean) : Law, ILattice
{
    double ILattice.Start => 0;

    double? ILattice.Step => 1;

    // λ(e^(iω) - 1 - iω).
    Complex ILattice.LogCharacteristic(double angle, double step)
    {
        double turn = angle / step;
        return mean * (Characteristic.Turn(turn) - new Complex(0, turn));
    }

    public override double Mean => mean;

    public override double Variance => mean;

    // With m the whole part of λ, E(X - λ)³1{X > m} = λP(X > m) + P(X = m)·λ((λ - m)² + 2m + 1) by factorial moments.
    public override double ThirdAbsoluteCentralMoment
    {
        get
        {
            double whole = Math.Floor(mean);
            double above = Bounds.Poisson.UpperTail(mean, (long)whole + 1);
            double mass = Elementary.Exp(Bounds.Poisson.LogMass(mean, (long)whole));
            double rest = mean - whole;
            return mean * (2 * above - 1) + 2 * mean * mass * (rest * rest + 2 * whole + 1);
        }
    }

    public override double Minimum => 0;

    public override double Maximum => double.PositiveInfinity;

    public override double LogMoment(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        return mean * Elementary.ExpMinusOne(tilt);
    }

    public override double CentralLogMoment(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        return mean * Elementary.ExpExcess(tilt);
    }

    public override Law Tilted(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        double tilted = mean * Elementary.Exp(tilt);
        return tilted <= IncompleteGamma.MaximumShape / 2
            ? new PoissonCount(tilted)
            : throw new ArgumentOutOfRangeException(nameof(tilt), tilt, "must leave the mean at 5e11 or below.");
    }
}
