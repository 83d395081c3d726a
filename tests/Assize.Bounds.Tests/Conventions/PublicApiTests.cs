using Assize.Testing;

namespace Assize.Bounds.Tests.Conventions;

public class PublicApiTests
{
    [Fact]
    public void The_public_surface_is_the_one_written_down()
    {
        string surface = PublicApi.Of(typeof(RatePlan).Assembly);

        Assert.True(surface.Split('\n').Length > 80, surface);
        Assert.Contains(
            "Hoeffding.Radius(long trials, double range, double risk) : static double\n",
            surface,
            StringComparison.Ordinal);
        Repository.MustEqual("src/Assize.Bounds/PublicApi.txt", surface);
    }
}
