using Assize.Bounds;

namespace Assize.Tests.Evidence;

/// <summary>
/// The race judged anew, every trial, by arithmetic that shares no formula with it: powers of ratios for each side, a
/// product for the bet on all together; and its two errors exactly, every path of three categories carried forward at once.
/// </summary>
public class SharesRaceTests
{
    static readonly Edges[] Three = [.. new[] { 0.5, 0.3, 0.2 }.Select(share => Edges.Around(Domain.Rate, share, 0.15, 0.3))];

    sealed record Judge(Edges[] Rates, double Risk, double Miss)
    {
        int Sides { get; } = Rates.Sum(rate => (rate.UpperEdge is null ? 0 : 1) + (rate.LowerEdge is null ? 0 : 1));

        static double Ratio(double rate, double against, long trials, long hits) =>
            Math.Exp((hits == 0 ? 0 : hits * Math.Log(rate / against)) + (trials == hits ? 0 : (trials - hits) * Math.Log((1 - rate) / (1 - against))));

        static double AgainstClaim(double target, double edge, double defect, double rim, long trials, long hits)
        {
            var rates = new List<double>();
            for (double gap = defect - target; (rim > target ? target + gap < rim : target + gap > rim); gap *= 2)
                rates.Add(target + gap);
            rates.Add(rim);
            double sum = 0;
            for (int k = 0; k < rates.Count; k++)
                sum += (rates.Count == 1 ? 1 : k == 0 ? 0.5 : 0.5 / (rates.Count - 1)) * Ratio(rates[k], edge, trials, hits);
            return sum;
        }

        public bool Reds(long trials, ReadOnlySpan<long> hits, double together)
        {
            double level = 1 / (0.9 * Risk);
            bool red = together >= 2 * level;
            for (int i = 0; i < Rates.Length; i++)
            {
                if (Rates[i].UpperEdge is { } upper)
                    red |= AgainstClaim(Rates[i].Target, upper, Rates[i].UpperDefect ?? 1, 1, trials, hits[i]) >= 2 * Sides * level;
                if (Rates[i].LowerEdge is { } lower)
                    red |= AgainstClaim(Rates[i].Target, lower, Rates[i].LowerDefect ?? 0, 0, trials, hits[i]) >= 2 * Sides * level;
            }

            return red;
        }

        public int Flags(long trials, ReadOnlySpan<long> hits)
        {
            int flags = 0;
            for (int i = 0; i < Rates.Length; i++)
            {
                var rate = Rates[i];
                double Green(double edge, double defect) =>
                    (Ratio(rate.Target, defect, trials, Hits) + Ratio(edge, defect, trials, Hits)) / 2;
                Hits = hits[i];
                if (rate.UpperDefect is not { } above || Green(rate.UpperEdge!.Value, above) >= 1 / (0.9 * Miss))
                    flags |= 1 << 2 * i;
                if (rate.LowerDefect is not { } below || Green(rate.LowerEdge!.Value, below) >= 1 / (0.9 * Miss))
                    flags |= 2 << 2 * i;
            }

            return flags;
        }

        long Hits { get; set; }

        public int All => (1 << 2 * Rates.Length) - 1;

        public double Next(double together, long trialsBefore, long hitsBefore, int cell) =>
            together * (hitsBefore + 1) / (trialsBefore + Rates.Length) / (Rates[cell].UpperEdge ?? 1);
    }

    static ManyStakes Stakes(Edges[] rates, double risk, double confidence) =>
        ManyStakes.Of(ManyRatesPlan.For(rates, risk, confidence));

    // Lazy deadlines must neither skip the first trial that decides nor invent one.
    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    [InlineData(3)]
    public void Every_verdict_comes_at_the_trial_at_which_judging_anew_gives_it(int seed)
    {
        var rates = new[] { 0.4, 0.3, 0.2, 0.06, 0.04 }.Select((share, i) => Edges.Around(Domain.Rate, share, i == 3 ? 0 : 0.02, 0.05)).ToArray();
        var stakes = Stakes(rates, 1e-3, 0.99);
        var random = new Random(seed);
        int red = 0, green = 0;
        for (int repetition = 0; repetition < 60; repetition++)
        {
            double shift = repetition % 4 * 0.025;
            double[] ends = [0.4 + shift, 0.7, 0.9, 0.96, 1];
            var race = new SharesRace(stakes, cell => $"{cell}");
            var judge = new Judge(rates, 1e-3, stakes.Plan.Miss);
            var hits = new long[rates.Length];
            (double together, int flags, long trials) = (1, 0, 0);
            while (race.Outcome is null)
            {
                double place = random.NextDouble();
                int cell = Array.FindIndex(ends, end => place < end);
                together = judge.Next(together, trials, hits[cell], cell);
                (trials, hits[cell]) = (trials + 1, hits[cell] + 1);
                race.Add(cell);
                bool isRed = judge.Reds(trials, hits, together);
                flags |= isRed ? 0 : judge.Flags(trials, hits);
                Outcome? expected = isRed ? Outcome.Refuted : flags == judge.All ? Outcome.Upheld : null;
                if (trials == stakes.Trials)
                    break;
                Assert.Equal(expected, race.Outcome);
            }

            (red, green) = (red + (race.Outcome == Outcome.Refuted ? 1 : 0), green + (race.Outcome == Outcome.Upheld ? 1 : 0));
        }

        Assert.True(red >= 5 && green >= 5, $"{red} red, {green} green");
    }

    // Risk 0.1 and miss 0.1, so that hardly a hundred trials are enough.
    [Theory]
    [InlineData(0.5, 0.3, true)]
    [InlineData(0.65, 0.15, true)]
    [InlineData(0.35, 0.45, true)]
    [InlineData(0.35, 0.3, true)]
    [InlineData(0.8, 0.1, false)]
    [InlineData(0.2, 0.4, false)]
    [InlineData(0.25, 0.6, false)]
    public void Both_errors_are_bounded_exactly(double one, double two, bool isRight)
    {
        var stakes = Stakes(Three, 0.1, 0.9);
        var (red, green) = Exactly(stakes, [one, two, 1 - one - two]);

        Assert.Equal(1, red + green, 1e-9);
        Assert.True(isRight ? red <= 0.1 : green <= 0.1, $"red {red}, green {green}");
        Assert.True(isRight || green > 1e-4, $"green {green}: nothing was tried");
    }

    static (double Red, double Green) Exactly(ManyStakes stakes, double[] shares)
    {
        var judge = new Judge(Three, 0.1, stakes.Plan.Miss);
        var open = new Dictionary<(long, long, int), double> { [(0, 0, 0)] = 1 };
        (double red, double green) = (0, 0);
        for (long trials = 1; open.Count > 0; trials++)
        {
            var next = new Dictionary<(long, long, int), double>();
            foreach (var ((one, two, flags), mass) in open)
            {
                for (int cell = 0; cell < 3; cell++)
                {
                    var key = (one + (cell == 0 ? 1 : 0), two + (cell == 1 ? 1 : 0), flags);
                    next[key] = next.GetValueOrDefault(key) + mass * shares[cell];
                }
            }

            open = [];
            foreach (var ((one, two, flags), mass) in next)
            {
                long[] hits = [one, two, trials - one - two];
                int now = flags | judge.Flags(trials, hits);
                if (mass < 1e-14)
                    (red, green) = (red + mass / 2, green + mass / 2);
                else if (judge.Reds(trials, hits, Together(hits)))
                    red += mass;
                else if (now == judge.All)
                    green += mass;
                else if (trials == stakes.Trials && Enumerable.Range(0, 3).All(i => hits[i] >= Limit(i).Low && hits[i] <= Limit(i).High))
                    green += mass;
                else if (trials == stakes.Trials)
                    red += mass;
                else
                    open[(one, two, now)] = open.GetValueOrDefault((one, two, now)) + mass;
            }
        }

        return (red, green);

        (long Low, long High) Limit(int cell) => stakes.Limits[stakes.Plan.KindOf[cell]];
    }

    // The bet on all together depends on the counts alone: 2!·Π hits!/(trials + 2)!, over the edges.
    static double Together(long[] hits)
    {
        (double together, long trials) = (1, 0);
        for (int cell = 0; cell < 3; cell++)
        {
            for (long hit = 0; hit < hits[cell]; hit++)
                together *= (hit + 1) / (trials++ + 3.0) / Three[cell].UpperEdge!.Value;
        }

        return together;
    }
}
