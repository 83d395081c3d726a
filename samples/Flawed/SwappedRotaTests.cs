namespace Bicycles.Flawed;

/// <summary>Red, and rightly: this bicycle comes first in 0.179 of the orders, not in 0.143.</summary>
public class SwappedRotaTests
{
    [Fact]
    public void Every_bicycle_comes_first_equally_often() =>
        Claim.Rate(1 / 7.0, tolerance: 0, defect: 0.01).MustHold(rng => SwappedRota.Draw(7, rng)[0] == 1);
}
