namespace Bicycles.Xunit;

public class RepairRotaTests
{
    [Fact]
    public void Every_bicycle_is_first_equally_often() =>
        Claim.Rate(1 / 7.0, tolerance: 0, defect: 0.01).MustHold(rng => RepairRota.Draw(7, rng)[0] == 3);

    [Fact]
    public void Neighbours_keep_their_order_half_of_the_time() =>
        Claim.Rate(0.5, tolerance: 0, defect: 0.01).MustHold(rng =>
        {
            var rota = RepairRota.Draw(7, rng);
            return Array.IndexOf(rota, 2) < Array.IndexOf(rota, 3);
        });

    [Fact]
    public void One_bicycle_in_seven_stays_where_it_was() =>
        Claim.Rate(1 / 7.0, tolerance: 0.005).MustHold(rng => RepairRota.Draw(7, rng)[6] == 6);

    [Fact]
    public void The_first_place_and_the_last_are_equally_likely() =>
        Claim.SameRate(tolerance: 0.02).MustHold(rng => RepairRota.Draw(5, rng)[0] == 2, rng => RepairRota.Draw(5, rng)[^1] == 2);

    [Fact]
    public void Whoever_is_among_the_first_three_is_first_one_time_in_three() =>
        Claim.RateWhenItQualifies(1 / 3.0, tolerance: 0.01).MustHold(rng =>
            Array.IndexOf(RepairRota.Draw(7, rng), 2) is var place and < 3 ? place == 0 : null);

    [Fact]
    public void Every_order_of_three_comes_equally_often() =>
        Claim.EqualOrders(3, tolerance: 0.005).MustHold(rng => RepairRota.Draw(3, rng));

    [Fact]
    public void The_first_place_and_the_last_are_filled_alike() =>
        Claim.SameDistribution(tolerance: 0.03).MustHold(rng => RepairRota.Draw(5, rng)[0], rng => RepairRota.Draw(5, rng)[^1]);

    [Fact]
    public void Every_one_of_64_bicycles_is_first_equally_often() =>
        Claim.ManyRates(64, target: 1 / 64.0, tolerance: 0.005).MustHold((rng, places) => places[RepairRota.Draw(64, rng)[0]] = true);
}
