namespace Bicycles.MSTest;

[TestClass]
public class DockPickerTests
{
    readonly DockPicker picker = new(("north", 5), ("south", 3), ("east", 2));

    [TestMethod]
    [DataRow("north", 0.5)]
    [DataRow("south", 0.3)]
    [DataRow("east", 0.2)]
    public void A_dock_is_picked_by_its_free_places(string dock, double share) =>
        Claim.Rate(share, tolerance: 0.005).MustHold(rng => picker.Pick(rng) == dock);

    [TestMethod]
    public void This_suite_asks_for_more_than_the_usual()
    {
        var claim = Claim.Rate(0.5, tolerance: 0.005);

        Assert.AreEqual((1e-10, 0.9999), (claim.Risk, claim.Confidence));
        Assert.AreEqual(1e-6, claim.WithRisk(1e-6).Risk);
    }
}
