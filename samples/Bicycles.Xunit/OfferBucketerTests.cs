namespace Bicycles.Xunit;

public class OfferBucketerTests
{
    [Fact]
    public void Half_of_the_riders_see_the_new_offer()
    {
        var spring = new OfferBucketer("spring");

        Claim.Rate(0.5, tolerance: 0.005).InParallel().MustHold(rng => spring.SeesNewOffer((ulong)rng.NextInt64()));
    }

    [Fact]
    public void Two_campaigns_split_the_riders_independently()
    {
        var spring = new OfferBucketer("spring");
        var autumn = new OfferBucketer("autumn");

        Claim.Rate(0.5, tolerance: 0.005).MustHold(rng =>
        {
            ulong rider = (ulong)rng.NextInt64();
            return spring.SeesNewOffer(rider) == autumn.SeesNewOffer(rider);
        });
    }
}
