using FtEstimate.Cycles;
using FtEstimate.Machines;

namespace FtEstimate.Tests.Cycles;

public sealed class MoveTimeTests
{
    public static TheoryData<double, double, double> Published
    {
        get
        {
            TheoryData<double, double, double> rows = [];
            foreach (double[] row in PublishedTable.Rows("move-times.csv"))
            {
                rows.Add(row[0], row[1], row[2]);
            }

            return rows;
        }
    }

    // the table is rounded to whole microseconds
    [Theory]
    [MemberData(nameof(Published))]
    public void Published_laws_give_the_published_times(double micrometres, double bangBangMicroseconds, double cubicMicroseconds)
    {
        double bangBang = MoveTime.Seconds(MoveProfile.BangBang, micrometres * 1e-6, 5500);
        double cubic = MoveTime.Seconds(MoveProfile.Cubic, micrometres * 1e-6, 10125);

        Assert.Equal(bangBangMicroseconds, bangBang * 1e6, 0.5);
        Assert.Equal(cubicMicroseconds, cubic * 1e6, 0.5);
    }

    // kinematics: the profile, run for the stated time, nowhere accelerates harder than stated and does so somewhere
    [Theory]
    [InlineData(MoveProfile.Cubic)]
    [InlineData(MoveProfile.AdiabaticSine)]
    [InlineData(MoveProfile.BangBang)]
    public void The_largest_acceleration_along_the_way_is_the_stated_one(MoveProfile profile)
    {
        const double Distance = 55e-6;
        const double Acceleration = 8250;
        const int Steps = 2000;
        double seconds = MoveTime.Seconds(profile, Distance, Acceleration);
        double step = seconds / Steps;

        double largest = Enumerable.Range(1, Steps - 1).Max(i =>
            Math.Abs(Place(i + 1) - (2 * Place(i)) + Place(i - 1)) / (step * step));

        // second differences over 2000 steps are off by a few steps' worth of change
        Assert.Equal(1, largest / Acceleration, 2e-3);

        double Place(int i) => Distance * ShareOfWay(profile, (double)i / Steps);
    }

    // Manetsch 2025 (arXiv:2403.12021): 610 um in 1.6 ms by the adiabatic sine; a = 2 pi D / T^2
    [Fact]
    public void A_move_of_610_um_in_1_6_ms_needs_1500_m_per_s2_by_the_adiabatic_sine() =>
        Assert.Equal(1.6e-3, MoveTime.Seconds(MoveProfile.AdiabaticSine, 610e-6, 1497), 1e-6);

    private static double ShareOfWay(MoveProfile profile, double time) => profile switch
    {
        MoveProfile.Cubic => (3 * time * time) - (2 * time * time * time),
        MoveProfile.AdiabaticSine => ((Math.Sin(Math.PI * ((2 * time) - 1)) / Math.PI) + ((2 * time) - 1) + 1) / 2,
        _ => time < 0.5 ? 2 * time * time : 1 - (2 * (1 - time) * (1 - time)),
    };
}
