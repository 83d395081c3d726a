namespace Bicycles.Flawed;

public class SwappedRotaTests
{
    /// <summary>Red, and rightly: this bicycle comes first in 0.179 of the orders, not in 0.143.</summary>
    [Fact]
    public void The_next_bicycle_comes_first_as_often_as_any_other() =>
        Claim.Rate(1 / 7.0, tolerance: 0, defect: 0.01).MustHold(rng => SwappedRota.Draw(7, rng)[0] == 1);
}
