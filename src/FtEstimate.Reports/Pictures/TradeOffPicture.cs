using System.Collections.Immutable;
using FtEstimate.Reports.Estimate;
using FtEstimate.Sizing;
using OxyPlot;
using OxyPlot.Annotations;
using OxyPlot.Axes;
using OxyPlot.Legends;
using OxyPlot.Series;

namespace FtEstimate.Reports.Pictures;

/// <summary>Atoms against run time: the machines that no other beats, the chosen one ringed.</summary>
internal static class TradeOffPicture
{
    private const int Height = 430;

    /// <summary>The picture.</summary>
    /// <param name="unbeaten">The machines, fewest atoms first; at least one.</param>
    /// <param name="chosen">The preferred one.</param>
    /// <param name="otherStyle">The preferred one of the other style of logic, which may be beaten; null: none.</param>
    public static string Svg(ImmutableArray<SizedMachine> unbeaten, SizedMachine chosen, SizedMachine? otherStyle)
    {
        ImmutableArray<SizedMachine> shown = otherStyle is null || OtherMachinesSection.IndexOf(unbeaten, otherStyle) >= 0 ? unbeaten : unbeaten.Add(otherStyle);
        PlotModel model = PictureStyle.Model();
        model.Legends.Add(PictureStyle.Legend(LegendPosition.RightTop));
        Extent atoms = Extent.Of(shown.Select(machine => machine.Atoms.Total));
        Extent seconds = Extent.Of(shown.Select(machine => machine.RunSeconds));
        model.Axes.Add(PictureStyle.Styled(new ListedAxis(LogTicks.Numbers(atoms.Low, atoms.High, 7))
        {
            Position = AxisPosition.Bottom,
            Minimum = Math.Log10(atoms.Low),
            Maximum = Math.Log10(atoms.High),
            Title = "atoms in traps",
        }));
        model.Axes.Add(PictureStyle.Styled(new ListedAxis(LogTicks.Seconds(seconds.Low, seconds.High, 8))
        {
            Position = AxisPosition.Left,
            Minimum = Math.Log10(seconds.Low),
            Maximum = Math.Log10(seconds.High),
            Title = "run time of one shot",
        }));
        model.Series.Add(Steps(unbeaten, atoms, seconds));
        AddPoints(model, shown, LogicStyle.LatticeSurgery, "lattice surgery", MarkerType.Circle, PictureStyle.Blue);
        AddPoints(model, shown, LogicStyle.Transversal, "transversal gates", MarkerType.Diamond, PictureStyle.Orange);
        AddChosen(model, chosen, atoms);
        return PictureStyle.Svg(model, "trade-off", "Run time against atoms of the machines that would do", Height);
    }

    /// <summary>The boundary: with more atoms than a machine has, its run time can be had.</summary>
    private static LineSeries Steps(ImmutableArray<SizedMachine> unbeaten, Extent atoms, Extent seconds)
    {
        var line = new LineSeries { Color = PictureStyle.Quiet, StrokeThickness = 1, LineStyle = LineStyle.Dash };
        double before = seconds.High;
        foreach (SizedMachine machine in unbeaten)
        {
            line.Points.Add(new DataPoint(Math.Log10(machine.Atoms.Total), Math.Log10(before)));
            line.Points.Add(new DataPoint(Math.Log10(machine.Atoms.Total), Math.Log10(machine.RunSeconds)));
            before = machine.RunSeconds;
        }

        line.Points.Add(new DataPoint(Math.Log10(atoms.High), Math.Log10(before)));
        return line;
    }

    private static void AddPoints(
        PlotModel model, ImmutableArray<SizedMachine> unbeaten, LogicStyle style, string title, MarkerType marker, OxyColor colour)
    {
        var points = new ScatterSeries { Title = title, MarkerType = marker, MarkerSize = 5, MarkerFill = colour, MarkerStroke = OxyColors.White, MarkerStrokeThickness = 0.8 };
        foreach (SizedMachine machine in unbeaten)
        {
            if (machine.Layout.Style == style)
            {
                points.Points.Add(new ScatterPoint(Math.Log10(machine.Atoms.Total), Math.Log10(machine.RunSeconds)));
            }
        }

        if (points.Points.Count > 0)
        {
            model.Series.Add(points);
        }
    }

    private static void AddChosen(PlotModel model, SizedMachine chosen, Extent atoms)
    {
        var place = new DataPoint(Math.Log10(chosen.Atoms.Total), Math.Log10(chosen.RunSeconds));
        var ring = new ScatterSeries
        {
            Title = "preferred",
            MarkerType = MarkerType.Circle,
            MarkerSize = 8,
            MarkerFill = OxyColors.Transparent,
            MarkerStroke = PictureStyle.Ink,
            MarkerStrokeThickness = 1.8,
        };
        ring.Points.Add(new ScatterPoint(place.X, place.Y));
        model.Series.Add(ring);
        // the step line falls to the right, so both corners beside it are free of points
        bool labelLeft = place.X > Math.Log10(atoms.Low) + (0.6 * Math.Log10(atoms.High / atoms.Low));
        model.Annotations.Add(new TextAnnotation
        {
            Text = $"{Quantities.Show.Atoms(chosen.Atoms.Total)} atoms, {Quantities.Show.Duration(chosen.RunSeconds)}",
            TextPosition = place,
            Offset = labelLeft ? new ScreenVector(-10, 18) : new ScreenVector(12, -16),
            StrokeThickness = 0,
            TextColor = PictureStyle.Ink,
            TextHorizontalAlignment = labelLeft ? HorizontalAlignment.Right : HorizontalAlignment.Left,
            TextVerticalAlignment = VerticalAlignment.Middle,
        });
    }

    /// <summary>Ends of an axis, with a margin around the data.</summary>
    private readonly record struct Extent(double Low, double High)
    {
        // a narrow range still gets an axis with some ticks
        private const double Margin = 0.12;
        private const double LeastDecades = 0.3;

        public static Extent Of(IEnumerable<double> values)
        {
            double low = Math.Log10(values.Min());
            double high = Math.Log10(values.Max());
            double missing = Math.Max(0, LeastDecades - (high - low)) / 2;
            double margin = (Margin * (high - low)) + missing;
            return new Extent(Math.Pow(10, low - margin), Math.Pow(10, high + margin));
        }
    }
}
