using System.Collections.Immutable;

namespace FtEstimate.Reports.Documents;

/// <summary>A report as it is written, whatever the format. All text in it is plain text: the writers escape it.</summary>
/// <param name="Title">The heading of the whole.</param>
/// <param name="Sections">The sections in reading order.</param>
public sealed record ReportDocument(string Title, ImmutableArray<ReportSection> Sections)
{
    /// <summary>Every picture, in reading order.</summary>
    public ImmutableArray<Picture> Pictures
    {
        get
        {
            var pictures = ImmutableArray.CreateBuilder<Picture>();
            foreach (ReportSection section in Sections)
            {
                foreach (Block block in section.Blocks)
                {
                    if (block is Picture picture)
                    {
                        pictures.Add(picture);
                    }
                }
            }

            return pictures.ToImmutable();
        }
    }
}

/// <summary>A section.</summary>
/// <param name="Title">Its heading.</param>
/// <param name="Blocks">What stands in it.</param>
public sealed record ReportSection(string Title, ImmutableArray<Block> Blocks);
