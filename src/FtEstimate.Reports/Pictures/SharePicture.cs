using FtEstimate.Noise;
using OxyPlot;
using OxyPlot.Annotations;
using OxyPlot.Axes;

namespace FtEstimate.Reports.Pictures;

/// <summary>The shares of the causes of error as bars, largest first.</summary>
internal static class SharePicture
{
    private const int RowHeight = 25;
    private const int MarginHeight = 66;
    private const int MostBars = 12;

    /// <summary>The picture.</summary>
    public static string Svg(ErrorLedger ledger)
    {
        List<Tick> names = [];
        List<double> shares = [];
        double rest = 0;
        int hidden = 0;
        foreach (ErrorChannel channel in ledger.Channels)
        {
            if (names.Count < MostBars - 1 || ledger.Channels.Length <= MostBars)
            {
                names.Add(new Tick(names.Count, channel.Name));
                shares.Add(ledger.Share(channel));
            }
            else
            {
                rest += ledger.Share(channel);
                hidden++;
            }
        }

        if (hidden > 0)
        {
            names.Add(new Tick(names.Count, $"{hidden.ToString(System.Globalization.CultureInfo.InvariantCulture)} smaller causes"));
            shares.Add(rest);
        }

        double largest = 100 * shares.Max();
        PlotModel model = PictureStyle.Model();
        model.Axes.Add(PictureStyle.Styled(new LinearAxis
        {
            Position = AxisPosition.Bottom,
            Minimum = 0,
            Maximum = largest * 1.12,
            Title = "share of the noise strength (%)",
        }));
        ListedAxis axis = PictureStyle.Styled(new ListedAxis(names)
        {
            Position = AxisPosition.Left,
            StartPosition = 1,
            EndPosition = 0,
            Minimum = -0.7,
            Maximum = names.Count - 0.3,
        });
        axis.MajorGridlineStyle = LineStyle.None;
        axis.MajorTickSize = 0;
        model.Axes.Add(axis);
        for (int i = 0; i < shares.Count; i++)
        {
            AddBar(model, i, 100 * shares[i], largest, isRest: hidden > 0 && i == shares.Count - 1);
        }

        return PictureStyle.Svg(model, "errors", "Share of each cause of error", MarginHeight + (RowHeight * names.Count));
    }

    private static void AddBar(PlotModel model, int row, double percent, double largest, bool isRest)
    {
        model.Annotations.Add(new RectangleAnnotation
        {
            MinimumX = 0,
            MaximumX = percent,
            MinimumY = row - 0.34,
            MaximumY = row + 0.34,
            Fill = isRest ? PictureStyle.Sky : PictureStyle.Blue,
            StrokeThickness = 0,
        });
        model.Annotations.Add(new TextAnnotation
        {
            Text = Quantities.Show.Percent(percent / 100),
            TextPosition = new DataPoint(percent + (0.008 * largest), row),
            TextHorizontalAlignment = HorizontalAlignment.Left,
            TextVerticalAlignment = VerticalAlignment.Middle,
            StrokeThickness = 0,
            TextColor = PictureStyle.Ink,
            FontSize = 12,
        });
    }
}
