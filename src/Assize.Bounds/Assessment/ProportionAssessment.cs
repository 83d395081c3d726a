namespace Assize.Bounds;

/// <summary>What an existing assertion on a count of successes does: how often it is red on right code and what it catches.</summary>
public static class ProportionAssessment
{
    /// <summary>The theorem behind every answer of this class.</summary>
    public static string Theorem => BinomialTail.Name;

    /// <summary>How often the assertion is red.</summary>
    /// <param name="trials">Number of trials, in [1, 2^52].</param>
    /// <param name="acceptLow">Least number of successes that passes.</param>
    /// <param name="acceptHigh">Greatest number of successes that passes, at least <paramref name="acceptLow"/> - 1.</param>
    /// <param name="rate">The true rate, in [0, 1].</param>
    /// <returns>An enclosure of the probability of red: the false failure if the rate is right.</returns>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public static Enclosure Assess(long trials, long acceptLow, long acceptHigh, double rate)
    {
        Check.AtLeast(trials, 1, nameof(trials));
        return BinomialTail.Outside(trials, acceptLow, acceptHigh, rate);
    }
}
