using System.Reflection;
using System.Security;
using System.Text.RegularExpressions;

namespace Assize.Packages.Tests;

public sealed class FreshProjectTests(ITestOutputHelper output) : IDisposable
{
    // The packages folder is new in every run, so the version need not be.
    const string Version = "0.1.0-fresh";

    static readonly string Root = typeof(FreshProjectTests).Assembly.GetCustomAttributes<AssemblyMetadataAttribute>()
        .Single(metadata => metadata.Key == "RepositoryRoot").Value!;

    readonly string _own = Path.Combine(AppContext.BaseDirectory, "packed");
    readonly DirectoryInfo _fresh = Directory.CreateTempSubdirectory("assize-fresh-");

    public void Dispose() => _fresh.Delete(recursive: true);

    [Fact]
    public async Task One_reference_gives_a_fresh_project_the_kit_and_its_analyzers()
    {
        await Pack("analyzers/Assize.Analyzers.Fixes");
        await Pack("src/Assize");
        WriteProject();

        string built = await Run(_fresh.FullName, "build", $"-p:AssizeVersion={Version}", "-tl:off");
        string ran = await Run(_fresh.FullName, "run", "--no-build", $"-p:AssizeVersion={Version}");

        // After "Build succeeded" the SDK says every warning a second time.
        string once = built[..built.IndexOf("Build succeeded", StringComparison.Ordinal)];
        Assert.Equal(
            ["ASZ1001", "ASZ2001"], Regex.Matches(once, @"warning (ASZ\d{4})").Select(found => found.Groups[1].Value)
            .Order(StringComparer.Ordinal));
        Assert.DoesNotContain("AD0001", built, StringComparison.Ordinal);
        Assert.Contains("Total: 3, Errors: 0, Failed: 0", ran, StringComparison.Ordinal);
    }

    // Into folders of its own, so that a build of the repository going on beside it is not disturbed.
    async Task Pack(string project) => await Run(
        Root, "pack", project, "-o", Path.Combine(_own, "feed"), $"-p:Version={Version}",
            $"-p:ArtifactsPath={Path.Combine(_own, "build")}");

    // What is fresh comes from the feed into a folder of its own; everything else from the packages that are there
    // already.
    void WriteProject()
    {
        foreach (string file in Directory.GetFiles(Path.Combine(Root, "tests", "Assize.Packages.Tests", "Fresh")))
            File.Copy(file, Path.Combine(_fresh.FullName, Path.GetFileName(file)));
        string shared = Environment.GetEnvironmentVariable("NUGET_PACKAGES")
            ?? Path.Combine(Environment.GetFolderPath(Environment.SpecialFolder.UserProfile), ".nuget", "packages");
        File.WriteAllText(Path.Combine(_fresh.FullName, "nuget.config"), $"""
            <configuration>
              <config><add key="globalPackagesFolder" value="packages" /></config>
              <fallbackPackageFolders><add key="shared" value="{SecurityElement.Escape(shared)}" /></fallbackPackageFolders>
              <packageSources><add key="fresh" value="{SecurityElement.Escape(Path.Combine(_own, "feed"))}" /></packageSources>
            </configuration>
            """);
    }

    async Task<string> Run(string folder, params string[] arguments)
    {
        var (exitCode, text) = await Shell.Dotnet(folder, arguments);
        output.WriteLine(text);
        Assert.True(exitCode == 0, $"dotnet {string.Join(' ', arguments)} ended with {exitCode}:\n{text}");
        return text;
    }
}
