using System.Numerics;

namespace Assize.Bounds;

public abstract partial class Law
{
    /// <summary>The number of trials up to and with the first success.</summary>
    /// <param name="rate">The probability of a success in one trial, in [1e-9, 1 - 1e-12].</param>
    /// <returns>The geometric law on 1, 2, 3, ….</returns>
    /// <exception cref="ArgumentOutOfRangeException">The rate lies outside its domain, or is NaN.</exception>
    public static Law Geometric(double rate)
    {
        Check.Between(rate, 1e-9, 1 - 1e-12, nameof(rate));
        return new Geometric(rate, 1 - rate);
    }
}

sealed class Geometric(double rate, double other) : Law, ILattice
{
    double ILattice.Start => 1;

    double? ILattice.Step => 1;

    // -ln(1 - (q/p)(e^(iω) - 1)) - iω q/p.
    Complex ILattice.LogCharacteristic(double angle, double step)
    {
        double turn = angle / step;
        double odds = other / rate;
        return -Characteristic.LogOnePlus(-odds * Characteristic.Turn(turn)) - new Complex(0, odds * turn);
    }

    public override double Mean => 1 / rate;

    public override double Variance => other / (rate * rate);

    // Beyond a whole number m below the mean the count starts anew: E(X - μ)³1{X > m} = q^m (c + 3mσ² + m³), c the
    // third central moment.
    public override double ThirdAbsoluteCentralMoment
    {
        get
        {
            double central = (1 + other) * other / (rate * rate * rate);
            double whole = Math.Floor(Mean);
            double above = Elementary.Exp(whole * Elementary.LogOnePlus(-rate));
            return 2 * above * (central + 3 * whole * Variance + whole * whole * whole) - central;
        }
    }

    public override double Minimum => 1;

    public override double Maximum => double.PositiveInfinity;

    public override double LogMoment(double tilt) => tilt / rate + CentralLogMoment(tilt);

    // (1 - q e^θ)/p = 1 - (q/p)(e^θ - 1).
    public override double CentralLogMoment(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        double odds = other / rate;
        double rise = odds * Elementary.ExpMinusOne(tilt);
        return rise < 1 ? Elementary.LogShortfall(-rise) + odds * Elementary.ExpExcess(tilt) : double.PositiveInfinity;
    }

    public override Law Tilted(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        double failure = other * Elementary.Exp(tilt);
        Check.Inside(failure, 0, 1, nameof(tilt));
        double success = rate - other * Elementary.ExpMinusOne(tilt);
        return new Geometric(success, failure);
    }
}
