using LoadWatch.Service.Commands;

return await CommandLine.RunAsync(args);
