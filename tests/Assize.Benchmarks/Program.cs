using Assize.Benchmarks;

try
{
    return args is ["calibrate", .. var families] ? CalibrationTable.Write(families) : BenchmarkTable.Write(args);
}
catch (ArgumentException wrong)
{
    Console.Error.WriteLine(wrong.Message);
    return 2;
}
