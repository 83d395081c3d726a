namespace Assize.Bounds;

/// <summary>From how many trials on a band of shares is red seldom enough.</summary>
/// <remarks>
/// Above some number an envelope that falls with the trials settles everything: A. M. Zubkov and A. A. Serov, Theory
/// Probab. Appl. 57 (2013) 539–544,
/// P(S ≥ k) ≤ Q(√(2n KL((k-1)/n ‖ p))), with k ≥ n · high. Below it, exact tails look for the last number that fails.
/// </remarks>
sealed class BandSearch
{
    // A share this near a rim, relatively, counts as on it.
    const double Rim = 1e-12;

    // Keeps an answer within a fraction of a millisecond; what is left over is at most one step of the count too many.
    const int MostEvaluations = 400;

    readonly double _low;
    readonly double _high;
    readonly double _rate;
    readonly double _risk;
    int _evaluations;

    public BandSearch(ProportionBand band, double rate, double risk)
    {
        _low = (band.Low ?? -1) * (1 + Rim);
        _high = (band.High ?? 2) * (1 - Rim);
        (_rate, _risk) = (rate, risk);
    }

    public long? Trials()
    {
        if (!(_low < _rate && _rate < _high))
            return null;

        long proven = IntegerSearch.First(
            1, RatePlan.MaximumTrials, Guess(), trials => RateSide.Within(Envelope(trials), _risk));
        if (proven > RatePlan.MaximumTrials)
            return null;

        long trials = proven - 1;
        while (trials >= 1 && _evaluations < MostEvaluations)
        {
            long start = SegmentStart(trials);
            if (LastFailing(start, trials) is { } failing)
                return failing + 1;

            trials = start - 1;
        }

        return trials + 1;
    }

    long Guess()
    {
        double slowest = Math.Min(
            _high <= 1 ? Divergence.Bernoulli(_high, _rate) : double.PositiveInfinity,
            _low >= 0 ? Divergence.Bernoulli(_low, _rate) : double.PositiveInfinity);
        return (long)Math.Min(RatePlan.MaximumTrials, -Elementary.Log(_risk) / slowest);
    }

    double Envelope(long trials)
    {
        double step = 1.0 / trials;
        return EnvelopeOf(_high > 1, _high - step - _rate, _high - step, trials)
            + EnvelopeOf(_low < 0, _rate - _low - step, _low + step, trials);
    }

    double EnvelopeOf(bool unreachable, double distance, double share, long trials) =>
        unreachable ? 0
        : distance <= 0 ? 1
        : NormalTail.Upper(Math.Sqrt(2 * trials * Divergence.Bernoulli(share, _rate)));

    long FirstAbove(long trials) => _high > 1 ? trials + 1 : (long)Math.Ceiling(trials * _high);

    long LastBelow(long trials) => _low < 0 ? -1 : (long)Math.Floor(trials * _low);

    // Between two steps of the counts that pass, one tail only grows with the trials and the other only shrinks.
    long SegmentStart(long trials)
    {
        long above = FirstAbove(trials);
        long below = LastBelow(trials);
        return IntegerSearch.First(
            1, trials, trials, n => (_high > 1 || FirstAbove(n) == above) && LastBelow(n) == below);
    }

    long? LastFailing(long start, long end)
    {
        _evaluations++;
        double above = Binomial.UpperTail(end, FirstAbove(end), _rate);
        double below = Binomial.LowerTail(start, LastBelow(start), _rate);
        if (RateSide.Within(above + below, _risk))
            return null;
        if (start == end || _evaluations >= MostEvaluations)
            return end;

        long middle = start + (end - start) / 2;
        return LastFailing(middle + 1, end) ?? LastFailing(start, middle);
    }
}
