namespace Assize.Benchmarks;

/// <summary>Laws with a mean of one's choice.</summary>
static class Draws
{
    const double RootThree = 1.7320508075688772;

    public static double Bernoulli(Random rng, double mean) => rng.NextDouble() < mean ? 1 : 0;

    public static double Uniform(Random rng, double mean, double deviation) =>
        mean + (2 * rng.NextDouble() - 1) * RootThree * deviation;

    /// <summary>By G. E. P. Box and M. E. Muller, Ann. Math. Statist. 29 (1958) 610–611.</summary>
    public static double Normal(Random rng, double mean, double deviation) =>
        mean + deviation * Math.Sqrt(-2 * Math.Log(1 - rng.NextDouble())) * Math.Cos(2 * Math.PI * rng.NextDouble());

    /// <summary>Standard deviation 1.</summary>
    public static double Exponential(Random rng, double mean) => mean - 1 - Math.Log(1 - rng.NextDouble());

    public static double TwoPoints(Random rng, double mean, double deviation) =>
        mean + (rng.NextDouble() < 0.5 ? deviation : -deviation);

    /// <summary>Standard deviation 1: thirty above now and then, else a little below the mean.</summary>
    public static double FarAtom(Random rng, double mean) => mean + (rng.NextDouble() < 1 / 901.0 ? 30 : -1 / 30.0);

    /// <summary>Standard deviation 0.2 in [0, 1]: the value 1 now and then, else a fixed one.</summary>
    public static double RarelyOne(Random rng, double mean)
    {
        double odds = 0.04 / ((1 - mean) * (1 - mean));
        double rate = odds / (1 + odds);
        return rng.NextDouble() < rate ? 1 : 1 - (1 - mean) / (1 - rate);
    }

    public static double BernoulliInformation(double truth, double other) =>
        Term(truth, other) + Term(1 - truth, 1 - other);

    static double Term(double share, double other) => share == 0 ? 0 : share * Math.Log(share / other);
}
