namespace Bicycles.Xunit;

public class DockPickerTests
{
    readonly DockPicker picker = new(("north", 50), ("south", 30), ("east", 20));

    [Theory]
    [InlineData("north", 0.5)]
    [InlineData("south", 0.3)]
    [InlineData("east", 0.2)]
    public void Each_dock_is_picked_by_its_free_places(string dock, double share) =>
        Claim.Rate(share, tolerance: 0.005).MustHold(rng => picker.Pick(rng) == dock);

    [Fact]
    public void All_docks_at_once() =>
        Claim.Shares(tolerance: 0.01, ("north", 0.5), ("south", 0.3), ("east", 0.2)).MustHold(picker.Pick);

    [Fact]
    public void A_full_dock_is_never_picked()
    {
        var full = new DockPicker(("north", 5), ("south", 0), ("east", 3));

        Claim.RateAtMost(0, defect: 0.001).MustHold(rng => full.Pick(rng) == "south");
    }
}
