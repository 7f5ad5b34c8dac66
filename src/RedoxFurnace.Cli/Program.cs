using System.Text;
using RedoxFurnace.Cli;

Console.OutputEncoding = new UTF8Encoding(encoderShouldEmitUTF8Identifier: false);
int width = Console.IsOutputRedirected ? CommandLine.RedirectedWidth : Math.Max(CommandLine.LeastWidth, Console.WindowWidth);
return CommandLine.Run(args, Console.Out, Console.Error, width);
