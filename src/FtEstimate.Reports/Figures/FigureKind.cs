namespace FtEstimate.Reports.Figures;

/// <summary>What a reported figure is; every writer reads the same.</summary>
/// <param name="Id">Its name for scripts, with the SI unit.</param>
/// <param name="Label">Its name for people.</param>
/// <param name="Unit">Unit and digits.</param>
/// <param name="Meaning">What it means, in plain words.</param>
public sealed record FigureKind(string Id, string Label, FigureUnit Unit, string Meaning = "");

/// <summary>Unit of a figure, which also fixes its digits.</summary>
public enum FigureUnit
{
    /// <summary>Words.</summary>
    Words,

    /// <summary>Atoms, three digits.</summary>
    Atoms,

    /// <summary>Atoms to the last one, where figures must add up.</summary>
    AtomsInFull,

    /// <summary>A count of things other than atoms, or a distance.</summary>
    Count,

    /// <summary>A ratio or rate, three digits.</summary>
    Number,

    /// <summary>Seconds, shown as people say them.</summary>
    Seconds,

    /// <summary>A probability, two digits.</summary>
    Probability,

    /// <summary>A fraction, shown in per cent.</summary>
    Percent,

    /// <summary>Per second, three digits.</summary>
    PerSecond,

    /// <summary>Metres, shown in millimetres.</summary>
    Metres,

    /// <summary>Watts, two digits.</summary>
    Watts,
}
