using Assize.Cli;

return await CommandLine.InvokeAsync(args, Desk.OfThisProcess());
