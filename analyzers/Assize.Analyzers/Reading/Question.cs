namespace Assize.Analyzers;

/// <summary>
/// Questions to the numeric core. What it will not answer is silence here: no rule fails on a hostile constant.
/// </summary>
static class Question
{
    public static T? Ask<T>(Func<T?> question)
        where T : struct
    {
        try
        {
            return question();
        }
        catch (Exception exception) when (IsNoAnswer(exception))
        {
            return null;
        }
    }

    public static T? AskFor<T>(Func<T> question)
        where T : class
    {
        try
        {
            return question();
        }
        catch (Exception exception) when (IsNoAnswer(exception))
        {
            return null;
        }
    }

    // Outside a domain, a numeric loop at its cap, arithmetic that overflows. Never a cancellation.
    static bool IsNoAnswer(Exception exception) =>
        exception is ArgumentException or ArithmeticException
        || (exception is InvalidOperationException && exception is not ObjectDisposedException);
}
