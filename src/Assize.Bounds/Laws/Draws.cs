namespace Assize.Bounds;

/// <summary>Independent draws that are added up: some of one law, or some of each of several.</summary>
public sealed class Draws
{
    readonly (Law Law, long Count)[] _groups;

    Draws((Law, long)[] groups) => _groups = groups;

    /// <summary>Draws of one law.</summary>
    /// <param name="law">The law of each draw.</param>
    /// <param name="count">How many, in [1, 2^52].</param>
    /// <returns>The draws.</returns>
    /// <exception cref="ArgumentOutOfRangeException">The count lies outside its domain.</exception>
    public static Draws Of(Law law, long count) => Of([(law, count)]);

    /// <summary>Draws of several laws, all independent.</summary>
    /// <param name="groups">Each law with how many draws there are of it, in [1, 2^52].</param>
    /// <returns>The draws.</returns>
    /// <exception cref="ArgumentException">There is no group, or a count lies outside its domain.</exception>
    public static Draws Of(params IReadOnlyList<(Law Law, long Count)> groups)
    {
        if (groups is null || groups.Count == 0)
            throw new ArgumentException("There must be at least one draw.", nameof(groups));

        foreach (var (law, count) in groups)
        {
            if (law is null)
                throw new ArgumentNullException(nameof(groups));
            Check.AtLeast(count, 1, nameof(groups));
            Check.AtMost(count, Binomial.MaximumTrials, nameof(groups));
        }

        return new Draws([.. groups]);
    }

    /// <summary>How many draws there are of each law.</summary>
    public IReadOnlyList<(Law Law, long Count)> Groups => _groups;

    /// <summary>Whether all draws have one law.</summary>
    public bool Identical => _groups.Length == 1;

    /// <summary>The mean of the sum.</summary>
    public double Mean => Total(law => law.Mean);

    /// <summary>The variance of the sum.</summary>
    public double Variance => Total(law => law.Variance);

    /// <summary>The sum of the draws' third absolute central moments.</summary>
    public double ThirdAbsoluteCentralMoments => Total(law => law.ThirdAbsoluteCentralMoment);

    /// <summary>The least value of the sum, or negative infinity.</summary>
    public double Minimum => Total(law => law.Minimum);

    /// <summary>The greatest value of the sum, or positive infinity.</summary>
    public double Maximum => Total(law => law.Maximum);

    /// <summary>The mean of the sum minus a total: differences first, so that a common offset costs no
    /// digits.</summary>
    internal double MeanExcess(double total)
    {
        double share = total / _groups.Sum(group => (double)group.Count);
        double rounded = 0, excess = 0;
        foreach (var (law, count) in _groups)
        {
            excess += count * (law.Mean - share);
            rounded += count;
        }

        var product = Twofold.Product(rounded, share);
        return excess + (product.Upper - total) + product.Lower;
    }

    internal double CentralLogMoment(double tilt) => Total(law => law.CentralLogMoment(tilt));

    internal Draws Tilted(double tilt) => new([.. _groups.Select(group => (group.Law.Tilted(tilt), group.Count))]);

    internal Draws Mirrored() => new([.. _groups.Select(group => (group.Law.Image(-1, 0), group.Count))]);

    double Total(Func<Law, double> moment)
    {
        double sum = 0;
        foreach (var (law, count) in _groups)
            sum += count * moment(law);
        return sum;
    }
}
