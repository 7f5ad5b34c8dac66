namespace RedoxFurnace.Quantities;

/// <summary>A request that is right but cannot be answered: data end, no convergence, a target that cannot be written.</summary>
/// <remarks>The message is one line that says why and what would do. The command line answers it with exit code 1.</remarks>
public class NoAnswerException : Exception
{
    /// <summary>No answer can be given.</summary>
    /// <param name="message">One line: why, and what would do.</param>
    public NoAnswerException(string message)
        : base(message)
    {
    }
}
