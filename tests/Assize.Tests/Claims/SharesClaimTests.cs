using Assize.Bounds;

namespace Assize.Tests.Claims;

public class SharesClaimTests
{
    enum Dock
    {
        North,
        South,
        East,
    }

    static readonly SharesClaim<string> Docks = Claim.Shares(tolerance: 0.02, ("north", 0.5), ("south", 0.3), ("east", 0.2));

    static string Pick(Random rng, double north, double south) =>
        rng.NextDouble() is var place && place < north ? "north" : place < north + south ? "south" : "east";

    [Fact]
    public void Right_shares_are_upheld_and_wrong_ones_refuted()
    {
        Assert.Equal(Outcome.Upheld, Docks.Judge(rng => Pick(rng, 0.5, 0.3)).Outcome);
        Assert.Equal(Outcome.Refuted, Docks.Judge(rng => Pick(rng, 0.55, 0.25)).Outcome);
        Assert.Equal(Outcome.Upheld, Claim.EqualShares<Dock>(tolerance: 0.02).Judge(rng => (Dock)rng.Next(3)).Outcome);
        Assert.Equal(Outcome.Refuted, Claim.EqualShares<Dock>(tolerance: 0.02).Judge(rng => (Dock)(rng.Next(4) % 3)).Outcome);
        Assert.Equal(Outcome.Upheld, Claim.EqualShares(0.02, 1, 2, 3, 4, 5, 6).Judge(rng => rng.Next(1, 7)).Outcome);
        Assert.Equal(Outcome.Upheld, Claim.EqualShares(0.02, (0, 'a'), (0, 'b'), (1, 'a'), (1, 'b'))
            .Judge(rng => (rng.Next(2), rng.Next(2) == 0 ? 'a' : 'b')).Outcome);
    }

    // Category laws at the target, at the tolerance, in the grey zone, at the defect and at twice the defect.
    [Theory]
    [InlineData(0, true)]
    [InlineData(0.05, true)]
    [InlineData(0.1, false)]
    [InlineData(0.2, false)]
    public void Both_promises_are_kept(double shift, bool isRight)
    {
        var two = Claim.Shares(0.05, (true, 0.5), (false, 0.5));
        Calibrated.Keeps(two, loose => loose.Judge(rng => rng.NextDouble() < 0.5 + shift), isRight);
        var docks = Claim.Shares(0.05, ("north", 0.5), ("south", 0.3), ("east", 0.2));
        Calibrated.Keeps(docks, loose => loose.Judge(rng => Pick(rng, 0.5 - shift, 0.3 + shift)), isRight);
        var die = Claim.EqualShares(0.05, 1, 2, 3, 4, 5, 6);
        Calibrated.Keeps(die, loose => loose.Judge(rng => rng.NextDouble() < 6 * shift / 5 ? 6 : rng.Next(1, 7)), isRight);
    }

    // Divided by the shares alone, the bet on all categories together refutes this die at once.
    [Fact]
    public void A_die_whose_every_face_is_at_the_tolerance_is_not_refuted()
    {
        var claim = Claim.EqualShares(0.005, 1, 2, 3, 4, 5, 6).WithDefect(0.05);
        int[] faces = [1, 3, 5];

        for (int repetition = 0; repetition < 20; repetition++)
        {
            var verdict = claim.Judge(rng => rng.NextDouble() is var place && place < 0.5 + 3 * 0.005 ? faces[rng.Next(3)] : 2 * rng.Next(1, 4));
            Assert.NotEqual(Outcome.Refuted, verdict.Outcome);
        }
    }

    [Fact]
    public void A_category_that_comes_once_in_a_million_does_no_harm()
    {
        var rare = Claim.Shares(0.01, ("north", 0.6), ("south", 0.399999), ("lost", 1e-6)).ToleranceOf("lost", 1e-4, defect: 0.001);

        Assert.Equal(Outcome.Upheld, rare.Judge(rng => rng.NextDouble() is var place && place < 1e-6 ? "lost" : place < 0.6 ? "north" : "south").Outcome);
        Assert.Equal(Outcome.Refuted, rare.Judge(rng => rng.NextDouble() is var place && place < 0.002 ? "lost" : place < 0.6 ? "north" : "south").Outcome);
    }

    [Fact]
    public void A_category_of_share_0_and_no_tolerance_is_refuted_by_its_first_draw()
    {
        int trial = 0;
        var claim = Claim.Shares(0.02, ("north", 0.5), ("south", 0.5), ("lost", 0)).ToleranceOf("lost", 0, defect: 0.01);
        var verdict = claim.Judge(rng => ++trial == 31 ? "lost" : rng.Next(2) == 0 ? "north" : "south");

        Assert.Equal((Outcome.Refuted, 31L), (verdict.Outcome, verdict.Trials));
        Assert.Equal(double.PositiveInfinity, verdict.LogEvidenceAgainstClaim);
    }

    [Fact]
    public void A_draw_of_no_category_refutes_at_once_and_is_named()
    {
        int trial = 0;
        var verdict = Docks.Judge(rng => ++trial == 17 ? "west" : Pick(rng, 0.5, 0.3));

        Assert.Equal((Outcome.Refuted, 17L), (verdict.Outcome, verdict.Trials));
        Assert.Contains("trial 17 drew \"west\", which is none of the 3 categories", verdict.ToString(), StringComparison.Ordinal);
        trial = 0;
        Assert.Contains("trial 2 drew null", Docks.Judge(rng => ++trial == 2 ? null! : "north").ToString(), StringComparison.Ordinal);
        Assert.Contains("drew NaN", Claim.EqualShares(0.1, 1.0, 2.0).Judge(_ => double.NaN).ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public void Categories_are_compared_as_asked()
    {
        var claim = Claim.Shares(0.02, ("north", 0.5), ("south", 0.5));
        string Shouting(Random rng) => rng.Next(2) == 0 ? "NORTH" : "south";

        Assert.Equal(Outcome.Refuted, claim.Judge(Shouting).Outcome);
        Assert.Equal(Outcome.Upheld, claim.ComparedBy(StringComparer.OrdinalIgnoreCase).Judge(Shouting).Outcome);
        var shares = new Dictionary<string, double>(StringComparer.OrdinalIgnoreCase) { ["north"] = 0.5, ["south"] = 0.5 };
        Assert.Equal(Outcome.Upheld, Claim.Shares(0.02, shares).Judge(Shouting).Outcome);
    }

    [Fact]
    public void The_text_names_the_categories_that_are_off()
    {
        string text = Docks.Judge(rng => Pick(rng, 0.56, 0.24)).ToString();

        Assert.StartsWith("Claim refuted: the shares are \"north\" 0.5, \"south\" 0.3, \"east\" 0.2, give or take 0.02 (caught from 0.04 away).", text, StringComparison.Ordinal);
        Assert.Matches(@"observed     ""(north|south)"" 0\.\d+ \([\d,]+ of [\d,]+\) where 0\.[53] is claimed, the farthest off of 3\n", text);
        Assert.Matches(@"off          ""south"": 0\.2\d* \([\d,]+ of [\d,]+\), right from 0\.28 to 0\.32; evidence against it alone ", text);
        Assert.DoesNotContain("true share", text, StringComparison.Ordinal);
    }

    [Fact]
    public void The_ledger_gets_every_count()
    {
        var report = Docks.Judge(rng => Pick(rng, 0.5, 0.3)).Report;

        Assert.Equal(["\"north\"", "\"south\"", "\"east\""], report.Counts!.Keys);
        Assert.Equal(report.Trials, report.Counts.Values.Sum());
    }

    [Fact]
    public void The_fixed_plan_runs_alone_when_asked()
    {
        long needed = Docks.Plan().FixedTrials;

        Assert.Equal((Outcome.Upheld, needed), Docks.WithTrials(needed).Judge(rng => Pick(rng, 0.5, 0.3)) is var verdict ? (verdict.Outcome, verdict.Trials) : default);
        Assert.Contains("not within", Docks.WithTrials(needed).Judge(rng => Pick(rng, 0.55, 0.3)).ToString(), StringComparison.Ordinal);
        Assert.Throws<ClaimRefusedException>(() => Docks.WithTrials(needed - 1).Judge(rng => "north"));
        Assert.Equal(Outcome.Undecided, Docks.WithTrialCap(100).Judge(rng => Pick(rng, 0.5, 0.3)).Outcome);
    }

    [Fact]
    public void The_verdict_is_the_same_on_one_thread_and_on_two_and_for_samples()
    {
        foreach (double north in (double[])[0.5, 0.55, 0.53])
        {
            var drawn = new List<string>();
            string Draw(Random rng) => Pick(rng, north, 0.3);
            var claim = Docks.Named($"docks at {north}");
            var serial = claim.Judge(rng =>
            {
                drawn.Add(Draw(rng));
                return drawn[^1];
            });
            var sample = Docks.JudgeFor(drawn.ToArray().AsSpan());

            Assert.Equal((serial.Outcome, serial.Trials), (sample.Outcome, sample.Trials));
            Assert.Equal(serial.Report.Counts, sample.Report.Counts);
        }
    }

    [Theory]
    [InlineData(0.5, 0.3, "Shares must sum to 1; these sum to 0.8.")]
    [InlineData(0.5, 0.7, "these sum to 1.2")]
    [InlineData(1.5, -0.5, "The share of \"a\" must lie between 0 and 1; it is 1.5.")]
    [InlineData(double.NaN, 0.5, "it is NaN")]
    public void Shares_that_are_no_shares_are_refused(double a, double b, string reason) =>
        Refuses(() => Claim.Shares(0.01, ("a", a), ("b", b)), reason);

    [Fact]
    public void Bad_numbers_and_categories_are_refused()
    {
        Refuses(() => Claim.Shares(-0.01, ("a", 0.5), ("b", 0.5)), "The share of \"a\": The tolerance must be a distance of 0 or more; it is -0.01.");
        Refuses(() => Claim.Shares(0.01, ("a", 0.5), ("a", 0.5)), "The category \"a\" is there twice");
        Refuses(() => Claim.Shares(0.01, ("a", 0.5), ("A", 0.5)).ComparedBy(StringComparer.OrdinalIgnoreCase), "is there twice");
        Refuses(() => Claim.Shares<string>(0.01), "Shares need categories");
        Refuses(() => Claim.EqualShares<string>(0.01), "Shares need categories");
        Refuses(() => Docks.ToleranceOf("west", 0.1), "ToleranceOf names \"west\", which is none of the categories: \"north\", \"south\", \"east\".");
        Refuses(() => Docks.WithDefect(0.01), "must be a greater distance than the tolerance");
        Refuses(() => Claim.EqualShares(0, 1, 2).Plan(), "A tolerance of 0 needs an explicit defect");
        Assert.Equal(0.5, Claim.EqualShares(0, 1, 2).WithDefect(0.1).WithRisk(0.5).Risk);
    }

    [Fact]
    public void A_trial_that_throws_is_named()
    {
        int trial = 0;
        var failed = Assert.Throws<TrialFailedException>(() => Docks.Judge(rng => ++trial == 5 ? throw new InvalidOperationException("jammed") : "north"));

        Assert.Equal(5, failed.Trial);
    }

    [Fact]
    public void Thousands_of_categories_are_judged_together()
    {
        var claim = Claim.EqualShares(1.5e-4, Enumerable.Range(0, 4096).ToArray()).WithDefect(6e-4);

        Assert.Equal(Outcome.Upheld, claim.Judge(rng => rng.Next(4096)).Outcome);
        Assert.Equal(Outcome.Refuted, claim.Judge(rng => rng.Next(1000) == 0 ? 7 : rng.Next(4096)).Outcome);
    }

    static void Refuses(Action action, string reason) =>
        Assert.Contains(reason, Assert.Throws<ClaimRefusedException>(action).Message, StringComparison.Ordinal);
}
