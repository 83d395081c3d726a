return Assize.Benchmarks.BenchmarkTable.Write(args);
