using Assize.Testing;

namespace Assize.Tests.Conventions;

public class PublicApiTests
{
    [Fact]
    public void The_public_surface_is_written_down() =>
        Repository.MustEqual("src/Assize/PublicApi.txt", PublicApi.Of(typeof(Claim).Assembly));
}
