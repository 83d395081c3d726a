namespace Assize.Bounds;

/// <summary>What an assertion on the average of draws does.</summary>
public sealed class MeanAssessment : Assessment
{
    readonly SumAssessment? _sum;
    readonly MeanFacts _facts;
    readonly long _trials;
    readonly double _centre;
    readonly Band _band;
    readonly IReadOnlyList<MeanTheorem> _theorems;

    /// <summary>An assertion on the average of draws of a known law.</summary>
    /// <param name="law">The law of one draw on right code, of positive variance.</param>
    /// <param name="trials">Number of draws, in [1, 2^52].</param>
    /// <param name="band">The averages that pass.</param>
    /// <exception cref="ArgumentException">An argument lies outside its domain, or is NaN.</exception>
    public MeanAssessment(Law law, long trials, Band band)
    {
        if (band is null)
            throw new ArgumentNullException(nameof(band));

        _sum = new SumAssessment(law, trials, band.Times(trials));
        (_trials, _band, _centre, _facts, _theorems) = (trials, band, law.Mean, MeanFacts.None, []);
    }

    /// <summary>An assertion on the average of draws of which only facts are known.</summary>
    /// <param name="minimum">The least possible draw, finite.</param>
    /// <param name="maximum">The greatest possible draw, above <paramref name="minimum"/>.</param>
    /// <param name="standardDeviation">At least the standard deviation of a draw, above 0; null when not
    /// known.</param>
    /// <param name="centre">The mean on right code, in [minimum, maximum].</param>
    /// <param name="trials">Number of draws, in [1, 1e9].</param>
    /// <param name="band">The averages that pass.</param>
    /// <exception cref="ArgumentException">An argument lies outside its domain, or is NaN.</exception>
    public MeanAssessment(double minimum, double maximum, double? standardDeviation, double centre, long trials, Band band)
    {
        Check.Between(centre, minimum, maximum, nameof(centre));
        Check.AtLeast(trials, 1, nameof(trials));
        Check.AtMost(trials, 1_000_000_000, nameof(trials));
        var facts = MeanFacts.None.Between(minimum, maximum);
        _facts = standardDeviation is { } deviation ? facts.DeviatingAtMost(deviation) : facts;
        (_trials, _band, _centre) = (trials, band ?? throw new ArgumentNullException(nameof(band)), centre);
        _theorems = [.. MeanTheorem.All.Where(theorem => theorem.Applies(_facts))];
    }

    /// <inheritdoc/>
    public override string Theorem => _sum?.Theorem
        ?? _theorems.OrderBy(theorem => Red(theorem, _band, _trials)).First().Name;

    /// <inheritdoc/>
    public override Enclosure FalseFailure => _sum?.FalseFailure ?? new Enclosure(0, Math.Min(1, Red(_band, _trials)));

    /// <inheritdoc/>
    public override double? SmallestDefectCaught(double confidence)
    {
        if (_sum is not null)
            return _sum.SmallestDefectCaught(confidence);

        Check.Inside(confidence, 0, 1, nameof(confidence));
        double miss = Decimals.Complement(confidence);
        // Too great by a shift, green is an average that far below its mean.
        double? Shift(MeanFacts facts, double centre, double? rim) => rim is not { } high ? null
            : Least(facts.Maximum!.Value - centre, shift => high < centre + shift
                && Beyond(facts.Mirrored(), -(centre + shift), centre + shift - high, _trials) <= miss);
        return Nearer(Shift(_facts, _centre, _band.High), Shift(_facts.Mirrored(), -_centre, -_band.Low));
    }

    /// <inheritdoc/>
    public override long? TrialsNeeded(double risk)
    {
        if (_sum is not null)
            return _sum.TrialsNeeded(risk);

        Check.Between(risk, 1e-300, 1, nameof(risk));
        if (_band.Low >= _centre || _band.High <= _centre)
            return null;

        long most = 1_000_000_000;
        long first = IntegerSearch.First(1, most, _trials, trials => Red(_band, trials) <= risk);
        return first <= most ? first : null;
    }

    /// <inheritdoc/>
    public override double? ToleranceAffordable(double risk)
    {
        if (_sum is not null)
            return _sum.ToleranceAffordable(risk) / _trials;

        Check.Between(risk, 1e-300, 1 - 1e-15, nameof(risk));
        double widest = Math.Max(_facts.Maximum!.Value - _centre, _centre - _facts.Minimum!.Value) * (1 + 1e-9);
        return Least(widest, half => Red(new Band(_centre - half, _centre + half), _trials) <= risk);
    }

    double Red(Band band, long trials) => _theorems.Count == 0 ? 1 : _theorems.Min(theorem => Red(theorem, band, trials));

    double Red(MeanTheorem theorem, Band band, long trials) =>
        Side(theorem, _facts, _centre, band.High, trials) + Side(theorem, _facts.Mirrored(), -_centre, -band.Low, trials);

    static double Side(MeanTheorem theorem, MeanFacts facts, double centre, double? rim, long trials) =>
        rim is not { } high || high > facts.Maximum ? 0
        : high <= centre ? 1
        : theorem.Beyond(facts, trials, centre, (high - centre) * (1 - 1e-12));

    double Beyond(MeanFacts facts, double mean, double margin, long trials) =>
        _theorems.Min(theorem => theorem.Beyond(facts, trials, mean, margin * (1 - 1e-12)));
}
