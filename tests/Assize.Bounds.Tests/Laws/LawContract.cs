using System.Numerics;

namespace Assize.Bounds.Tests;

/// <summary>What holds for every law, asked of its masses (or of a density on a fine grid) and of its own
/// cumulants.</summary>
static class LawContract
{
    /// <summary>Moments and cumulants against plain sums over values and weights, which need not add up to 1.</summary>
    public static void AgreesWithSums(
        Law law, (double Value, double Weight)[] masses, double accuracy, params double[] tilts)
    {
        double whole = masses.Sum(mass => mass.Weight);
        double Expected(Func<double, double> function) =>
            masses.Sum(mass => mass.Weight * function(mass.Value)) / whole;

        double mean = Expected(value => value);
        Close(mean, law.Mean, accuracy * (1 + Math.Sqrt(law.Variance)), "mean");
        Close(Expected(value => Math.Pow(value - law.Mean, 2)), law.Variance, accuracy * law.Variance, "variance");
        double third = Expected(value => Math.Pow(Math.Abs(value - law.Mean), 3));
        Close(third, law.ThirdAbsoluteCentralMoment, accuracy * third, "third moment");
        foreach (double tilt in tilts)
        {
            double cumulant = Math.Log(Expected(value => Math.Exp(tilt * (value - law.Mean))));
            Close(cumulant, law.CentralLogMoment(tilt), accuracy * (1 + Math.Abs(cumulant)),
                $"central cumulant at {tilt}");
            double all = cumulant + tilt * law.Mean;
            Close(all, law.LogMoment(tilt), accuracy * (1 + Math.Abs(cumulant) + Math.Abs(tilt * law.Mean)),
                $"cumulant at {tilt}");
        }
    }

    /// <summary>The tilted law has the slopes of the cumulant for its moments, and tilting back gives the law
    /// again.</summary>
    public static void TiltsConsistently(Law law, params double[] tilts)
    {
        Assert.Equal((0, 0), (law.LogMoment(0), law.CentralLogMoment(0)));
        foreach (double tilt in tilts)
        {
            var tilted = law.Tilted(tilt);
            double deviation = Math.Sqrt(tilted.Variance), step = 1e-4 * Unit(tilted);
            double slope = (law.LogMoment(tilt + step) - law.LogMoment(tilt - step)) / (2 * step);
            Close(slope, tilted.Mean, 1e-6 * deviation + 1e-9 * Math.Abs(slope), $"mean at {tilt}");
            double bend = (law.Tilted(tilt + step).Mean - law.Tilted(tilt - step).Mean) / (2 * step);
            Close(bend, tilted.Variance, 1e-6 * bend, $"variance at {tilt}");
            Assert.Equal((law.Minimum, law.Maximum), (tilted.Minimum, tilted.Maximum));
            Close(law.Mean, tilted.Tilted(-tilt).Mean, 1e-10 * (Math.Abs(law.Mean) + Math.Sqrt(law.Variance)),
                $"mean after {tilt} and back");
            // K(t + s) = K(t) + K_t(s) ties the tilted law's own cumulant to the first law's.
            double further = 0.3 * Unit(tilted);
            double both = law.LogMoment(tilt + further) - law.LogMoment(tilt) - further * tilted.Mean;
            Close(both, tilted.CentralLogMoment(further), 1e-10 * (1 + Math.Abs(law.LogMoment(tilt))),
                $"cumulant of the law tilted by {tilt}");
        }

        double small = 1e-7 * Unit(law);
        Close(0.5 * small * small * law.Variance, law.CentralLogMoment(small), 1e-20, "cumulant near 0");
        Close(1, law.CentralLogMoment(small) / (0.5 * small * small * law.Variance), 1e-4, "relative cumulant near 0");
    }

    // The tilt over which a law changes shape: at most the reciprocal of its deviation, less where it is skew.
    static double Unit(Law law) => law.Variance / law.ThirdAbsoluteCentralMoment;

    /// <summary>The logarithm of the characteristic function about the mean, against the plain sum.</summary>
    public static void TurnsOnItsLattice(Law law, (double Value, double Weight)[] masses, double start, double step)
    {
        var lattice = (ILattice)law;
        Assert.Equal((start, step), (lattice.Start, lattice.Step!.Value));
        foreach (double angle in new[] { 1e-5, 0.1, -0.4, 1, 2, 3 })
        {
            var sum = Complex.Zero;
            foreach (var (value, weight) in masses)
                sum += weight * Complex.Exp(new Complex(0, angle * (value - law.Mean) / step));
            var computed = Complex.Exp(lattice.LogCharacteristic(angle, step));
            Assert.True((sum / masses.Sum(mass => mass.Weight) - computed).Magnitude < 2e-13,
                $"angle {angle}: {sum} {computed}");
        }

        double turn = 1e-7 * step * Unit(law);
        double real = lattice.LogCharacteristic(turn, step).Real;
        Close(1, real / (-0.5 * law.Variance * Math.Pow(turn / step, 2)), 1e-6, "characteristic near 0");
    }

    public static void RefusesTiltsWithoutALaw(Law law, params double[] tilts)
    {
        foreach (double tilt in tilts.Append(double.NaN))
            Assert.Throws<ArgumentOutOfRangeException>("tilt", () => law.Tilted(tilt));
        Assert.Throws<ArgumentOutOfRangeException>("tilt", () => law.LogMoment(double.NaN));
        Assert.Throws<ArgumentOutOfRangeException>("tilt", () => law.CentralLogMoment(double.PositiveInfinity));
    }

    public static void Close(double expected, double actual, double allowed, string what) =>
        Assert.True(Math.Abs(expected - actual) <= allowed, $"{what}: {actual:R} instead of {expected:R}");

    /// <summary>A density on an even grid, in a variable that the value is a function of: the trapezoidal
    /// rule.</summary>
    public static (double Value, double Weight)[] Grid(
        double lower, double upper, double step, Func<double, double> value, Func<double, double> logDensity) =>
        [.. Enumerable.Range(0, (int)((upper - lower) / step) + 1).Select(i => lower + i * step)
            .Select(u => (value(u), Math.Exp(logDensity(u))))];
}
