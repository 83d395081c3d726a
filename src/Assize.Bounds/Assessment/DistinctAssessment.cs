namespace Assize.Bounds;

/// <summary>What an assertion does that all draws from equally likely values are different: the birthday
/// problem.</summary>
public sealed class DistinctAssessment : Assessment
{
    const long MostTerms = 20_000;

    readonly double _values;
    readonly long _trials;

    /// <summary>An assertion that no value comes twice.</summary>
    /// <param name="values">Number of equally likely values, in [1, 1e300].</param>
    /// <param name="trials">Number of draws, in [1, 2^52].</param>
    /// <exception cref="ArgumentOutOfRangeException">An argument lies outside its domain, or is NaN.</exception>
    public DistinctAssessment(double values, long trials)
    {
        Check.Between(values, 1, 1e300, nameof(values));
        Check.AtLeast(trials, 1, nameof(trials));
        Check.AtMost(trials, Binomial.MaximumTrials, nameof(trials));
        (_values, _trials) = (values, trials);
    }

    /// <inheritdoc/>
    public override string Theorem => "birthday problem";

    /// <inheritdoc/>
    public override Enclosure FalseFailure
    {
        get
        {
            if (_trials > _values)
                return new Enclosure(1, 1);

            // P(all different) = Π(1 - i/values), i < trials; x ≤ -ln(1 - x) ≤ x + x²/(2(1 - x)) beyond the terms added up.
            double exact = 0;
            long terms = Math.Min(_trials, MostTerms);
            for (long i = 1; i < terms; i++)
                exact -= Elementary.LogOnePlus(-i / _values);
            double n = _trials, k = terms;
            double rest = n > k ? (n * (n - 1) - k * (k - 1)) / (2 * _values) : 0;
            double greatest = (n - 1) / _values;
            double above = n > k ? rest * (1 + greatest / (2 * Math.Max(1e-300, 1 - greatest))) : 0;
            double Repeats(double log) => -Elementary.ExpMinusOne(-log);
            return new Enclosure(Repeats((exact + rest) * (1 - 1e-12)), Math.Min(1, Repeats((exact + above) * (1 + 1e-12))));
        }
    }

    /// <inheritdoc/>
    public override double? SmallestDefectCaught(double confidence)
    {
        Check.Inside(confidence, 0, 1, nameof(confidence));
        return null;
    }
}
