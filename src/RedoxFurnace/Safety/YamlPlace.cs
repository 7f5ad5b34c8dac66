using YamlDotNet.Core;

namespace RedoxFurnace.Safety;

/// <summary>A place in a file, counted from 1.</summary>
internal readonly record struct YamlPlace(string FileName, long Line, long Column)
{
    internal static YamlPlace Of(string fileName, Mark mark) => new(fileName, mark.Line, mark.Column);
}
