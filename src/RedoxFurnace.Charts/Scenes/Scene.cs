using System.Collections.Immutable;

namespace RedoxFurnace.Charts.Scenes;

/// <summary>A whole chart laid out on its page: everything a writer needs, nothing left to decide.</summary>
/// <param name="Width">mm.</param>
/// <param name="Height">mm.</param>
/// <param name="Title">For the file's title.</param>
/// <param name="Description">What the chart shows, in words, for those who cannot see it.</param>
/// <param name="Groups">In the order drawn.</param>
/// <param name="Values">Plotted values.</param>
/// <param name="Information">Author, date and the like for the file's own record; may be empty.</param>
public sealed record Scene(
    double Width,
    double Height,
    string Title,
    string Description,
    ImmutableArray<SceneGroup> Groups,
    ImmutableArray<ValueTable> Values,
    ImmutableSortedDictionary<string, string> Information)
{
    /// <summary>Every text of the scene.</summary>
    public IEnumerable<TextItem> Texts => Groups.SelectMany(group => group.Items).OfType<TextItem>();
}
