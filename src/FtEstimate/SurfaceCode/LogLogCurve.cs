namespace FtEstimate.SurfaceCode;

/// <summary>A curve of straight lines between points in log-log scale, continued beyond both ends.</summary>
/// <remarks>Logarithms and slopes are taken once, so that a value costs a few additions and no memory.</remarks>
internal sealed class LogLogCurve
{
    private readonly double[] logX;
    private readonly double[] logY;
    private readonly double[] slopes;

    /// <summary>A curve through at least two points with growing x; all values above 0.</summary>
    public LogLogCurve(double[] x, double[] y)
    {
        logX = Array.ConvertAll(x, Math.Log);
        logY = Array.ConvertAll(y, Math.Log);
        slopes = new double[x.Length - 1];
        for (int i = 0; i < slopes.Length; i++)
        {
            slopes[i] = (logY[i + 1] - logY[i]) / (logX[i + 1] - logX[i]);
        }
    }

    /// <summary>ln y at ln x.</summary>
    public double At(double logarithm)
    {
        int interval = 0;
        while (interval < slopes.Length - 1 && logarithm > logX[interval + 1])
        {
            interval++;
        }

        return logY[interval] + slopes[interval] * (logarithm - logX[interval]);
    }
}
