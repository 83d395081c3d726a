namespace Assize.Bounds.Tests;

/// <summary>A law on three points with mean 0, whose sums of any function are enumerated outcome by outcome.</summary>
sealed record ThreePoints(double[] Points, double[] Masses)
{
    public double Deviation => Math.Sqrt(Points.Zip(Masses, (point, mass) => mass * point * point).Sum());

    /// <summary>The probability that a function's values at independent draws add up to something accepted.</summary>
    public double Probability(int trials, Func<double, double> function, Func<double, bool> accepted)
    {
        double[] values = [.. Points.Select(function)];
        double sum = 0;
        for (int i = 0; i <= trials; i++)
        {
            for (int j = 0; i + j <= trials; j++)
            {
                if (accepted(i * values[0] + j * values[1] + (trials - i - j) * values[2]))
                    sum += Mass(trials, i, j);
            }
        }

        return sum;
    }

    /// <summary>The probability of so many draws of the first point and of the second.</summary>
    public double Mass(int trials, int first, int second) =>
        Ways(trials, first) * Ways(trials - first, second)
            * Math.Pow(Masses[0], first) * Math.Pow(Masses[1], second) * Math.Pow(Masses[2], trials - first - second);

    static double Ways(int trials, int successes)
    {
        double ways = 1;
        for (int i = 0; i < successes; i++)
            ways = ways * (trials - i) / (i + 1);

        return ways;
    }

    public override string ToString() => $"points {string.Join(' ', Points)}, masses {string.Join(' ', Masses)}";

    /// <summary>A hundred laws, from nearly even to one rare point far out.</summary>
    public static IEnumerable<ThreePoints> Laws()
    {
        var random = new Random(43);
        for (int i = 0; i < 100; i++)
        {
            double[] masses = [.. Enumerable.Range(0, 3).Select(_ => Math.Pow(2, -8 * random.NextDouble()))];
            masses = [.. masses.Select(mass => mass / masses.Sum())];
            double[] points = [-1, 4 * random.NextDouble() - 1, 0];
            points[2] = -(masses[0] * points[0] + masses[1] * points[1]) / masses[2];
            yield return new ThreePoints(points, masses);
        }
    }
}
