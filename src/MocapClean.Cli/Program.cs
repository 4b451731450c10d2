using MocapClean.Cli.Commands;

return CommandLine.Run(args);
