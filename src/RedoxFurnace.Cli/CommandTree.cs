using System.CommandLine;
using RedoxFurnace.Cli.Commands;
using RedoxFurnace.Cli.Presentation;

namespace RedoxFurnace.Cli;

/// <summary>Every command of the program, in the order of the help. A new command is one line here and one file in <c>Commands</c>.</summary>
internal static class CommandTree
{
    public static RootCommand Build(Screen screen)
    {
        CommonOptions common = new();
        RootCommand root = new("Which reductant takes the oxygen off an oxide charge, from which temperature, in which atmosphere, with what heat, and how sure that is.");
        common.AddTo(root);
        root.Subcommands.Add(PlanCommand.Create(screen, common));
        root.Subcommands.Add(RankCommand.Create(screen, common));
        root.Subcommands.Add(OverviewCommand.Create(screen, common));
        root.Subcommands.Add(AtmosphereCommand.Create(screen, common));
        root.Subcommands.Add(GasCommand.Create(screen, common));
        root.Subcommands.Add(ReadingCommand.Create(screen, common));
        root.Subcommands.Add(ConstantCommand.Create(screen, common));
        root.Subcommands.Add(ChargeCommand.Create(screen, common));
        root.Subcommands.Add(BatchHeatCommand.Create(screen, common));
        root.Subcommands.Add(LadderCommand.Create(screen, common));
        root.Subcommands.Add(ChartCommand.Create(screen, common));
        root.Subcommands.Add(OxidesCommand.Create(screen, common));
        return root;
    }
}
