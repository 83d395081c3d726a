namespace Assize.Bounds;

/// <summary>A tail of a binomial distribution near its centre, where the continued fraction is slow: a series around
/// the normal tail.</summary>
/// <remarks>
/// P(S ≥ k) / P(S = k) = (k/p) ∫ exp((k-1) ln(1 - s/p) + (n-k) ln(1 + s/q)) ds over (0, p). The exponent is -βu -
/// u²/2 - Σ eⱼuʲ in
/// units u of its own spread; the last sum is expanded, and the moments of exp(-βu - u²/2) follow from Mills' ratio.
/// </remarks>
static class CentralSeries
{
    // Beyond either the fraction is quicker.
    const double WidestSpread = 0.01;
    const double FarthestDistance = 1.25;
    const int Cumulants = 12;
    const double RootTwoPi = 2.506628274631000502416;

    /// <summary>P(S ≥ successes) / P(S = successes), where successes ≥ (trials + 1) · rate; null where the fraction
    /// is as quick.</summary>
    public static double? TailOverMass(double successes, double failures, double rate, double other, double meanExcess)
    {
        double a = (successes - 1) / rate / rate;
        double b = failures / other / other;
        double unit = 1 / Math.Sqrt(a + b);
        double distance = -(meanExcess + other) / (rate * other) * unit;
        var (x, y) = (unit / rate, unit / other);
        double spread = Math.Max(x, y);
        if (!(spread < WidestSpread && distance < FarthestDistance))
            return null;

        double[] weights = Weights(successes - 1, failures, x, y, Terms(spread));
        return successes / rate * unit * Integral(weights, distance);
    }

    // What three moments add is of one order of the spread; the first order left out is below 1e-15: 5.3 s⁴, 65 s⁶,
    // 340 s⁷, 29,000 s¹⁰.
    static int Terms(double spread) => spread < 1e-4 ? 10 : spread < 1e-3 ? 16 : spread < 0.002 ? 19 : 28;

    // j·eⱼ, then the coefficients of exp(-Σ eⱼuʲ) by m·wₘ = -Σ j·eⱼ·wₘ₋ⱼ.
    static double[] Weights(double a, double b, double x, double y, int terms)
    {
        double[] cumulants = new double[Cumulants];
        var (px, py) = (a * x * x, b * y * y);
        for (int j = 3; j < Cumulants; j++)
        {
            (px, py) = (px * x, -py * y);
            cumulants[j] = px + py;
        }

        double[] weights = new double[terms];
        weights[0] = 1;
        for (int m = 3; m < terms; m++)
        {
            double sum = 0;
            for (int j = Math.Min(m, Cumulants - 1); j >= 3; j--)
                sum += cumulants[j] * weights[m - j];

            weights[m] = -sum / m;
        }

        return weights;
    }

    // Σ wₘ ∫ uᵐ exp(-βu - u²/2) du over (0, ∞).
    static double Integral(double[] weights, double distance)
    {
        double before = distance >= 0
            ? NormalTail.Mills(distance)
            : RootTwoPi * Elementary.Exp(distance * distance / 2) - NormalTail.Mills(-distance);
        double moment = 1 - distance * before;
        double sum = before;
        for (int m = 2; m < weights.Length; m++)
        {
            (before, moment) = (moment, (m - 1) * before - distance * moment);
            sum += weights[m] * moment;
        }

        return sum;
    }
}
