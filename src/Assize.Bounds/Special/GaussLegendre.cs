namespace Assize.Bounds;

/// <summary>Integrals by Gauss and Legendre's rule.</summary>
sealed class GaussLegendre
{
    readonly double[] _points;
    readonly double[] _weights;

    public GaussLegendre(int count)
    {
        (_points, _weights) = (new double[count], new double[count]);
        for (int i = 0; i < count; i++)
        {
            var (point, slope) = Root(count, Trigonometry.Cosine(Math.PI * (i + 0.75) / (count + 0.5)));
            (_points[i], _weights[i]) = (point, 2 / ((1 - point) * (1 + point) * slope * slope));
        }
    }

    public double Integrate(Func<double, double> function, double lower, double upper)
    {
        double half = (upper - lower) / 2;
        double middle = lower + half;
        double sum = 0;
        for (int i = 0; i < _points.Length; i++)
            sum += _weights[i] * function(middle + half * _points[i]);
        return half * sum;
    }

    // Newton's steps from a guess that is good to four digits: three of them reach the last place.
    static (double Point, double Slope) Root(int count, double point)
    {
        for (int step = 0; ; step++)
        {
            double before = 1, value = point;
            for (int k = 2; k <= count; k++)
                (before, value) = (value, ((2 * k - 1) * point * value - (k - 1) * before) / k);
            double slope = count * (before - point * value) / ((1 - point) * (1 + point));
            if (step == 5)
                return (point, slope);

            point -= value / slope;
        }
    }
}
