namespace Assize.Bounds;

/// <summary>What every plan demands of risk and confidence, refused in the same words.</summary>
static class Demand
{
    const double LeastProbability = 1e-300;

    public static void RiskAndConfidence(double risk, double confidence)
    {
        if (!(risk >= LeastProbability && risk < 1))
            throw Refused($"The risk must lie between 1e-300 and 1; it is {Check.Text(risk)}. Usual is 1e-9.");
        if (!(confidence > 0 && confidence < 1))
            throw Refused($"The confidence must lie between 0 and 1; it is {Check.Text(confidence)}. Usual is 0.999.");
        if (!(confidence > risk))
            throw Refused($"The confidence ({Check.Text(confidence)}) must be greater than the risk "
                + $"({Check.Text(risk)}): a verdict that ignores the draws would do as well.");
    }

    static ClaimRefusedException Refused(string message) => new(message);
}
