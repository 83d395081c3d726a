using System.Reflection;

namespace Assize.Packages.Tests;

public sealed class ToolTests(ITestOutputHelper output) : IDisposable
{
    const string Version = "0.1.0-fresh";

    static readonly string Root = typeof(ToolTests).Assembly.GetCustomAttributes<AssemblyMetadataAttribute>()
        .Single(metadata => metadata.Key == "RepositoryRoot").Value!;

    readonly string _own = Path.Combine(AppContext.BaseDirectory, "tool");
    readonly DirectoryInfo _fresh = Directory.CreateTempSubdirectory("assize-tool-");

    public void Dispose() => _fresh.Delete(recursive: true);

    [Fact]
    public async Task The_installed_tool_plans_and_reviews_a_suite_that_knows_nothing_of_it()
    {
        string feed = Path.Combine(_own, "feed"), installed = Path.Combine(_fresh.FullName, "installed");
        await Run(0, Root, "pack", "src/Assize.Cli", "-o", feed, $"-p:Version={Version}", $"-p:ArtifactsPath={Path.Combine(_own, "build")}");
        await Run(0, _fresh.FullName, "tool", "install", "Assize.Cli", "--tool-path", installed, "--version", Version, "--source", feed);
        string tool = Directory.GetFiles(installed, "Assize.Cli.dll", SearchOption.AllDirectories).Single();
        WriteSuite();

        string plan = await Run(0, _fresh.FullName, tool, "plan", "rate", "--target", "0.5", "--tolerance", "0", "--defect", "0.1", "--risk", "1e-6");
        string run = await Run(2, _fresh.FullName, tool, "run", "Suite.csproj");

        Assert.Contains("1,586 trials", plan, StringComparison.Ordinal);
        Assert.Contains("ASZ2001  CoinTests.cs:13", run, StringComparison.Ordinal);
        Assert.Contains("one finding stands", run, StringComparison.Ordinal);
    }

    // No package of this repository is referenced: the tool brings its own reader.
    void WriteSuite()
    {
        string packages = File.ReadAllText(Path.Combine(Root, "Directory.Packages.props"));
        string version = packages.Split("\"xunit.v3\" Version=\"[")[1].Split(']')[0];
        File.WriteAllText(Path.Combine(_fresh.FullName, "Suite.csproj"), $"""
            <Project Sdk="Microsoft.NET.Sdk">
              <PropertyGroup>
                <TargetFramework>net10.0</TargetFramework>
                <OutputType>Exe</OutputType>
                <TreatWarningsAsErrors>true</TreatWarningsAsErrors>
                <NoWarn>NU1603</NoWarn>
              </PropertyGroup>
              <ItemGroup>
                <PackageReference Include="xunit.v3" Version="{version}" />
              </ItemGroup>
            </Project>
            """);
        File.WriteAllText(Path.Combine(_fresh.FullName, "CoinTests.cs"), """
            using System;
            using Xunit;

            public class CoinTests
            {
                [Fact]
                public void Heads_come_half_of_the_time()
                {
                    var random = new Random();
                    int heads = 0;
                    for (int i = 0; i < 1000; i++)
                        heads += random.Next(2) == 0 ? 1 : 0;
                    Assert.InRange(heads / 1000.0, 0.44, 0.56);
                }
            }
            """);
    }

    async Task<string> Run(int expected, string folder, params string[] arguments)
    {
        var (exitCode, text) = await Shell.Dotnet(folder, arguments);
        output.WriteLine(text);
        Assert.True(exitCode == expected, $"dotnet {string.Join(' ', arguments)} ended with {exitCode}:\n{text}");
        return text;
    }
}
