namespace Assize.Analyzers;

/// <summary>Statistics in words, for sentences and reports.</summary>
static class StatisticNames
{
    public static string Of(Statistic statistic) => statistic switch
    {
        Statistic.Buckets => "count per bucket",
        Statistic.Deviation => "standard deviation",
        Statistic.Distinct => "all distinct",
        Statistic.Some => "at least one",
        Statistic.Difference => "difference of means",
        Statistic.Distance => "distance of distributions",
        Statistic.ChiSquare => "chi-square",
        Statistic.Level => "nominal level",
        Statistic.Prefix => "share at every trial",
        Statistic.Single => "single draw",
        _ => statistic.ToString().ToLowerInvariant(),
    };
}
