using System.Globalization;
using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Legends;

namespace FtEstimate.Reports.Pictures;

/// <summary>What all pictures share: size, type, colours that stay apart in grey and for colour-blind eyes.</summary>
internal static class PictureStyle
{
    /// <summary>Width of every picture in pixels.</summary>
    public const int Width = 760;

    /// <summary>Text.</summary>
    public static readonly OxyColor Ink = OxyColor.FromRgb(0x1d, 0x23, 0x29);

    /// <summary>Quiet text and axis lines.</summary>
    public static readonly OxyColor Quiet = OxyColor.FromRgb(0x56, 0x61, 0x6c);

    /// <summary>Grid lines.</summary>
    public static readonly OxyColor Grid = OxyColor.FromRgb(0xe3, 0xe7, 0xeb);

    /// <summary>Darkest fill.</summary>
    public static readonly OxyColor Blue = OxyColor.FromRgb(0x2b, 0x5c, 0x8a);

    /// <summary>Middle fill.</summary>
    public static readonly OxyColor Orange = OxyColor.FromRgb(0xdd, 0x86, 0x3a);

    /// <summary>Light fill.</summary>
    public static readonly OxyColor Sky = OxyColor.FromRgb(0xa9, 0xcf, 0xe6);

    /// <summary>Lightest fill, drawn with an outline.</summary>
    public static readonly OxyColor Pale = OxyColor.FromRgb(0xea, 0xe3, 0xd2);

    /// <summary>An empty picture.</summary>
    public static PlotModel Model() => new()
    {
        Culture = CultureInfo.InvariantCulture,
        DefaultFont = "Helvetica, Arial, sans-serif",
        DefaultFontSize = 12.5,
        TextColor = Ink,
        Background = OxyColors.White,
        PlotAreaBorderColor = OxyColors.Transparent,
        Padding = new OxyThickness(6, 8, 14, 6),
    };

    /// <summary>A legend inside the picture.</summary>
    public static Legend Legend(LegendPosition position) => new()
    {
        LegendPosition = position,
        LegendPlacement = LegendPlacement.Inside,
        LegendPadding = 8,
        LegendMargin = 4,
        LegendBackground = OxyColors.White,
        LegendBorder = Grid,
        LegendFontSize = 12,
        LegendLineSpacing = 6,
    };

    /// <summary>The usual look of an axis.</summary>
    public static TAxis Styled<TAxis>(TAxis axis)
        where TAxis : Axis
    {
        axis.AxislineStyle = LineStyle.Solid;
        axis.AxislineColor = Quiet;
        axis.TicklineColor = Quiet;
        axis.TickStyle = TickStyle.Outside;
        axis.MajorGridlineStyle = LineStyle.Solid;
        axis.MajorGridlineColor = Grid;
        axis.MinorTickSize = 0;
        axis.AxisTitleDistance = 10;
        axis.TitleColor = Ink;
        axis.TextColor = Ink;
        return axis;
    }

    /// <summary>The picture as one svg element, fit to stand beside others on a page.</summary>
    /// <param name="model">The picture.</param>
    /// <param name="id">Unique on the page.</param>
    /// <param name="title">Read out to those who cannot see it.</param>
    /// <param name="height">Height in pixels.</param>
    public static string Svg(PlotModel model, string id, string title, int height)
    {
        var exporter = new SvgExporter
        {
            Width = Width,
            Height = height,
            UseVerticalTextAlignmentWorkaround = true,
            TextMeasurer = new PixelTextMeasurer(),
        };
        string svg = exporter.ExportToString(model).ReplaceLineEndings("\n");
        svg = svg[svg.IndexOf("<svg", StringComparison.Ordinal)..].Trim()
            .Replace("\"clipPath", $"\"{id}-clip", StringComparison.Ordinal)
            .Replace("#clipPath", $"#{id}-clip", StringComparison.Ordinal);
        int size = svg.IndexOf("<svg", StringComparison.Ordinal) + "<svg".Length;
        return svg.Insert(size, $" role=\"img\" aria-label=\"{title}\" viewBox=\"0 0 {Width} {height.ToString(CultureInfo.InvariantCulture)}\"");
    }

    /// <summary>The library measures text in points while pictures are in pixels.</summary>
    private sealed class PixelTextMeasurer() : PdfRenderContext(100, 100, OxyColors.White)
    {
        private const double PixelsPerPoint = 4.0 / 3;

        public override OxySize MeasureText(string text, string fontFamily, double fontSize, double fontWeight)
        {
            OxySize points = base.MeasureText(text, fontFamily, fontSize, fontWeight);
            return new OxySize(points.Width * PixelsPerPoint, points.Height * PixelsPerPoint);
        }
    }
}
