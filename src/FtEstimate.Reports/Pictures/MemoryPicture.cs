using System.Collections.Immutable;
using System.Globalization;
using FtEstimate.Simulation.Circuits;
using FtEstimate.Simulation.Memory;
using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Legends;
using OxyPlot.Series;

namespace FtEstimate.Reports.Pictures;

/// <summary>Error per round against distance: counts with their intervals, and the law.</summary>
internal static class MemoryPicture
{
    private const int Height = 430;

    // the two bases stand side by side
    private const double Aside = 0.06;

    // a rate too small to matter is left out rather than stretching the axis
    private const double SmallestDrawn = 1e-30;

    /// <summary>The picture.</summary>
    /// <param name="results">At least one experiment with shots.</param>
    public static string Svg(MemoryResults results)
    {
        PlotModel model = PictureStyle.Model();
        model.Legends.Add(PictureStyle.Legend(LegendPosition.LeftBottom));
        ExperimentResult[] run = [.. results.Experiments.Where(experiment => experiment.Count.Shots > 0)];
        (double low, double high) = Range(run, results.Distances);
        model.Axes.Add(PictureStyle.Styled(new ListedAxis(
            [.. results.Distances.Select(distance => new Tick(distance.Distance, distance.Distance.ToString(CultureInfo.InvariantCulture)))])
        {
            Position = AxisPosition.Bottom,
            Minimum = results.Distances[0].Distance - 1,
            Maximum = results.Distances[^1].Distance + 1,
            Title = "code distance",
        }));
        model.Axes.Add(PictureStyle.Styled(new ListedAxis(Ticks(low, high))
        {
            Position = AxisPosition.Left,
            Minimum = low,
            Maximum = high,
            Title = "error per round, one observable",
        }));
        AddLaw(model, results);
        AddCounts(model, run, PauliBasis.Z, MarkerType.Circle, PictureStyle.Blue, -Aside, low);
        AddCounts(model, run, PauliBasis.X, MarkerType.Diamond, PictureStyle.Orange, Aside, low);
        return PictureStyle.Svg(model, "memory", "Error per round against code distance, simulated and by the law", Height);
    }

    /// <summary>A line of the legend; the fonts of readers are wider than the one it is measured with, and the legend cuts what does not fit.</summary>
    private static string Label(string text) => text + new string('\u00A0', text.Length / 5);

    private static void AddLaw(PlotModel model, MemoryResults results)
    {
        var line = new LineSeries { Title = Label($"law {results.Origin.LawName}"), Color = PictureStyle.Quiet, StrokeThickness = 1.4, LineStyle = LineStyle.Dash };
        foreach (DistanceResult distance in results.Distances)
        {
            if (distance.Law > SmallestDrawn)
            {
                line.Points.Add(new DataPoint(distance.Distance, Math.Log10(distance.Law)));
            }
        }

        if (line.Points.Count > 0)
        {
            model.Series.Add(line);
        }
    }

    private static void AddCounts(
        PlotModel model, ExperimentResult[] run, PauliBasis basis, MarkerType marker, OxyColor colour, double aside, double floor)
    {
        var points = new ScatterSeries { Title = Label($"counted, basis {basis}"), MarkerType = marker, MarkerSize = 5, MarkerFill = colour };
        var bounds = new ScatterSeries
        {
            Title = Label($"no failure, basis {basis}: upper end"),
            MarkerType = marker,
            MarkerSize = 5,
            MarkerFill = OxyColors.White,
            MarkerStroke = colour,
            MarkerStrokeThickness = 1.4,
        };
        foreach (ExperimentResult experiment in run.Where(experiment => experiment.Setting.Basis == basis))
        {
            ErrorEstimate rate = experiment.PerRound!.Value;
            double place = experiment.Setting.Distance + aside;
            var bar = new LineSeries { Color = colour, StrokeThickness = 1.4 };
            bar.Points.Add(new DataPoint(place, rate.Low > SmallestDrawn ? Math.Log10(rate.Low) : floor));
            bar.Points.Add(new DataPoint(place, Math.Log10(rate.High)));
            model.Series.Add(bar);
            (rate.Value > 0 ? points : bounds).Points.Add(new ScatterPoint(place, Math.Log10(rate.Value > 0 ? rate.Value : rate.High)));
        }

        foreach (ScatterSeries series in (ScatterSeries[])[points, bounds])
        {
            if (series.Points.Count > 0)
            {
                model.Series.Add(series);
            }
        }
    }

    private static (double Low, double High) Range(ExperimentResult[] run, ImmutableArray<DistanceResult> distances)
    {
        const double Margin = 0.3;
        double[] drawn =
        [
            .. run.Select(experiment => experiment.PerRound!.Value).SelectMany(rate => (double[])[rate.Low, rate.Value, rate.High]),
            .. distances.Select(distance => distance.Law),
        ];
        double[] logs = [.. drawn.Where(rate => rate > SmallestDrawn).Select(Math.Log10)];
        return (logs.Min() - Margin, logs.Max() + Margin);
    }

    private static List<Tick> Ticks(double low, double high)
    {
        int every = Math.Max(1, (int)Math.Ceiling((high - low) / 8));
        double[] steps = high - low < 2.5 ? [1, 2, 5] : [1];
        List<Tick> ticks = [];
        for (int exponent = (int)Math.Floor(low); exponent <= high; exponent++)
        {
            foreach (double step in steps)
            {
                double place = exponent + Math.Log10(step);
                if (place >= low && place <= high && exponent % every == 0)
                {
                    ticks.Add(new Tick(place, string.Create(CultureInfo.InvariantCulture, $"{step}e{exponent}")));
                }
            }
        }

        return ticks;
    }
}
