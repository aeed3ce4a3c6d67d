using FtEstimate.Cycles;
using FtEstimate.Reports.Estimate;
using OxyPlot;
using OxyPlot.Annotations;
using OxyPlot.Axes;

namespace FtEstimate.Reports.Pictures;

/// <summary>The time-line of a round: one bar per phase, from its start to its end.</summary>
internal static class CyclePicture
{
    private const int RowHeight = 22;
    private const int MarginHeight = 96;

    // a phase shorter than this share of the picture is drawn this wide, so that it can be seen
    private const double ThinnestShare = 0.004;

    /// <summary>The picture.</summary>
    public static string Svg(CycleView cycle)
    {
        List<Bar> bars = Bars(cycle);
        (double unit, string unitName) = cycle.RoundSeconds < 1e-3 ? (1e-6, "µs") : cycle.RoundSeconds < 1 ? (1e-3, "ms") : (1, "s");
        double end = cycle.RoundSeconds / unit;
        foreach (Bar bar in bars)
        {
            end = Math.Max(end, (bar.Start + bar.Seconds) / unit);
        }

        PlotModel model = PictureStyle.Model();
        model.Axes.Add(PictureStyle.Styled(new LinearAxis
        {
            Position = AxisPosition.Bottom,
            Minimum = 0,
            Maximum = end * 1.02,
            Title = $"time from the start of the round ({unitName})",
        }));
        model.Axes.Add(Names(bars));
        for (int i = 0; i < bars.Count; i++)
        {
            AddBar(model, bars[i], i, unit, end);
        }

        AddKey(model, bars, end);
        return PictureStyle.Svg(model, "cycle", "Time-line of one syndrome round", MarginHeight + (RowHeight * (bars.Count + 1)));
    }

    private static List<Bar> Bars(CycleView cycle)
    {
        var bars = new List<Bar>();
        foreach (CyclePhase phase in cycle.Phases)
        {
            bars.Add(new Bar(phase.Name, phase.Part, phase.StartSeconds, phase.Seconds));
        }

        if (cycle.IdleSeconds > 0)
        {
            bars.Add(new Bar("Wait for the readout", CyclePart.Readout, cycle.RoundSeconds - cycle.IdleSeconds, cycle.IdleSeconds));
        }

        return bars;
    }

    private static ListedAxis Names(List<Bar> bars)
    {
        var ticks = new List<Tick>();
        for (int i = 0; i < bars.Count; i++)
        {
            ticks.Add(new Tick(i, bars[i].Name));
        }

        ListedAxis axis = PictureStyle.Styled(new ListedAxis(ticks)
        {
            Position = AxisPosition.Left,
            StartPosition = 1,
            EndPosition = 0,
            Minimum = -1.6,
            Maximum = bars.Count - 0.4,
        });
        axis.MajorGridlineStyle = LineStyle.None;
        axis.MajorTickSize = 0;
        return axis;
    }

    private static void AddBar(PlotModel model, Bar bar, int row, double unit, double end)
    {
        double start = bar.Start / unit;
        double stop = Math.Max(start + (bar.Seconds / unit), start + (ThinnestShare * end));
        model.Annotations.Add(new RectangleAnnotation
        {
            MinimumX = start,
            MaximumX = stop,
            MinimumY = row - 0.36,
            MaximumY = row + 0.36,
            Fill = Fill(bar.Part),
            Stroke = PictureStyle.Quiet,
            StrokeThickness = 0.6,
        });
        bool labelLeft = stop > 0.82 * end;
        model.Annotations.Add(new TextAnnotation
        {
            Text = Quantities.Show.Duration(bar.Seconds),
            TextPosition = new DataPoint(labelLeft ? start - (0.008 * end) : stop + (0.008 * end), row),
            TextHorizontalAlignment = labelLeft ? HorizontalAlignment.Right : HorizontalAlignment.Left,
            TextVerticalAlignment = VerticalAlignment.Middle,
            StrokeThickness = 0,
            TextColor = PictureStyle.Quiet,
            FontSize = 11.5,
        });
    }

    /// <summary>The key of the fills, in a row of its own above the bars.</summary>
    private static void AddKey(PlotModel model, List<Bar> bars, double end)
    {
        double x = 0.005 * end;
        foreach (CyclePart part in (CyclePart[])[CyclePart.Preparation, CyclePart.Gates, CyclePart.Readout, CyclePart.LossCheck])
        {
            if (!bars.Exists(bar => bar.Part == part))
            {
                continue;
            }

            model.Annotations.Add(new RectangleAnnotation
            {
                MinimumX = x,
                MaximumX = x + (0.025 * end),
                MinimumY = -1.3,
                MaximumY = -0.8,
                Fill = Fill(part),
                Stroke = PictureStyle.Quiet,
                StrokeThickness = 0.6,
            });
            string name = Words.Part(part);
            model.Annotations.Add(new TextAnnotation
            {
                Text = name,
                TextPosition = new DataPoint(x + (0.035 * end), -1.05),
                TextHorizontalAlignment = HorizontalAlignment.Left,
                TextVerticalAlignment = VerticalAlignment.Middle,
                StrokeThickness = 0,
                TextColor = PictureStyle.Ink,
                FontSize = 12,
            });
            x += (0.075 + (0.0145 * name.Length)) * end;
        }
    }

    private static OxyColor Fill(CyclePart part) => part switch
    {
        CyclePart.Gates => PictureStyle.Blue,
        CyclePart.Readout => PictureStyle.Orange,
        CyclePart.LossCheck => PictureStyle.Sky,
        _ => PictureStyle.Pale,
    };

    private sealed record Bar(string Name, CyclePart Part, double Start, double Seconds);
}
