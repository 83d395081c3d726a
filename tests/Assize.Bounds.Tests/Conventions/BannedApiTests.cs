using System.Reflection.Metadata;
using System.Reflection.PortableExecutable;

namespace Assize.Bounds.Tests.Conventions;

/// <summary>The same call must give the same number in the editor, in the test run and in CI, on every system and in
/// every culture.</summary>
public class BannedApiTests
{
    static readonly string[] Banned =
    [
        "System.Console.", "System.Environment.", "System.Random.", "System.Guid.NewGuid", "System.IO.", "System.Net.",
        "System.DateTime.", "System.DateTimeOffset.", "System.Diagnostics.Stopwatch.", "System.Diagnostics.Process.", "System.TimeZoneInfo.",
        "System.Globalization.CultureInfo.get_CurrentCulture", "System.Globalization.CultureInfo.get_CurrentUICulture",
        "System.Globalization.CultureInfo.set_", "System.Threading.Thread.",
        // Their last bit differs between systems.
        "System.Math.Log", "System.Math.Exp", "System.Math.Pow", "System.Math.Sin", "System.Math.Cos", "System.Math.Tan", "System.Math.Atan",
    ];

    [Fact]
    public void The_core_touches_no_culture_clock_chance_console_environment_or_file()
    {
        string[] used = [.. References(typeof(RatePlan).Assembly.Location)];

        Assert.True(used.Length > 60, $"only {used.Length} references seen");
        Assert.Contains("System.Globalization.CultureInfo.get_InvariantCulture", used);
        Assert.Contains("System.Math.Sqrt", used);
        Assert.DoesNotContain(used, IsBanned);
    }

    [Fact]
    public void What_this_test_project_uses_itself_is_noticed()
    {
        string[] banned = [.. References(typeof(BannedApiTests).Assembly.Location).Where(IsBanned)];

        Assert.Contains("System.Random..ctor", banned);
        Assert.Contains("System.IO.File.ReadAllText", banned);
        Assert.Contains("System.Math.Log", banned);
    }

    // Text made from numbers goes through Check.Text or holds whole numbers only: both are the same in every culture.
    [Fact]
    public void Refusals_read_the_same_in_every_culture()
    {
        var before = System.Globalization.CultureInfo.CurrentCulture;
        var culture = (System.Globalization.CultureInfo)System.Globalization.CultureInfo.InvariantCulture.Clone();
        culture.NumberFormat.NumberDecimalSeparator = ",";
        culture.NumberFormat.NegativeSign = "minus ";
        try
        {
            string plain = Refusal();
            System.Globalization.CultureInfo.CurrentCulture = culture;
            Assert.Equal(plain, Refusal());
            Assert.Contains("-0.5", plain, StringComparison.Ordinal);
        }
        finally
        {
            System.Globalization.CultureInfo.CurrentCulture = before;
        }
    }

    static string Refusal() =>
        Assert.Throws<ClaimRefusedException>(() => Edges.Around(Domain.Rate, 0.5, -0.5, 1.5)).Message;

    static bool IsBanned(string member) => Banned.Any(prefix => member.StartsWith(prefix, StringComparison.Ordinal));

    static IEnumerable<string> References(string path)
    {
        using var file = new PEReader(File.OpenRead(path));
        var metadata = file.GetMetadataReader();
        foreach (var handle in metadata.MemberReferences)
        {
            var member = metadata.GetMemberReference(handle);
            if (member.Parent.Kind != HandleKind.TypeReference)
                continue;

            var type = metadata.GetTypeReference((TypeReferenceHandle)member.Parent);
            yield return $"{metadata.GetString(type.Namespace)}.{metadata.GetString(type.Name)}.{metadata.GetString(member.Name)}";
        }
    }
}
