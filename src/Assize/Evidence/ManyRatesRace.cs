using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using Assize.Bounds;

namespace Assize;

/// <summary>One claim about many yes/no outputs of a trial: the average of their bets against the claim, and each one's own
/// bet against its defects.</summary>
/// <remarks>
/// Averages of supermartingales over common trials are supermartingales, whatever the outputs have to do with one another;
/// Ville's inequality bounds the average's ever reaching 1/risk. Green when every output has passed its own bet. What holds
/// at every trial holds at some: outputs are only counted between looks, and looks come at numbers of trials fixed beforehand,
/// each at most a 64th later than the one before. A trial costs little more than a pass over its outputs.
/// </remarks>
sealed class ManyRatesRace : IRace<bool[]>, IBatched
{
    const string Theorem = "average of bets on every output, Ville's inequality";
    const int LookAgain = 64;
    const int OutputsAtOnce = 1 << 18;

    // Above the rounding of a sum of as many exponentials as there are outputs.
    const double Rounding = 1e-9;

    readonly ManyStakes _stakes;
    readonly long _cap;
    readonly bool _isFixed;
    readonly byte[] _fresh;
    readonly long[] _counts;
    readonly bool[] _isNotAbove;
    readonly bool[] _isNotBelow;
    readonly IReadOnlyList<(long Low, long High)>? _exactly;
    int _freshTrials;
    long _trials;
    long _nextLook = 1;
    bool _decidedByCounts;

    /// <summary>A race before its first trial; an author's cap below the plan's own ends it undecided.</summary>
    public ManyRatesRace(ManyStakes stakes, long? authorCap = null, long? exactly = null)
    {
        int outputs = stakes.Plan.Rates.Count;
        (_stakes, _isFixed) = (stakes, exactly is not null);
        _cap = exactly ?? Math.Min(stakes.Trials, authorCap ?? long.MaxValue);
        _exactly = exactly is { } trials ? stakes.Plan.LimitsAt(trials) : null;
        _nextLook = exactly ?? 1;
        _fresh = new byte[(outputs + Vector256<byte>.Count - 1) / Vector256<byte>.Count * Vector256<byte>.Count];
        _counts = new long[outputs];
        _isNotAbove = [.. stakes.Plan.Rates.Select(edges => edges.UpperDefect is null)];
        _isNotBelow = [.. stakes.Plan.Rates.Select(edges => edges.LowerDefect is null)];
    }

    public Outcome? Outcome { get; private set; }

    public int Block => Math.Max(1, OutputsAtOnce / _counts.Length);

    public void Add(bool[] draw)
    {
        _trials++;
        if (draw is null || draw.Length != _counts.Length)
            throw new ClaimRefusedException($"Trial {Wording.Number(_trials)} yielded {draw?.Length ?? 0} outputs; "
                + $"the claim is about {_counts.Length}. Give as many in every trial.");

        Count(MemoryMarshal.AsBytes(draw.AsSpan()));
        if (_trials == _nextLook)
            Look();
        if (Outcome is null && _trials == _cap)
            AtCap();
    }

    public void Add(ReadOnlySpan<bool[]> draws)
    {
        foreach (bool[] draw in draws)
        {
            if (Outcome is not null)
                return;

            Add(draw);
        }
    }

    public RaceReport Report()
    {
        Settle();
        return ManyRatesReport.Of(
            _stakes, _counts, _trials, _decidedByCounts ? _stakes.Plan.Theorem : Theorem, _cap, _decidedByCounts ? Limits : null);
    }

    IReadOnlyList<(long Low, long High)> Limits => _exactly ?? _stakes.Limits;

    // A byte holds 255 trials; only then are they added to the counts.
    void Count(ReadOnlySpan<byte> outputs)
    {
        var one = Vector256.Create((byte)1);
        var fresh = _fresh.AsSpan();
        int i = 0;
        for (; i + Vector256<byte>.Count <= outputs.Length; i += Vector256<byte>.Count)
            (Vector256.Create<byte>(fresh[i..]) + Vector256.Min(Vector256.Create(outputs[i..]), one)).CopyTo(fresh[i..]);
        for (; i < outputs.Length; i++)
            fresh[i] += Math.Min(outputs[i], (byte)1);
        if (++_freshTrials == byte.MaxValue)
            Settle();
    }

    void Settle()
    {
        for (int output = 0; output < _counts.Length; output++)
            _counts[output] += _fresh[output];
        Array.Clear(_fresh);
        _freshTrials = 0;
    }

    void Look()
    {
        Settle();
        if (_isFixed)
            return;

        _nextLook += Math.Max(1, _nextLook / LookAgain);
        var seen = new Dictionary<(int Kind, long Count), (double Against, bool NotAbove, bool NotBelow)>();
        double sum = 0;
        bool allGreen = true;
        for (int output = 0; output < _counts.Length; output++)
        {
            var key = (_stakes.Plan.KindOf[output], _counts[output]);
            if (!seen.TryGetValue(key, out var wealth))
                seen.Add(key, wealth = WealthOf(key.Item1, key.Item2));
            sum += wealth.Against;
            _isNotAbove[output] |= wealth.NotAbove;
            _isNotBelow[output] |= wealth.NotBelow;
            allGreen &= _isNotAbove[output] && _isNotBelow[output];
        }

        if (sum * (1 - Rounding) >= _counts.Length)
            Outcome = Assize.Outcome.Refuted;
        else if (allGreen)
            Outcome = Assize.Outcome.Upheld;
    }

    // The evidence against the claim in units of its level.
    (double Against, bool NotAbove, bool NotBelow) WealthOf(int kind, long count)
    {
        var bets = _stakes.Bets[kind];
        return (
            Elementary.Exp(Math.Min(700, Bet.Average(bets.ClaimFromAbove, bets.ClaimFromBelow, _trials, count).AtLeast - _stakes.LogRed)),
            bets.DefectAbove is { } above && above.Wealth(_trials, count).AtLeast >= _stakes.LogGreen,
            bets.DefectBelow is { } below && below.Wealth(_trials, count).AtLeast >= _stakes.LogGreen);
    }

    // P(red) ≤ P(race red) + P(limits reject) ≤ 0.9 risk + 0.1 risk, and likewise green: the limits see every draw.
    void AtCap()
    {
        Settle();
        _decidedByCounts = _isFixed || _cap == _stakes.Trials;
        Outcome = !_decidedByCounts ? Assize.Outcome.Undecided
            : ManyRatesReport.Outside(_stakes, _counts, Limits).Any() ? Assize.Outcome.Refuted
            : Assize.Outcome.Upheld;
    }
}
