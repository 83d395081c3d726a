namespace Assize.Analyzers.Tests;

/// <summary>One count, 100 trials at rate 1/2 with 40 to 60 passing, in every way people write it.</summary>
public class SpellingTests
{
    const string Count =
        "var picker = new Picker(); int ripe = 0; for (int i = 0; i < 100; i++) if (picker.IsRipe()) ripe++;";

    [Theory]
    [InlineData("int ripe = 0; for (int i = 0; i < 100; i++) if (picker.IsRipe()) ripe++;")]
    [InlineData("int ripe = 0; for (int i = 0; i < 100; i++) { if (picker.IsRipe()) { ripe += 1; } }")]
    [InlineData("int ripe = 0; for (int i = 1; i <= 100; ++i) ripe += picker.IsRipe() ? 1 : 0;")]
    [InlineData("int ripe = 0; for (int i = 100; i > 0; i--) ripe += picker.IsRipe() ? 1 : 0;")]
    [InlineData("int ripe = 0; for (int i = 0; i != 100; i++) ripe += Convert.ToInt32(picker.IsRipe());")]
    [InlineData("int ripe = 0; for (int i = 0; i < 200; i += 2) ripe = ripe + (picker.IsRipe() ? 1 : 0);")]
    [InlineData("int ripe = 0, green = 0; for (int i = 0; i < 100; i++) if (!picker.IsRipe()) green++; else ripe++;")]
    [InlineData("int ripe = 0; for (int i = 0; i < 100; i++) { if (!picker.IsRipe()) continue; ripe++; }")]
    [InlineData("int ripe = 0; for (int i = 0; i < 10; i++) for (int j = 0; j < 10; j++) if (picker.IsRipe()) ripe++;")]
    [InlineData("int ripe = 0; int i = 0; while (i < 100) { if (picker.IsRipe()) ripe++; i++; }")]
    [InlineData("int ripe = 0; foreach (var _ in Enumerable.Range(0, 100)) if (picker.IsRipe()) ripe++;")]
    [InlineData("int ripe = 0; for (int i = 0; i < Trees; i++) { bool is_ = picker.IsRipe(); if (is_) ripe++; }")]
    [InlineData("int ripe = 0; int n = 50; n = n * 2; for (int i = 0; i < n; i++) if (picker.IsRipe() == true) ripe++;")]
    [InlineData("int ripe; ripe = 0; for (int i = 0; i < 100; i++) if (picker.Colour() == Colour.Red) ripe++;")]
    [InlineData("int ripe = 0; for (int i = 0; i < 100; i++) if (picker.Name(own) == \"russet\") ripe++;")]
    [InlineData("int ripe = 0; for (int i = 0; i < 100; i++) if (picker.Name(own).StartsWith('r')) ripe++;")]
    [InlineData("int ripe = 0; for (int i = 0; i < 100; i++) { var fresh = new Picker(); if (fresh.IsRipe()) ripe++; }")]
    [InlineData("int ripe = 0; for (int i = 0; i < 100; i++) if (Random.Shared.Next(2) == 0) ripe++;")]
    [InlineData("int ripe = 0; for (int i = 0; i < 100; i++) if (own.NextDouble() < 0.5) ripe++;")]
    [InlineData("int ripe = 0; for (int i = 0; i < 100; i++) if (own.Next(1, 7) % 2 == 0) ripe++;")]
    [InlineData("int ripe = 0; for (int i = 0; i < 100; i++) if (own.NextDouble() * 10 >= 5) ripe++;")]
    [InlineData("double ripe = 0; for (int i = 0; i < 100; i++) if (picker.IsRipe()) ripe++;")]
    [InlineData("long ripe = 0; for (long i = 0; i < 100L; i++) ripe += picker.IsRipe() ? 1 : 0;")]
    [InlineData("int ripe = 0; for (int i = 0; i < 100; i++) { Assert.InRange(picker.Weight(), 90, 110); if (picker.IsRipe()) ripe++; }")]
    public void Reads_every_way_to_count(string counting) =>
        Holds(Verify.Reading($"var picker = new Picker();\n{counting}\nAssert.InRange(ripe / 100.0, 0.395, 0.605);"),
            40, 60, 0.5);

    [Theory]
    [InlineData("Assert.InRange(ripe, 40, 60);")]
    [InlineData("double share = (double)ripe / 100; Assert.InRange(share, 0.395, 0.605);")]
    [InlineData("Assert.True(ripe >= 40 && ripe <= 60);")]
    [InlineData("Assert.True(ripe > 39 && 61 > ripe, \"too few\");")]
    [InlineData("Assert.False(ripe < 40 || ripe > 60);")]
    [InlineData("Assert.True(ripe is >= 40 and <= 60);")]
    [InlineData("Assert.True(ripe is not (< 40 or > 60));")]
    [InlineData("Assert.True(Math.Abs(ripe / 100.0 - 0.5) < 0.105);")]
    [InlineData("Assert.True(Math.Abs(0.5 - ripe / 100.0) <= 0.105);")]
    [InlineData("Assert.True(ripe > 100 * 0.5 - 100 * 0.105); Assert.True(ripe < 100 * 0.5 + 100 * 0.105);")]
    [InlineData("Assert.Equal(0.5, ripe / 100.0, 0.105);")]
    [InlineData("Assert.Equal(50.0, ripe, 10.5);")]
    [InlineData("Assert.InRange(ripe * 1000 / 100, 400, 600);")]
    [InlineData("Assert.InRange(ripe - (100 - ripe), -20, 20);")]
    [InlineData("if (ripe < 40 || ripe > 60) Assert.Fail(\"off\");")]
    [InlineData("if (Math.Abs(ripe - 50) > 10) { throw new InvalidOperationException(); }")]
    [InlineData("Assert.That(ripe, Is.InRange(40, 60));")]
    [InlineData("Assert.That(ripe, Is.GreaterThan(39).And.LessThan(61));")]
    [InlineData("Assert.That(ripe, Is.GreaterThanOrEqualTo(40).And.AtMost(60), \"off\");")]
    [InlineData("Assert.That(ripe, Is.GreaterThan(39) & Is.LessThan(61));")]
    [InlineData("Assert.That(ripe, Is.GreaterThan(39)); Assert.That(ripe, Is.LessThan(61));")]
    [InlineData("Assert.That(ripe / 100.0, Is.EqualTo(0.5).Within(0.105));")]
    [InlineData("Assert.That(ripe, Is.EqualTo(50).Within(10));")]
    [InlineData("Assert.That(ripe, Is.EqualTo(50).Within(21).Percent);")]
    [InlineData("Assert.That(ripe >= 40 && ripe <= 60);")]
    [InlineData("Assert.That(ripe >= 40 && ripe <= 60, Is.True);")]
    [InlineData("ClassicAssert.GreaterOrEqual(ripe, 40); ClassicAssert.LessOrEqual(ripe, 60);")]
    [InlineData("ClassicAssert.AreEqual(0.5, ripe / 100.0, 0.105);")]
    [InlineData("ClassicAssert.IsTrue(ripe > 39 && ripe < 61);")]
    public void Reads_every_way_to_assert(string asserting) =>
        Holds(Verify.Reading($"{Count}\n{asserting}"), 40, 60, 0.5);

    [Fact]
    public void Digits_of_precision_keep_the_expected_value_as_the_rate()
    {
        var reading = Verify.Reading(Count + "Assert.Equal(0.52, ripe / 100.0, 1);");

        // 0.45 rounds to even, 0.4, and 0.55 to 0.6.
        Holds(reading, 46, 54, 0.52);
    }

    [Fact]
    public void Halves_round_to_even_as_the_framework_rounds()
    {
        var reading = Verify.Reading(
            "var picker = new Picker(); int ripe = 0; for (int i = 0; i < 1000; i++) if (picker.IsRipe()) ripe++; Assert.Equal(0.5, ripe / 1000.0, 2);");
        var passing = Enumerable.Range(0, 1001).Where(successes => Math.Round(successes / 1000.0, 2) == 0.5).ToList();

        Holds(reading, passing[0], passing[^1], 0.5);
    }

    // 8/100.0 − 0.1 is a hair below −0.02 in double arithmetic, so 8 of 100 is red although algebra says it passes.
    [Theory]
    [InlineData("Assert.True(Math.Abs(ripe / 100.0 - .1) <= .02);")]
    [InlineData("Assert.InRange(ripe / 100.0, .1 - .02, .1 + .02);")]
    [InlineData("Assert.Equal(.3, ripe / 100.0, .07);")]
    [InlineData("Assert.True(ripe / 100f > .1f && ripe / 100f < .3f);")]
    [InlineData("Assert.True(ripe / 100m > .1m && ripe / 100m < .3m);")]
    public void Edges_are_those_of_the_arithmetic_in_the_source(string asserting)
    {
        Func<int, bool> passes = asserting switch
        {
            _ when asserting.Contains("Abs", StringComparison.Ordinal) => successes =>
                Math.Abs(successes / 100.0 - .1) <= .02,
            _ when asserting.Contains("InRange", StringComparison.Ordinal) => successes =>
                successes / 100.0 >= .1 - .02 && successes / 100.0 <= .1 + .02,
            _ when asserting.Contains("Equal", StringComparison.Ordinal) => successes =>
                Math.Abs(.3 - successes / 100.0) <= .07,
            _ when asserting.Contains("100f", StringComparison.Ordinal) => successes => successes / 100f > .1f
                && successes / 100f < .3f,
            _ => successes => successes / 100m > .1m && successes / 100m < .3m,
        };
        var passing = Enumerable.Range(0, 101).Where(passes).ToList();

        var reading = Verify.Reading($"{Count}\n{asserting}");

        Assert.Equal((passing[0], passing[^1]), ((int)reading.Accepted.Low!, (int)reading.Accepted.High!));
    }

    [Fact]
    public void A_law_in_sight_goes_before_the_centre_of_the_band()
    {
        var reading = Verify.Reading(
            "int hits = 0; for (int i = 0; i < 300; i++) if (own.Next(6) == 3) hits++; Assert.InRange(hits, 30, 80);");

        Assert.Equal(Basis.Law, reading.Basis);
        Assert.Equal(1 / 6.0, reading.Target);
        AssertEncloses(reading, ExactBinomial.Outside(300, 30, 80, 1, 6));
    }

    [Fact]
    public void A_one_sided_bound_is_read_where_the_law_is_in_sight()
    {
        var reading = Verify.Reading(
            "int hits = 0; for (int i = 0; i < 300; i++) if (own.NextDouble() < 0.25) hits++; Assert.True(hits > 60);");

        AssertEncloses(reading, ExactBinomial.Outside(300, 61, 300, 1, 4));
    }

    [Fact]
    public void The_worst_data_row_is_kept()
    {
        var reading = Verify.Reading(
            "var picker = new Picker(); int ripe = 0; for (int i = 0; i < n; i++) if (picker.IsRipe()) ripe++; Assert.InRange(ripe / (double)n, .5 - t, .5 + t);",
            "[Theory] [InlineData(1000, 0.1)] [InlineData(50, 0.1)] [InlineData(400, 0.2)]",
            "int n, double t");

        Assert.Equal("(50, 0.1)", reading.Row);
        AssertEncloses(reading, ExactBinomial.Outside(50, 20, 30, 1, 2));
    }

    [Fact]
    public void Repeats_add_up_and_tries_multiply()
    {
        double once = ExactBinomial.Outside(100, 40, 60, 1, 2);
        string test = Count + "Assert.That(ripe, Is.InRange(40, 60));";
        string looped = "for (int r = 0; r < 7; r++) { " + Count + "Assert.InRange(ripe, 40, 60); }";

        AssertEncloses(Verify.Reading(test, "[Test, Retry(3)]"), once * once * once);
        AssertEncloses(Verify.Reading(test, "[Test, Repeat(5)]"), 1 - Math.Pow(1 - once, 5));
        AssertEncloses(Verify.Reading(looped), 1 - Math.Pow(1 - once, 7));
    }

    static void Holds(AssertionReading reading, int low, int high, double rate)
    {
        Assert.Equal((low, high), ((int)reading.Accepted.Low!, (int)reading.Accepted.High!));
        Assert.Equal(rate, reading.Target!.Value, 1e-12);
        AssertEncloses(
            reading, ExactBinomial.Outside((int)reading.Trials, low, high, (int)Math.Round(rate * 100), 100));
    }

    static void AssertEncloses(AssertionReading reading, double truth)
    {
        Assert.InRange(truth, reading.FalseFailure.Lower * (1 - 1e-14), reading.FalseFailure.Upper * (1 + 1e-14));
        Assert.True(reading.FalseFailure.Upper <= reading.FalseFailure.Lower * 1.0001);
    }
}
