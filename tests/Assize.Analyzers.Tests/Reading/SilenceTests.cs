namespace Assize.Analyzers.Tests;

/// <summary>
/// Where anything is unsure, nothing is said: each line differs from one that is read in the one thing it names.
/// </summary>
public class SilenceTests
{
    const string Head = "var picker = new Picker(); int ripe = 0;";
    const string Tail = "Assert.InRange(ripe / 100.0, 0.4, 0.6);";

    [Theory]
    // Bound not constant.
    [InlineData("for (int i = 0; i < own.Next(50, 100); i++) if (picker.IsRipe()) ripe++;")]
    [InlineData("for (int i = 0; i < 100; i++) { if (picker.IsRipe()) ripe++; if (ripe > 50) break; }")]  // stops early
    [InlineData("for (int i = 0; i < 100; i++) { if (picker.IsRipe()) ripe++; if (i == 10) i += 5; }")]   // index moved
    // Counter reset.
    [InlineData("for (int i = 0; i < 100; i++) { if (picker.IsRipe()) ripe++; if (i == 10) ripe = 0; }")]
    // Depends on the pass.
    [InlineData("for (int i = 0; i < 100; i++) if (picker.IsRipe() && i > 3) ripe++;")]
    // Another draw in every pass.
    [InlineData("for (int i = 0; i < 100; i++) if (picker.IsRipe(i)) ripe++;")]
    // One draw for all.
    [InlineData("bool once = picker.IsRipe(); for (int i = 0; i < 100; i++) if (once) ripe++;")]
    [InlineData("for (int j = 0; j < 10; j++) { bool row = picker.IsRipe(); for (int i = 0; i < 10; i++) if (row) ripe++; }")]
    [InlineData("for (int i = 0; i < 100; i++) if (i % 2 == 0) ripe++;")]                                 // no draw
    [InlineData("int last = 0; for (int i = 0; i < 100; i++) { int w = picker.Weight(); if (w > last) ripe++; last = w; }")]
    [InlineData("for (int i = 0; i < 100; i++) { if (picker.IsRipe()) ripe++; if (picker.IsRipe()) ripe++; }")]
    [InlineData("for (int i = 0; i < 100; i++) if (picker.IsRipe()) ripe += 2;")]
    [InlineData("for (int i = 0; i < 100; i++) ripe += picker.Weight();")]
    [InlineData("Action count = () => ripe++; for (int i = 0; i < 100; i++) if (picker.IsRipe()) count();")]
    [InlineData("for (int i = 0; i < 100; i++) if (picker.IsRipe()) Add(ref ripe); static void Add(ref int x) => x++;")]
    [InlineData("var queue = new Queue<bool>(new bool[100]); for (int i = 0; i < 100; i++) if (queue.Dequeue()) ripe++;")]
    [InlineData("for (int i = 0; i < 100; i++) try { if (picker.IsRipe()) ripe++; } catch (Exception) { }")]
    [InlineData("for (int i = 0; i < 100; i++) { var seeded = new Random(i); if (seeded.Next(2) == 0) ripe++; }")]
    [InlineData("for (int i = 0; i < 100; i++) { switch (picker.Weight()) { case 91: ripe++; break; } }")]
    public Task An_unsure_count_is_silent(string counting) => Verify.Silent($"{Head}\n{counting}\n{Tail}");

    [Theory]
    [InlineData("Assert.True(ripe > 40);")]                          // one side, and no law in sight
    [InlineData("Assert.Equal(50, ripe);")]                          // an exact count
    [InlineData("Assert.InRange(ripe, 0, 100);")]                    // cannot fail
    [InlineData("Assert.InRange(ripe, 0, 55);")]                     // ends at the rim: one side in fact
    [InlineData("Assert.InRange(ripe / 100.0, 0.49999, 0.50001);")]  // a numerical tolerance
    [InlineData("Assert.True(ripe < 40 || ripe > 45);")]             // no band
    [InlineData("Assert.True(ripe % 2 == 0 && ripe > 10);")]
    [InlineData("Assert.InRange(ripe, 40 - picker.Weight(), 60);")]  // a bound that is drawn
    [InlineData("if (picker.IsRipe()) Assert.InRange(ripe, 40, 60);")]
    [InlineData("if (picker.IsRipe()) return; Assert.InRange(ripe, 40, 60);")]
    [InlineData("try { Assert.InRange(ripe, 40, 60); } catch (Exception) { }")]
    [InlineData("Action check = () => Assert.InRange(ripe, 40, 60); check();")]
    [InlineData("Console.WriteLine(ripe / 100.0);")]
    [InlineData("Assert.That(ripe, Is.Not.InRange(40, 60));")]
    [InlineData("Assert.That(ripe, Is.EqualTo(50).Within(9.5));")]   // whole numbers with a fractional tolerance
    public Task An_unsure_assertion_is_silent(string asserting) =>
        Verify.Silent($"{Head}\nfor (int i = 0; i < 100; i++) if (picker.IsRipe()) ripe++;\n{asserting}");

    [Theory]
    [InlineData("[RetryFact]")]
    [InlineData("[Theory, MemberData(nameof(own))]")]
    public async Task An_attribute_that_is_not_followed_is_silent(string attribute)
    {
        string source = Verify.InTest(
            $"{Head}\nfor (int i = 0; i < n; i++) if (picker.IsRipe()) ripe++;\nAssert.InRange(ripe, 40, 60);",
            attribute, "int n = 100")
            + "\nclass RetryFactAttribute : FactAttribute;";
        Assert.Empty(await Workbench.Analyze(Workbench.Compile(source)));
    }

    [Fact]
    public Task A_stub_of_the_tests_own_is_silent() => Verify.Silent("""
        using System; using Xunit;
        public class Tests
        {
            sealed class Fixed : Random { public override double NextDouble() => 0.25; }
            sealed class Alternating { int at; public bool Next() => at++ % 2 == 0; }
            [Fact] public void A() { var r = new Fixed(); int n = 0; for (int i = 0; i < 100; i++) if (r.NextDouble() < .5) n++; Assert.InRange(n, 40, 60); }
            [Fact] public void B() { Random r = new Fixed(); int n = 0; for (int i = 0; i < 100; i++) if (r.NextDouble() < .5) n++; Assert.InRange(n, 40, 60); }
            [Fact] public void C() { var r = new Alternating(); int n = 0; for (int i = 0; i < 100; i++) if (r.Next()) n++; Assert.InRange(n, 40, 60); }
        }
        """);
}
