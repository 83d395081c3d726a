using System.Numerics;

namespace Assize.Bounds;

public abstract partial class Law
{
    /// <summary>A draw that is 1 with the given rate, else 0.</summary>
    /// <param name="rate">The probability of 1, in [0, 1].</param>
    /// <returns>The law of one yes/no trial.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The rate lies outside [0, 1], or is NaN.</exception>
    public static Law Bernoulli(double rate)
    {
        Check.Probability(rate, nameof(rate));
        return new Bernoulli(rate, 1 - rate);
    }
}

sealed class Bernoulli(double rate, double other) : Law, ILattice
{
    double ILattice.Start => 0;

    double? ILattice.Step => 1;

    Complex ILattice.LogCharacteristic(double angle, double step) => Characteristic.LogOnePlus(
        rate * Characteristic.Turn(angle / step * other) + other * Characteristic.Turn(-angle / step * rate));

    public override double Mean => rate;

    public override double Variance => rate * other;

    public override double ThirdAbsoluteCentralMoment => rate * other * (rate * rate + other * other);

    public override double Minimum => rate == 1 ? 1 : 0;

    public override double Maximum => rate == 0 ? 0 : 1;

    public override double LogMoment(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        if (tilt > 700)
            return tilt + Elementary.Log(rate + other * Elementary.Exp(-tilt));

        double moment = other + rate * Elementary.Exp(tilt);
        return moment < 0.5 ? Elementary.Log(moment) : Elementary.LogOnePlus(rate * Elementary.ExpMinusOne(tilt));
    }

    // E e^(θ(X - p)) - 1 = p·(e^(θq) - 1 - θq) + q·(e^(-θp) - 1 + θp): the linear parts cancel exactly.
    public override double CentralLogMoment(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        if (Math.Abs(tilt) <= 1)
            return Elementary.LogOnePlus(
                rate * Elementary.ExpExcess(tilt * other) + other * Elementary.ExpExcess(-tilt * rate));
        if (Math.Abs(tilt) > 700)
            return Math.Max(0, LogMoment(tilt) - tilt * rate);

        // From the value that is the likelier one, so that little cancels however near 1 its rate is.
        return rate <= other
            ? Elementary.LogOnePlus(rate * Elementary.ExpMinusOne(tilt)) - tilt * rate
            : Elementary.LogOnePlus(other * Elementary.ExpMinusOne(-tilt)) + tilt * other;
    }

    // Both rates are carried: one of them may be too near 1 to be told from it.
    public override Law Tilted(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        double weight = Elementary.Exp(-Math.Abs(tilt));
        var (ones, zeros) = tilt > 0 ? (rate, other * weight) : (rate * weight, other);
        return new Bernoulli(ones / (ones + zeros), zeros / (ones + zeros));
    }
}
