using System.Collections.Immutable;
using System.Text;

namespace RedoxFurnace.Charts.Scenes;

/// <summary>One line of text with subscripts and superscripts.</summary>
/// <param name="Runs">Pieces from left to right.</param>
public sealed record RichText(ImmutableArray<TextRun> Runs)
{
    /// <summary>Size of raised and lowered text against the text on the line.</summary>
    public const double SmallScale = 0.72;

    /// <summary>Without its levels, for titles and searching.</summary>
    public string Plain => string.Concat(Runs.Select(run => run.Text));

    /// <summary>Reads marked text: <c>_{...}</c> is lowered, <c>^{...}</c> is raised.</summary>
    /// <param name="marked">Text with marks; a hyphen before a digit becomes a true minus sign.</param>
    /// <returns>The text.</returns>
    public static RichText Of(string marked)
    {
        List<TextRun> runs = [];
        StringBuilder open = new();
        int level = 0;
        for (int i = 0; i < marked.Length; i++)
        {
            if (level == 0 && marked[i] is '_' or '^' && i + 1 < marked.Length && marked[i + 1] == '{')
            {
                Close(runs, open, 0);
                level = marked[i] == '_' ? -1 : 1;
                i++;
            }
            else if (level != 0 && marked[i] == '}')
            {
                Close(runs, open, level);
                level = 0;
            }
            else
            {
                bool minus = marked[i] == '-' && i + 1 < marked.Length && char.IsAsciiDigit(marked[i + 1]) && (i == 0 || marked[i - 1] is ' ' or '(' or '{');
                open.Append(minus ? '\u2212' : marked[i]);
            }
        }

        Close(runs, open, level);
        return new RichText([.. runs]);
    }

    /// <summary>Reads chemistry: figures after a letter or a closing parenthesis are lowered, those that stand alone are not.</summary>
    /// <param name="text">Such as <c>4/3 Cr + O2 = 2/3 Cr2O3</c>.</param>
    /// <returns>The text.</returns>
    public static RichText OfChemistry(string text)
    {
        List<TextRun> runs = [];
        StringBuilder open = new();
        int i = 0;
        while (i < text.Length)
        {
            bool afterAtom = i > 0 && (char.IsAsciiLetter(text[i - 1]) || text[i - 1] == ')') && IsFormulaBefore(text, i);
            if (afterAtom && char.IsAsciiDigit(text[i]))
            {
                Close(runs, open, 0);
                int end = i;
                while (end < text.Length && (char.IsAsciiDigit(text[end]) || (text[end] == '.' && end + 1 < text.Length && char.IsAsciiDigit(text[end + 1]))))
                {
                    end++;
                }

                runs.Add(new TextRun(text[i..end], -1));
                i = end;
            }
            else
            {
                open.Append(text[i]);
                i++;
            }
        }

        Close(runs, open, 0);
        return new RichText([.. runs]);
    }

    /// <summary>Two texts in a row.</summary>
    /// <param name="other">What follows.</param>
    /// <returns>The joined text.</returns>
    public RichText Then(RichText other) => new(Runs.AddRange(other.Runs));

    /// <summary>A word counts as a formula when it starts with a capital letter.</summary>
    private static bool IsFormulaBefore(string text, int at)
    {
        int start = at;
        while (start > 0 && (char.IsAsciiLetterOrDigit(text[start - 1]) || text[start - 1] is '(' or ')' or '.'))
        {
            start--;
        }

        while (start < at && text[start] is '(' or ')')
        {
            start++;
        }

        return start < at && char.IsAsciiLetterUpper(text[start]);
    }

    private static void Close(List<TextRun> runs, StringBuilder open, int level)
    {
        if (open.Length > 0)
        {
            runs.Add(new TextRun(open.ToString(), level));
            open.Clear();
        }
    }
}
