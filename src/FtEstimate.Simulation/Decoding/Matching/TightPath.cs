namespace FtEstimate.Simulation.Decoding.Matching;

/// <summary>A cheapest path between two defects, or from a defect to the boundary, along which regions have met.</summary>
/// <param name="From">Vertex of the first defect; -1 where there is no path.</param>
/// <param name="Code">Twice the vertex of the other defect (-1 for the boundary), plus 1 if the path flips the observable.</param>
internal readonly record struct TightPath(int From, int Code)
{
    public static readonly TightPath None = new(-1, -2);

    public int To => Code >> 1;

    public int Parity => Code & 1;

    public bool Exists => From >= 0;

    public bool MeetsBoundary => Code < 0;

    public TightPath Reversed() => new(To, (From << 1) | Parity);
}
