using System.Globalization;
using Assize.Bounds;

namespace Assize;

/// <summary>The terms of claims that say nothing themselves: of the environment, else of the assembly's attribute, else the
/// usual ones.</summary>
static class SuiteTerms
{
    public const string RiskVariable = "ASSIZE_RISK";
    public const string ConfidenceVariable = "ASSIZE_CONFIDENCE";

    static readonly Lazy<SuiteTermsAttribute?> Declared = new(Find);

    public static double Risk => Number(RiskVariable, 1e-300) ?? Set(Declared.Value?.Risk, "Risk", 1e-300) ?? UsualTerms.Risk;

    public static double Confidence =>
        Number(ConfidenceVariable, double.Epsilon) ?? Set(Declared.Value?.Confidence, "Confidence", double.Epsilon) ?? UsualTerms.Confidence;

    public static string? Seed => Declared.Value?.Seed;

    static double? Number(string variable, double least)
    {
        if (Environment.GetEnvironmentVariable(variable) is not { Length: > 0 } text)
            return null;

        return double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out double value) && value >= least && value < 1
            ? value
            : throw new ClaimRefusedException($"{variable} is '{text}'; it must be a number between 0 and 1, like 1e-9 or 0.999. Unset it for the suite's own.");
    }

    static double? Set(double? value, string name, double least) => value switch
    {
        null or 0 => null,
        { } given when given >= least && given < 1 => given,
        _ => throw new ClaimRefusedException($"[assembly: SuiteTerms({name} = {Wording.Exact(value.Value)})] must lie between 0 and 1."),
    };

    // A claim does not know the assembly that made it, so a process speaks with one voice.
    static SuiteTermsAttribute? Find()
    {
        var declared = AppDomain.CurrentDomain.GetAssemblies()
            .Where(assembly => !assembly.IsDynamic)
            .Select(assembly => (assembly.GetName().Name, Attribute: (SuiteTermsAttribute?)Attribute.GetCustomAttribute(assembly, typeof(SuiteTermsAttribute))))
            .Where(found => found.Attribute is not null)
            .ToList();
        return declared.DistinctBy(found => (found.Attribute!.Risk, found.Attribute.Confidence, found.Attribute.Seed)).Count() <= 1
            ? declared.FirstOrDefault().Attribute
            : throw new ClaimRefusedException($"Assemblies of one process declare different SuiteTerms: {string.Join(", ", declared.Select(found => found.Name))}. Make them alike.");
    }
}
