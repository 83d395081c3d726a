using Assize.Benchmarks;

try
{
    return BenchmarkTable.Write(args);
}
catch (ArgumentException wrong)
{
    Console.Error.WriteLine(wrong.Message);
    return 2;
}
