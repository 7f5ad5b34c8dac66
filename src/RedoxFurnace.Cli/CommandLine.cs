using System.CommandLine;
using System.CommandLine.Parsing;
using RedoxFurnace.Cli.Commands;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli;

/// <summary>The whole program behind two text writers, so that a test can run it.</summary>
internal static class CommandLine
{
    public const int RedirectedWidth = 150;
    public const int LeastWidth = 80;

    private const int Answered = 0;
    private const int CannotAnswer = 1;
    private const int WrongRequest = 2;

    /// <summary>Runs one command.</summary>
    /// <returns>0 answered (a no is an answer), 1 right but cannot be done, 2 wrong as written.</returns>
    public static int Run(string[] args, TextWriter output, TextWriter error, int width)
    {
        try
        {
            Screen screen = new(output, error, width);
            RootCommand root = CommandTree.Build(screen);
            ParseResult parsed = root.Parse(args, new ParserConfiguration { ResponseFileTokenReplacer = null });
            if (CommandFaults.Describe(parsed) is { } fault)
            {
                return Say(error, fault, WrongRequest);
            }

            return parsed.Invoke(new InvocationConfiguration { Output = output, Error = error, EnableDefaultExceptionHandler = false });
        }
        catch (RequestException fault)
        {
            return Say(error, fault.Message, WrongRequest);
        }
        catch (DocumentException fault)
        {
            return Say(error, fault.Message, WrongRequest);
        }
        catch (NoAnswerException fault)
        {
            return Say(error, fault.Message, CannotAnswer);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            return Say(error, fault.Message, CannotAnswer);
        }
        catch (Exception fault) when (fault is not OutOfMemoryException)
        {
            return Say(error, $"internal fault ({fault.GetType().Name}): {fault.Message}; this is a defect, please report the command line", CannotAnswer);
        }
    }

    public static int Done => Answered;

    public static int Failed => CannotAnswer;

    private static int Say(TextWriter error, string message, int code)
    {
        error.WriteLine("redoxfurnace: " + message.ReplaceLineEndings(" "));
        return code;
    }
}
