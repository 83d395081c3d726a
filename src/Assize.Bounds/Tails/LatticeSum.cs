using System.Numerics;

namespace Assize.Bounds;

/// <summary>How often a sum of draws with equally spaced values reaches a total: exact, however far in the
/// tail.</summary>
/// <remarks>
/// <para>Holds for: independent draws whose laws are known and take values on a common lattice; they need not share a
/// law.</para>
/// <para>Guarantee: the true probability lies inside the enclosure, at every number of draws.</para>
/// <para>Accuracy: the ends are within 2e-11 of the truth up to 1,000 draws and within 2e-8 at a thousand million,
/// while it is above 1e-300; their middle within 6e-13 and 5e-11.</para>
/// <para>Source: inversion of the characteristic function of the tilted law; what wraps around is bounded by H.
/// Chernoff, Ann. Math. Statist. 23 (1952) 493–507. The page gives the derivation.</para>
/// </remarks>
public static class LatticeSum
{
    // Above the error of the exponential and of a few products.
    const double Rounding = 1e-12;

    // Above the error of a cumulant, relative to it.
    const double ExponentRounding = 2e-15;

    const int LargestPeriod = 1 << 22;

    // Angles are then within what the sine is accurate for.
    const double LargestSpan = 2e6;

    // What wraps around is made smaller than this share of the sum.
    const double Negligible = 1e-15;

    // Terms below e^-60 are left out: a period's worth of them is below 1e-26 a term.
    const double LeastExponent = -60;

    /// <summary>Whether all values lie on a common lattice, so that the tails can be had exactly.</summary>
    /// <param name="draws">The draws.</param>
    /// <returns>True when every law is on a lattice whose step is a whole number of the least step.</returns>
    /// <exception cref="ArgumentNullException">There are no draws.</exception>
    public static bool Serves(Draws draws)
    {
        if (draws is null)
            throw new ArgumentNullException(nameof(draws));

        return Step(draws) is not null;
    }

    /// <summary>The probability that the sum reaches a total.</summary>
    /// <param name="draws">The draws, on a common lattice; the variance of their sum must be positive.</param>
    /// <param name="total">The total, finite; within 1e-9 steps, or its own rounding, of an attainable one it counts as
    /// that one.</param>
    /// <returns>An enclosure of P(sum ≥ total).</returns>
    /// <exception cref="ArgumentException">The values lie on no common lattice, or have no variance, or the total is
    /// not finite.</exception>
    /// <exception cref="InvalidOperationException">More than 4,000,000 steps would have to be told apart, or one draw
    /// spreads over more than 2,000,000.</exception>
    public static Enclosure UpperTail(Draws draws, double total)
    {
        double step = Required(draws);
        Check.Finite(total, nameof(total));
        double reached = Attainable(draws, total, step);
        if (reached < draws.Minimum + step / 2)
            return new Enclosure(1, 1);
        if (reached > draws.Maximum + step / 2)
            return new Enclosure(0, 0);

        return draws.MeanExcess(reached) < 0
            ? Beyond(draws, reached, step)
            : Beyond(draws.Mirrored(), step - reached, step).Complement();
    }

    /// <summary>The probability that the sum is no more than a total.</summary>
    /// <param name="draws">The draws, on a common lattice; the variance of their sum must be positive.</param>
    /// <param name="total">The total, finite; within 1e-9 steps, or its own rounding, of an attainable one it counts as
    /// that one.</param>
    /// <returns>An enclosure of P(sum ≤ total).</returns>
    /// <exception cref="ArgumentException">The values lie on no common lattice, or have no variance, or the total is
    /// not finite.</exception>
    /// <exception cref="InvalidOperationException">More than 4,000,000 steps would have to be told apart, or one draw
    /// spreads over more than 2,000,000.</exception>
    public static Enclosure LowerTail(Draws draws, double total)
    {
        Required(draws);
        return UpperTail(draws.Mirrored(), -total);
    }

    static double Required(Draws draws)
    {
        TiltedSum.RequireVariance(draws);
        return Step(draws)
            ?? throw new ArgumentException("The draws must take values on a common lattice.", nameof(draws));
    }

    // A law of one value fits every lattice.
    static double? Step(Draws draws)
    {
        if (draws.Groups.Any(group => group.Law is not ILattice))
            return null;

        double?[] steps = [.. draws.Groups.Where(group => group.Law.Variance > 0)
            .Select(group => ((ILattice)group.Law).Step)];
        if (steps.Length == 0 || steps.Any(step => step is null))
            return null;

        double least = steps.Min()!.Value;
        return steps.All(step => Math.Abs(step!.Value / least - Math.Round(step.Value / least)) < 1e-9) ? least : null;
    }

    // The least total of the lattice that is no less than the one asked for.
    static double Attainable(Draws draws, double total, double step)
    {
        double start = draws.Groups.Sum(group => group.Count * ((ILattice)group.Law).Start);
        double position = (total - start) / step;
        double slack = 1e-9 + 1e-15 * (Math.Abs(total) + Math.Abs(start)) / step;
        return start + step * Math.Ceiling(position - slack);
    }

    // P(S ≥ k) = e^(K(θ) - θk) E_θ[e^(-θ(S - k)); S ≥ k], the expectation by inversion over one period of the lattice.
    static Enclosure Beyond(Draws draws, double total, double step)
    {
        // No tilt moves the mean to the greatest total: just below it next to everything is there.
        double reach = total > draws.Maximum - step / 2 ? total - step / 10 : total;
        double tilt = TiltedSum.Tilt(draws, reach);
        var tilted = draws.Tilted(tilt);
        double excess = tilted.MeanExcess(total);
        double cumulant = draws.CentralLogMoment(tilt), shift = tilt * draws.MeanExcess(total);
        if (cumulant + shift < TiltedSum.LeastExponent)
            return Enclosure.Widened(0, 0, Rounding);

        double height = Elementary.Exp(cumulant + shift);
        double deviation = Math.Sqrt(tilted.Variance) / step;
        double widest = draws.Groups.Max(group => Span(group.Law)) / step;
        double rounding = Rounding + ExponentRounding * (cumulant - shift)
            + TiltedSum.MeanError(draws, tilt + 1 / (step * Math.Max(1, deviation)));
        for (int period = PeriodFor(deviation); period <= LargestPeriod && widest <= LargestSpan; period *= 2)
        {
            double wrapped = Wrapped(tilted, period * step / 2 - Math.Abs(excess));
            if (wrapped > Negligible)
                continue;

            var (sum, error) = Inverted(tilted, tilt * step, excess / step, period, step);
            if (wrapped <= Negligible * sum)
                return Enclosure.Widened(
                    height * Math.Max(0, sum - error - wrapped), height * (sum + error + wrapped), rounding);
        }

        throw new InvalidOperationException(
            $"A sum with a standard deviation of {Check.Text(deviation)} steps, of draws up to {Check.Text(widest)} steps "
            + "wide, is too wide to be inverted exactly. TiltedSum encloses it.");
    }

    static double Span(Law law)
    {
        double range = law.Maximum - law.Minimum, own = ((ILattice)law).Step ?? 0;
        return double.IsInfinity(range) ? own : Math.Max(range, own);
    }

    static int PeriodFor(double deviation)
    {
        int period = 64;
        while (period < 18 * deviation && period < LargestPeriod)
            period *= 2;
        return period;
    }

    // Chernoff's bound on both tails beyond a distance; its exponent is convex in the tilt.
    static double Wrapped(Draws tilted, double distance)
    {
        if (!(distance > 0))
            return 1;

        double turn = Math.Min(1e90, distance / tilted.Variance);
        return Side(1) + Side(-1);

        double Side(int direction)
        {
            double best = 0;
            for (double size = turn; size > turn * 1e-90; size /= 2)
            {
                double exponent = tilted.CentralLogMoment(direction * size) - size * distance;
                if (exponent > best && best < 0)
                    break;

                best = Math.Min(best, exponent);
            }

            return Elementary.Exp(best);
        }
    }

    static (double Sum, double Error) Inverted(Draws tilted, double decay, double excess, int period, double step)
    {
        double sum = 0, error = period * 1e-26, turn = 2 * Math.PI / period;
        for (int j = 0; j <= period / 2; j++)
        {
            double angle = turn * j, phases = Math.Abs(angle * excess), skip = 0;
            var exponent = new Complex(0, angle * excess);
            foreach (var (law, count) in tilted.Groups)
            {
                var part = ((ILattice)law).LogCharacteristic(angle, step);
                exponent += count * part;
                phases += count * Math.Abs(part.Imaginary);
                skip = Math.Max(skip, Skip(part.Real, count, Math.Sqrt(law.Variance) / step));
            }

            if (!(exponent.Real > LeastExponent))
            {
                j += (int)Math.Min(period, skip / turn);
                continue;
            }

            double weight = (j == 0 || 2 * j == period ? 1.0 : 2.0) / period;
            var term = weight * Elementary.Exp(exponent.Real) * Geometric(decay, angle, period / 2);
            double cosine = Trigonometry.Cosine(exponent.Imaginary), sine = Trigonometry.Sine(exponent.Imaginary);
            sum += term.Real * cosine - term.Imaginary * sine;
            error += term.Magnitude * 1e-15 * (4 - exponent.Real + phases);
        }

        return (sum, error);
    }

    // A characteristic function moves no faster than the deviation: so far on, one law's share alone stays negligible.
    static double Skip(double real, long count, double deviation) =>
        (Elementary.ExpMinusOne(LeastExponent / count) - Elementary.ExpMinusOne(real)) / deviation * (1 - 1e-9);

    // Σ z^y for y = 0 … count - 1, z = e^(-decay - i·angle).
    static Complex Geometric(double decay, double angle, int count) =>
        decay == 0 && angle == 0 ? count : Missing(decay * count, angle * count) / Missing(decay, angle);

    // 1 - e^(-decay - i·angle) without cancellation.
    static Complex Missing(double decay, double angle) =>
        -Elementary.ExpMinusOne(-decay) - Elementary.Exp(-decay) * Characteristic.Turn(-angle);
}
