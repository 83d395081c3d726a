namespace Assize.Benchmarks;

/// <summary>Tries out both promises of every family of claims, and prints how often each was broken.</summary>
static class CalibrationTable
{
    const int Usual = 20_000;
    const string Seed = "00000000ca11b8a7";

    /// <summary>All families, or those whose names contain one of the words; a number is that of repetitions.</summary>
    /// <returns>0, or 1 when a promise is surely broken.</returns>
    public static int Write(IReadOnlyCollection<string> words)
    {
        Environment.SetEnvironmentVariable("ASSIZE_SEED", Seed);
        int repetitions = words.Select(word => int.TryParse(word, out int number) ? number : 0).DefaultIfEmpty(0).Max();
        repetitions = repetitions > 0 ? repetitions : Usual;
        Console.WriteLine($"{repetitions} repetitions a row, risk = 1 - confidence = {CalibratedLaw.Promise}, seed {Seed}.");
        Console.WriteLine($"Limits: exact binomial, of the wrong colour; too low with probability {Cell.LimitRisk} each.");
        Console.WriteLine(Cell.Head);
        bool isKept = true;
        foreach (var family in Found.Of<CalibratedFamily>([.. words.Where(word => !int.TryParse(word, out _))]))
        {
            Console.WriteLine($"\n{family.GetType().Name}");
            foreach (var law in family.Laws)
                isKept &= Write(law, repetitions);
        }

        return isKept ? 0 : 1;
    }

    static bool Write(CalibratedLaw law, int repetitions)
    {
        bool isKept = true;
        foreach (var (place, truth, wrong) in law.Truths())
        {
            var cell = Cell.Of(law, truth, repetitions);
            Console.WriteLine(cell.Text(law, place, truth, wrong));
            isKept &= wrong is not { } colour || !cell.IsBroken(colour);
        }

        return isKept;
    }
}
