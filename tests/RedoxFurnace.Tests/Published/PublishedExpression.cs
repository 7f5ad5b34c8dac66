using System.Globalization;

namespace RedoxFurnace.Tests.Published;

/// <summary>An expression in T as the tables print it: numbers, T, + - * / ^, ln( ), parentheses.</summary>
internal sealed class PublishedExpression
{
    private readonly string _text;
    private readonly double _kelvin;
    private int _at;

    private PublishedExpression(string text, double kelvin) => (_text, _kelvin) = (text.Replace(" ", "", StringComparison.Ordinal), kelvin);

    public static double Evaluate(string text, double kelvin)
    {
        PublishedExpression reader = new(text, kelvin);
        double value = reader.Sum();
        return reader._at == reader._text.Length ? value : throw reader.Bad();
    }

    private double Sum()
    {
        double sum = Product();
        while (Peek is '+' or '-')
        {
            sum += Take() == '+' ? Product() : -Product();
        }

        return sum;
    }

    private double Product()
    {
        double product = Power();
        while (Peek is '*' or '/')
        {
            product = Take() == '*' ? product * Power() : product / Power();
        }

        return product;
    }

    private double Power()
    {
        if (Peek == '-')
        {
            Take();
            return -Power();
        }

        double value = Atom();
        if (Peek != '^')
        {
            return value;
        }

        Take();
        return Math.Pow(value, Power());
    }

    private double Atom()
    {
        if (TakeWord("ln("))
        {
            return Math.Log(ToClosing());
        }

        if (TakeWord("("))
        {
            return ToClosing();
        }

        return TakeWord("T") ? _kelvin : Number();
    }

    private double ToClosing()
    {
        double value = Sum();
        return Take() == ')' ? value : throw Bad();
    }

    private double Number()
    {
        int start = _at;
        while (char.IsAsciiDigit(Peek) || Peek == '.')
        {
            _at++;
        }

        return double.TryParse(_text.AsSpan(start, _at - start), NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out double number)
            ? number
            : throw Bad();
    }

    private char Peek => _at < _text.Length ? _text[_at] : '\0';

    private char Take() => _at < _text.Length ? _text[_at++] : throw Bad();

    private bool TakeWord(string word)
    {
        bool found = _text.AsSpan(_at).StartsWith(word, StringComparison.Ordinal);
        _at += found ? word.Length : 0;
        return found;
    }

    private InvalidDataException Bad() => new($"'{_text}' is no expression in T (at {_at})");
}
