using System.Numerics;

namespace Assize.Bounds;

public abstract partial class Law
{
    const int MaximumValues = 1_000_000;

    /// <summary>A draw from finitely many values.</summary>
    /// <param name="shares">Each value with its share; shares in [0, 1] that add up to 1 within 1e-9. At most 1e6
    /// values.</param>
    /// <returns>The law; shares are divided by their sum.</returns>
    /// <exception cref="ArgumentException">A value is beyond ±1e100, a share lies outside [0, 1], or the shares do not
    /// add up to 1.</exception>
    public static Law OnPoints(IReadOnlyDictionary<double, double> shares)
    {
        if (shares is null)
            throw new ArgumentNullException(nameof(shares));

        Check.AtMost(shares.Count, MaximumValues, nameof(shares));
        var kept = shares.Where(share => share.Value != 0).OrderBy(share => share.Key).ToArray();
        double sum = 0;
        foreach (var share in kept)
        {
            Check.Between(share.Key, -Greatest, Greatest, nameof(shares));
            Check.Probability(share.Value, nameof(shares));
            sum += share.Value;
        }

        return Math.Abs(sum - 1) <= 1e-9
            ? new Points([.. kept.Select(share => share.Key)], [.. kept.Select(share => share.Value / sum)])
            : throw new ArgumentException(
                $"The shares must add up to 1; they add up to {Check.Text(sum)}.", nameof(shares));
    }

    /// <summary>A whole number, each equally likely.</summary>
    /// <param name="lower">The least number, at least -2^52.</param>
    /// <param name="upper">The greatest number, itself included; at most 2^52 and 1e6 above the least.</param>
    /// <returns>The discrete uniform law.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The greatest number is below the least, or too far above
    /// it.</exception>
    public static Law WholeNumbers(long lower, long upper)
    {
        Check.AtLeast(upper, lower, nameof(upper));
        Check.Between((double)upper - lower, 0, MaximumValues, nameof(upper));
        Check.AtLeast(lower, -Binomial.MaximumTrials, nameof(lower));
        Check.AtMost(upper, Binomial.MaximumTrials, nameof(upper));
        int count = (int)(upper - lower) + 1;
        return new Points([.. Enumerable.Range(0, count).Select(i => (double)(lower + i))],
            [.. Enumerable.Repeat(1.0 / count, count)]);
    }
}

sealed class Points : Law, ILattice
{
    readonly double _anchor;
    readonly double _offset;

    public Points(double[] values, double[] shares)
    {
        (Values, Shares) = (values, shares);
        // All is counted from the value with the greatest share: neither a large offset nor a far tilt costs digits.
        _anchor = values[Array.IndexOf(shares, shares.Max())];
        _offset = Expected(value => value - _anchor);
        Mean = _anchor + _offset;
        Variance = Expected(value => Deviation(value) * Deviation(value));
        ThirdAbsoluteCentralMoment = Expected(
            value => Math.Abs(Deviation(value) * Deviation(value) * Deviation(value)));
    }

    public double[] Values { get; }

    public double[] Shares { get; }

    public override double Mean { get; }

    public override double Variance { get; }

    public override double ThirdAbsoluteCentralMoment { get; }

    public override double Minimum => Values[0];

    public override double Maximum => Values[Values.Length - 1];

    public override double LogMoment(double tilt) => tilt * Mean + CentralLogMoment(tilt);

    public override double CentralLogMoment(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        double reach = Reach(tilt);
        return reach < 1
            ? Elementary.LogOnePlus(Expected(value => Elementary.ExpExcess(tilt * Deviation(value))))
            : reach + Elementary.Log(Expected(value => Elementary.Exp(tilt * Deviation(value) - reach)));
    }

    public override Law Tilted(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        double reach = Reach(tilt);
        double[] weights = [.. Values.Select(
            (value, i) => Shares[i] * Elementary.Exp(tilt * Deviation(value) - reach))];
        double sum = weights.Sum();
        return new Points(Values, [.. weights.Select(weight => weight / sum)]);
    }

    double ILattice.Start => Minimum;

    double? ILattice.Step => Spacing(Values);

    Complex ILattice.LogCharacteristic(double angle, double step)
    {
        var sum = Complex.Zero;
        for (int i = 0; i < Values.Length; i++)
            sum += Shares[i] * Characteristic.Turn(angle * (Deviation(Values[i]) / step));
        return Characteristic.LogOnePlus(sum);
    }

    // A step is a step when every value is a whole number of them away, to nine digits.
    static double? Spacing(double[] values)
    {
        if (values.Length == 1)
            return 1;

        double least = values.Skip(1).Zip(values, (next, value) => next - value).Min();
        return values.All(value => IsWhole((value - values[0]) / least)) ? least : null;
    }

    static bool IsWhole(double ratio) => Math.Abs(ratio - Math.Round(ratio)) < 1e-9;

    // The greatest exponent: taken out before the exponentials, it keeps them from overflowing.
    double Reach(double tilt) => Math.Max(tilt * Deviation(Minimum), tilt * Deviation(Maximum));

    double Deviation(double value) => value - _anchor - _offset;

    double Expected(Func<double, double> function)
    {
        double sum = 0;
        for (int i = 0; i < Values.Length; i++)
            sum += Shares[i] * function(Values[i]);
        return sum;
    }
}
