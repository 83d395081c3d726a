using Assize.Bounds;

namespace Assize.Tests.Claims;

public class ManyRatesClaimTests
{
    static void Coins(Random rng, Span<bool> outputs, Func<int, double> rate)
    {
        for (int i = 0; i < outputs.Length; i++)
            outputs[i] = rng.NextDouble() < rate(i);
    }

    [Fact]
    public void Right_rates_are_upheld_and_one_wrong_one_is_refuted_by_name()
    {
        var claim = Claim.ManyRates(100, target: 0.5, tolerance: 0.02, defect: 0.06);

        Assert.Equal(Outcome.Upheld, claim.Judge((rng, outputs) => Coins(rng, outputs, _ => 0.5)).Outcome);
        var wrong = claim.Judge((rng, outputs) => Coins(rng, outputs, i => i == 17 ? 0.62 : 0.5));
        Assert.Equal(Outcome.Refuted, wrong.Outcome);
        Assert.Matches(@"refuted      output 17: 0\.6\d* \([\d,]+ of [\d,]+\); evidence against it alone ", wrong.ToString());
        Assert.DoesNotContain("output 16", wrong.ToString(), StringComparison.Ordinal);
    }

    // A 64-bit mixer (SplitMix64's finaliser): every flipped input bit flips every output bit half of the time.
    static ulong Mixed(ulong x)
    {
        x = (x ^ x >> 30) * 0xBF58476D1CE4E5B9;
        x = (x ^ x >> 27) * 0x94D049BB133111EB;
        return x ^ x >> 31;
    }

    static void Avalanche(Random rng, Span<bool> cells, Func<ulong, ulong> hash)
    {
        ulong input = (ulong)rng.NextInt64() ^ (ulong)rng.NextInt64() << 1;
        ulong output = hash(input);
        for (int flipped = 0; flipped < 64; flipped++)
        {
            ulong changed = output ^ hash(input ^ 1UL << flipped);
            for (int bit = 0; bit < 64; bit++)
                cells[64 * flipped + bit] = (changed >> bit & 1) == 1;
        }
    }

    [Fact]
    public void All_cells_of_an_avalanche_table_are_judged_in_one_pass()
    {
        var claim = Claim.ManyRates(64 * 64, target: 0.5, tolerance: 0.05);

        Assert.Equal(Outcome.Upheld, claim.Judge((rng, cells) => Avalanche(rng, cells, Mixed)).Outcome);
        string text = claim.Judge((rng, cells) => Avalanche(rng, cells, x => x * 0x9E3779B97F4A7C15)).ToString();
        Assert.Contains("refuted      the outputs together; none of them alone can be named", text, StringComparison.Ordinal);
        // One cell that never flips is named, with all the others by its side.
        text = claim.Judge((rng, cells) =>
        {
            Avalanche(rng, cells, Mixed);
            cells[77] = false;
        }).ToString();
        Assert.Contains("refuted      output 77: 0 (0 of ", text, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(0.05, true)]
    [InlineData(0.1, false)]
    [InlineData(0.2, false)]
    public void Both_promises_are_kept(double shift, bool isRight)
    {
        var claim = Claim.ManyRates(8, target: 0.5, tolerance: 0.05);

        Calibrated.Keeps(claim, loose => loose.Judge((rng, outputs) => Coins(rng, outputs, i => isRight || i == 3 ? 0.5 + shift : 0.5)), isRight);
        // The same coin eight times over: outputs depend on one another as much as they can.
        Calibrated.Keeps(claim, loose => loose.Judge((rng, outputs) => outputs.Fill(rng.NextDouble() < 0.5 + shift)), isRight);
        var rare = Claim.ManyRates(4, target: 0.1, tolerance: 0.05);
        Calibrated.Keeps(rare, loose => loose.Judge((rng, outputs) => Coins(rng, outputs, _ => 0.1 + shift)), isRight);
    }

    // 2^m groups, each averaged by itself: no member is refuted but by all groups that contain it.
    [Fact]
    public void Closed_testing_agrees_with_all_groups_one_by_one()
    {
        var random = new Random(3);
        int refuted = 0;
        for (int repetition = 0; repetition < 200; repetition++)
        {
            double[] evidence = [.. Enumerable.Range(0, 7).Select(_ => Math.Exp(4 * random.NextDouble() - 1))];
            var expected = Enumerable.Range(0, 7).Where(member => Enumerable.Range(1, 127)
                .Where(group => (group >> member & 1) == 1)
                .All(group => Enumerable.Range(0, 7).Where(other => (group >> other & 1) == 1).Average(other => evidence[other]) >= 1));

            Assert.Equal(expected, ClosedTesting.Refuted(evidence).Order());
            refuted += expected.Count();
        }

        Assert.InRange(refuted, 100, 1300);
    }

    // The errors of one output, exactly: counts carried forward through the looks, arithmetic on powers of ratios.
    [Theory]
    [InlineData(0.55, true)]
    [InlineData(0.6, false)]
    public void Both_errors_of_one_output_are_bounded_exactly(double truth, bool isRight)
    {
        var stakes = ManyStakes.Of(ManyRatesPlan.For([Edges.Around(Domain.Rate, 0.5, 0.05)], 0.05, 0.95));
        Assert.True(stakes.Trials < 4_000);
        var mass = new Dictionary<(long Count, int Flags), double> { [(0, 0)] = 1 };
        (double red, double green, long nextLook) = (0, 0, 1);
        for (long trials = 1; trials <= stakes.Trials; trials++)
        {
            var next = new Dictionary<(long Count, int Flags), double>();
            foreach (var ((count, flags), p) in mass)
            {
                next[(count + 1, flags)] = next.GetValueOrDefault((count + 1, flags)) + p * truth;
                next[(count, flags)] = next.GetValueOrDefault((count, flags)) + p * (1 - truth);
            }

            mass = next;
            if (trials != nextLook)
                continue;

            nextLook += Math.Max(1, nextLook / 64);
            mass = [];
            foreach (var ((count, flags), p) in next)
            {
                double Ratio(double rate, double against) =>
                    Math.Exp((count == 0 ? 0 : count * Math.Log(rate / against)) + (count == trials ? 0 : (trials - count) * Math.Log((1 - rate) / (1 - against))));
                double Against(double edge, int way) =>
                    Ratio(0.5 + way * 0.1, edge) / 2 + (Ratio(0.5 + way * 0.2, edge) + Ratio(0.5 + way * 0.4, edge) + Ratio(way > 0 ? 1 : 0, edge)) / 6;
                int now = flags | ((Ratio(0.5, 0.6) + Ratio(0.55, 0.6)) / 2 >= 1 / 0.045 ? 1 : 0) | ((Ratio(0.5, 0.4) + Ratio(0.45, 0.4)) / 2 >= 1 / 0.045 ? 2 : 0);
                if (p < 1e-14)
                    (red, green) = (red + p, green + p);
                else if ((Against(0.55, 1) + Against(0.45, -1)) / 2 >= 1 / 0.045)
                    red += p;
                else if (now == 3)
                    green += p;
                else
                    mass[(count, now)] = mass.GetValueOrDefault((count, now)) + p;
            }
        }

        foreach (var ((count, _), p) in mass)
            (red, green) = count >= stakes.Limits[0].Low && count <= stakes.Limits[0].High ? (red, green + p) : (red + p, green);
        Assert.Equal(1, red + green, 1e-6);
        Assert.InRange(isRight ? red : green, 0.01, 0.05);
        var measured = Calibrated.Keeps(Claim.ManyRates(1, 0.5, 0.05), loose => loose.Judge((rng, outputs) => outputs[0] = rng.NextDouble() < truth), isRight);
        // Hoeffding: 1,500 repetitions stray by 0.085 with probability 4e-9 at most from the exact share.
        Assert.InRange(measured.Wrong, (isRight ? red : green) - 0.085, (isRight ? red : green) + 0.085);
    }

    [Fact]
    public void The_verdict_is_the_same_for_every_block_and_on_two_threads()
    {
        var stakes = ManyStakes.Of(ManyRatesPlan.For([.. Enumerable.Repeat(Edges.Around(Domain.Rate, 0.5, 0.05), 40)], 1e-9, 0.999));
        foreach (double rate in (double[])[0.5, 0.6])
        {
            bool[][] draws = [.. Enumerable.Range(0, (int)stakes.Trials).Select(trial =>
            {
                bool[] outputs = new bool[40];
                Coins(TrialRandom.At(5, trial), outputs, _ => rate);
                return outputs;
            })];
            var whole = new ManyRatesRace(stakes);
            whole.Add(draws);
            foreach (int block in (int[])[1, 7, 300])
            {
                var race = new ManyRatesRace(stakes);
                foreach (bool[][] some in draws.Chunk(block))
                    race.Add(some);
                Assert.Equal((whole.Outcome, whole.Report().Trials), (race.Outcome, race.Report().Trials));
                Assert.Equal(whole.Report().Counts, race.Report().Counts);
            }
        }

        Assert.Equal(Outcome.Upheld, Claim.ManyRates(40, 0.5, 0.05).InParallel(2).Judge((rng, outputs) => Coins(rng, outputs, _ => 0.5)).Outcome);
    }

    [Fact]
    public void The_fixed_plan_runs_alone_when_asked()
    {
        var claim = Claim.ManyRates(10, 0.5, 0.05);
        long needed = claim.Plan().FixedTrials;

        Assert.Equal((Outcome.Upheld, needed), claim.WithTrials(needed).Judge((rng, outputs) => Coins(rng, outputs, _ => 0.5)) is var verdict ? (verdict.Outcome, verdict.Trials) : default);
        Assert.Contains("output 4", claim.WithTrials(needed).Judge((rng, outputs) => Coins(rng, outputs, i => i == 4 ? 0.7 : 0.5)).ToString(), StringComparison.Ordinal);
        Assert.Equal(Outcome.Undecided, claim.WithTrialCap(20).Judge((rng, outputs) => Coins(rng, outputs, _ => 0.5)).Outcome);
    }

    [Fact]
    public void Bad_numbers_and_draws_are_refused()
    {
        Refuses(() => Claim.ManyRates(0, 0.5, 0.1), "ManyRates is about 1 to 1,000,000 outputs; it is 0.");
        Refuses(() => Claim.ManyRates(3, double.NaN, 0.1), "it is NaN");
        Refuses(() => Claim.ManyRates(3, 0.5, 0.1).Judge(_ => new bool[2]), "Trial 1 yielded 2 outputs; the claim is about 3.");
        int trial = 0;
        Assert.Equal(4, Assert.Throws<TrialFailedException>(() => Claim.ManyRates(3, 0.5, 0.1).Judge((rng, outputs) =>
        {
            if (++trial == 4)
                throw new InvalidOperationException("jammed");
        })).Trial);
    }

    static void Refuses(Action action, string reason) =>
        Assert.Contains(reason, Assert.Throws<ClaimRefusedException>(action).Message, StringComparison.Ordinal);
}
