using Microsoft.CodeAnalysis;

namespace Assize.Cli.Tests;

public class FrameworkSignaturesTests
{
    [Fact]
    public void Every_file_of_signatures_compiles()
    {
        string[] names = [.. FrameworkSignatures.Names()];

        Assert.Equal(["FluentAssertions", "MSTest", "NUnit", "Shouldly", "Xunit"], names);
        Assert.All(names, name => Assert.Empty(
            FrameworkSignatures.Compilation(name).GetDiagnostics(TestContext.Current.CancellationToken)
                .Where(found => found.Severity == DiagnosticSeverity.Error)));
    }
}
