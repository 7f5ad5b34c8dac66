using System.CommandLine;
using System.CommandLine.Invocation;
using System.CommandLine.Parsing;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Cli;

/// <summary>Turns what the command-line parser refuses into one line that quotes the word and offers the nearest right one.</summary>
internal static class CommandFaults
{
    public static string? Describe(ParseResult parsed)
    {
        if (parsed.UnmatchedTokens.Count > 0)
        {
            return Unmatched(parsed, parsed.UnmatchedTokens[0]);
        }

        Command chosen = parsed.CommandResult.Command;
        bool refused = parsed.Action is null or ParseErrorAction;
        if (refused && chosen.Subcommands.Count > 0 && chosen.Action is null)
        {
            return $"no command given; one of: {string.Join(", ", chosen.Subcommands.Select(command => command.Name))} (or --help)";
        }

        if (refused && parsed.Errors.Count > 0)
        {
            return Missing(parsed) ?? parsed.Errors[0].Message.ReplaceLineEndings(" ").TrimEnd('.') + $"; see 'redoxfurnace {Path(parsed)}--help'";
        }

        return null;
    }

    private static string Unmatched(ParseResult parsed, string word)
    {
        Command command = parsed.CommandResult.Command;
        bool option = word.StartsWith('-');
        List<string> known = option
            ? [.. Options(parsed).Select(item => item.Name)]
            : [.. command.Subcommands.Select(item => item.Name)];
        string kind = option ? "option" : command.Subcommands.Count > 0 ? "command" : "argument";
        string? near = NearestSpelling.Find(word, known);
        string hint = near is not null
            ? $"did you mean '{near}'?"
            : known.Count > 0 && !option ? $"known: {string.Join(", ", known)}" : $"see 'redoxfurnace {Path(parsed)}--help'";
        return $"unknown {kind} '{word}'; {hint}";
    }

    private static string? Missing(ParseResult parsed)
    {
        Command command = parsed.CommandResult.Command;
        foreach (Option option in command.Options)
        {
            if (option.Required && parsed.GetResult(option) is null or { Implicit: true, Tokens.Count: 0 } && option.Required)
            {
                return $"'{command.Name}' needs {option.Name}: {option.Description}";
            }
        }

        foreach (Argument argument in command.Arguments)
        {
            if (argument.Arity.MinimumNumberOfValues > 0 && parsed.GetResult(argument) is null or { Tokens.Count: 0 })
            {
                return $"'{command.Name}' needs {argument.Name}: {argument.Description}";
            }
        }

        return null;
    }

    private static IEnumerable<Option> Options(ParseResult parsed)
    {
        for (SymbolResult? result = parsed.CommandResult; result is CommandResult command; result = command.Parent)
        {
            foreach (Option option in command.Command.Options)
            {
                yield return option;
            }
        }
    }

    private static string Path(ParseResult parsed)
    {
        Stack<string> names = new();
        for (SymbolResult? result = parsed.CommandResult; result is CommandResult { Parent: not null } command; result = command.Parent)
        {
            names.Push(command.Command.Name);
        }

        return string.Concat(names.Select(name => name + " "));
    }
}
