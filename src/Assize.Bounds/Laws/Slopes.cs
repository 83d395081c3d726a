namespace Assize.Bounds;

public abstract partial class Law
{
    /// <summary>A draw that is uniform on an interval.</summary>
    /// <param name="lower">The lower end; finite.</param>
    /// <param name="upper">The upper end, above the lower one; finite.</param>
    /// <returns>The uniform law.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An end is not finite, or the ends do not differ.</exception>
    public static Law Uniform(double lower, double upper)
    {
        Check.Finite(upper, nameof(upper));
        Check.Inside(lower, double.NegativeInfinity, upper, nameof(lower));
        return new Slopes([lower, upper], [1, 1], 0);
    }

    /// <summary>The sum of two draws, each uniform on half of an interval: a triangle over the whole of it.</summary>
    /// <param name="lower">The lower end; finite.</param>
    /// <param name="upper">The upper end, above the lower one; finite.</param>
    /// <returns>The symmetric triangular law.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An end is not finite, or the ends do not differ.</exception>
    public static Law Triangular(double lower, double upper)
    {
        Check.Finite(upper, nameof(upper));
        Check.Inside(lower, double.NegativeInfinity, upper, nameof(lower));
        return new Slopes([lower, lower + (upper - lower) / 2, upper], [0, 1, 0], 0);
    }
}

/// <summary>A density of straight pieces, reweighted by exp(tilt · draw): the uniform and triangular laws and what tilting makes of them.</summary>
/// <remarks>Moments are integrals of polynomials times an exponential, by Gauss–Legendre rules on stretches short beside 1/tilt.</remarks>
sealed class Slopes : Law
{
    // The 16-point rule: exact for polynomials of degree 31, so an exponential over a unit of its scale costs no digit.
    static readonly GaussLegendre Rule = new(16);

    readonly double[] _ends;
    readonly double[] _heights;
    readonly double _tilt;
    readonly double _whole;

    public Slopes(double[] ends, double[] heights, double tilt)
    {
        (_ends, _heights, _tilt) = (ends, heights, tilt);
        double reach = Anchor(tilt);
        _whole = Integral(_ => 1, tilt, reach, double.NaN);
        Mean = reach + Integral(value => value - reach, tilt, reach, double.NaN) / _whole;
        Variance = Integral(value => (value - Mean) * (value - Mean), tilt, reach, double.NaN) / _whole;
        ThirdAbsoluteCentralMoment = Integral(value => Math.Abs(Cube(value - Mean)), tilt, reach, Mean) / _whole;
    }

    public override double Mean { get; }

    public override double Variance { get; }

    public override double ThirdAbsoluteCentralMoment { get; }

    public override double Minimum => _ends[0];

    public override double Maximum => _ends[_ends.Length - 1];

    public override double LogMoment(double tilt) => tilt * Mean + CentralLogMoment(tilt);

    public override double CentralLogMoment(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        double anchor = Anchor(_tilt);
        if (Math.Abs(tilt) * (Maximum - Minimum) < 1)
            return Elementary.LogOnePlus(Integral(value => Elementary.ExpExcess(tilt * (value - Mean)), _tilt, anchor, double.NaN) / _whole);

        // The weight of both tilts at once, about the end where it is greatest.
        double both = Anchor(_tilt + tilt);
        double exponent = tilt * (both - Mean) + _tilt * (both - anchor);
        return exponent + Elementary.Log(Integral(_ => 1, _tilt + tilt, both, double.NaN) / _whole);
    }

    public override Law Tilted(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        return new Slopes(_ends, _heights, _tilt + tilt);
    }

    static double Cube(double value) => value * value * value;

    double Anchor(double tilt) => tilt > 0 ? Maximum : Minimum;

    // ∫ function · density · exp(tilt · (value - anchor)), split at the density's corners and at one place more.
    double Integral(Func<double, double> function, double tilt, double anchor, double corner)
    {
        double sum = 0;
        for (int piece = 0; piece + 1 < _ends.Length; piece++)
        {
            double slope = (_heights[piece + 1] - _heights[piece]) / (_ends[piece + 1] - _ends[piece]);
            double start = _ends[piece], height = _heights[piece];
            double Weighted(double value) =>
                function(value) * (height + slope * (value - start)) * Elementary.Exp(tilt * (value - anchor));
            double middle = corner > start && corner < _ends[piece + 1] ? corner : start;
            sum += Stretches(Weighted, start, middle, tilt) + Stretches(Weighted, middle, _ends[piece + 1], tilt);
        }

        return sum;
    }

    static double Stretches(Func<double, double> function, double lower, double upper, double tilt)
    {
        if (!(upper > lower))
            return 0;

        // Beyond 800 units of the exponential's scale nothing is left of it.
        double scale = Math.Abs(tilt) * (upper - lower);
        int count = (int)Math.Ceiling(Math.Min(scale, 800) / 2) + 1;
        double width = Math.Min(upper - lower, scale > 800 ? 800 / Math.Abs(tilt) : upper - lower) / count;
        double sum = 0;
        for (int i = 0; i < count; i++)
        {
            double start = tilt > 0 ? upper - (i + 1) * width : lower + i * width;
            sum += Rule.Integrate(function, start, start + width);
        }

        return sum;
    }
}
