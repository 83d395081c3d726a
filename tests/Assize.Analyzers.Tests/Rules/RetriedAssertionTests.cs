namespace Assize.Analyzers.Tests;

public class RetriedAssertionTests
{
    // Three tries catch with the third power: 0.5³ = 0.125.
    [Fact]
    public async Task What_retries_do_to_both_errors_is_told() => Assert.StartsWith(
        "Green if any of 3 tries is: a defect that one try catches with probability 0.5 is caught with probability 0.125 by all",
        await Verify.Message("ASZ2006", """
            using NUnit.Framework;
            public class Tests
            {
                [Test, Retry(3)]
                public void It()
                {
                    var picker = new Orchard.Picker();
                    int ripe = 0;
                    for (int i = 0; i < 100; i++) if (picker.IsRipe()) ripe++;
                    Assert.That(ripe / 100.0, Is.InRange(0.4, 0.6));
                }
            }
            """),
        StringComparison.Ordinal);
}
