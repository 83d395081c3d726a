namespace Assize.Bounds;

public abstract partial class Law
{
    /// <summary>A draw that is uniform on an interval.</summary>
    /// <param name="lower">The lower end, at least -1e90.</param>
    /// <param name="upper">The upper end, above the lower one, at most 1e90.</param>
    /// <returns>The uniform law.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An end lies outside its domain, or the ends do not
    /// differ.</exception>
    public static Law Uniform(double lower, double upper)
    {
        RequireEnds(lower, upper);
        return new Slopes([lower, upper], [1, 1], 0);
    }

    /// <summary>The sum of two draws, each uniform on half of an interval: a triangle over the whole of it.</summary>
    /// <param name="lower">The lower end, at least -1e90.</param>
    /// <param name="upper">The upper end, above the lower one, at most 1e90.</param>
    /// <returns>The symmetric triangular law.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An end lies outside its domain, or the ends do not
    /// differ.</exception>
    public static Law Triangular(double lower, double upper)
    {
        RequireEnds(lower, upper);
        return new Slopes([lower, lower + (upper - lower) / 2, upper], [0, 1, 0], 0);
    }

    static void RequireEnds(double lower, double upper)
    {
        Check.Between(upper, -1e90, 1e90, nameof(upper));
        Check.Between(lower, -1e90, 1e90, nameof(lower));
        Check.Inside(lower, double.NegativeInfinity, upper, nameof(lower));
    }
}

/// <summary>A density of straight pieces, reweighted by exp(tilt · draw): the uniform and triangular laws and what
/// tilting makes of them.</summary>
/// <remarks>All is counted from the end with the greatest weight, so that a far tilt, which leaves only a sliver there,
/// costs no digits. Integrals are Gauss and Legendre's, on stretches short beside 1/tilt.</remarks>
sealed class Slopes : Law
{
    // The 16-point rule: exact for polynomials of degree 31, so an exponential over two units of its scale costs no
    // digit.
    static readonly GaussLegendre Rule = new(16);

    readonly double[] _ends;
    readonly double[] _heights;
    readonly double _tilt;
    readonly double _anchor;
    readonly double _whole;
    readonly double _centre;

    public Slopes(double[] ends, double[] heights, double tilt)
    {
        Check.Between(Math.Abs(tilt) * (ends[ends.Length - 1] - ends[0]), 0, Greatest, nameof(tilt));
        (_ends, _heights, _tilt) = (ends, heights, tilt);
        _anchor = Anchor(tilt);
        _whole = Integral(_ => 1, tilt, double.NaN);
        _centre = Integral(offset => offset, tilt, double.NaN) / _whole;
        Mean = _anchor + _centre;
        Variance = Integral(offset => (offset - _centre) * (offset - _centre), tilt, double.NaN) / _whole;
        ThirdAbsoluteCentralMoment = Integral(offset => Math.Abs(Cube(offset - _centre)), tilt, _centre) / _whole;
    }

    /// <summary>The share of draws up to a point; for laws that are not tilted.</summary>
    internal double UpTo(double point)
    {
        double before = 0, all = 0;
        for (int i = 0; i + 1 < _ends.Length; i++)
        {
            double width = _ends[i + 1] - _ends[i];
            double part = Math.Max(0, Math.Min(1, (point - _ends[i]) / width));
            double slope = _heights[i + 1] - _heights[i];
            before += width * part * (_heights[i] + slope * part / 2);
            all += width * (_heights[i] + slope / 2);
        }

        return before / all;
    }

    public override double Mean { get; }

    public override double Variance { get; }

    public override double ThirdAbsoluteCentralMoment { get; }

    public override double Minimum => _ends[0];

    public override double Maximum => _ends[_ends.Length - 1];

    public override double LogMoment(double tilt) => tilt * Mean + CentralLogMoment(tilt);

    public override double CentralLogMoment(double tilt)
    {
        double both = Anchor(_tilt + tilt);
        Check.Between(Math.Abs(tilt) * (Maximum - Minimum), 0, Greatest, nameof(tilt));
        if (Math.Abs(tilt) * (Maximum - Minimum) < 1 || Math.Abs(tilt) < 0.5 * Math.Abs(_tilt))
            return Elementary.LogOnePlus(
                Integral(offset => Elementary.ExpExcess(tilt * (offset - _centre)), _tilt, double.NaN) / _whole);

        // The weight of both tilts at once, about the end where it is greatest.
        double exponent = tilt * (both - _anchor - _centre) + _tilt * (both - _anchor);
        return exponent + Elementary.Log(Integral(_ => 1, _tilt + tilt, double.NaN) / _whole);
    }

    public override Law Tilted(double tilt)
    {
        Check.Finite(tilt, nameof(tilt));
        return new Slopes(_ends, _heights, _tilt + tilt);
    }

    static double Cube(double value) => value * value * value;

    double Anchor(double tilt) => tilt > 0 ? Maximum : Minimum;

    // ∫ function(offset) · density · exp(tilt · offset), offset = value - anchor, split at the corners and at one place
    // more.
    double Integral(Func<double, double> function, double tilt, double corner)
    {
        double anchor = Anchor(tilt), sum = 0;
        for (int piece = 0; piece + 1 < _ends.Length; piece++)
        {
            double start = _ends[piece] - anchor, end = _ends[piece + 1] - anchor;
            double slope = (_heights[piece + 1] - _heights[piece]) / (end - start);
            var (place, height) = tilt > 0 ? (end, _heights[piece + 1]) : (start, _heights[piece]);
            double Weighted(double offset) =>
                function(offset) * (height + slope * (offset - place)) * Elementary.Exp(tilt * offset);
            double middle = corner > start && corner < end ? corner : start;
            sum += Stretches(Weighted, start, middle, tilt) + Stretches(Weighted, middle, end, tilt);
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
