namespace RedoxFurnace.Cli;

/// <summary>How an answer is written.</summary>
internal enum OutputForm
{
    /// <summary>Words and tables.</summary>
    Text,

    /// <summary>One JSON object.</summary>
    Json,

    /// <summary>The main table.</summary>
    Csv,
}
