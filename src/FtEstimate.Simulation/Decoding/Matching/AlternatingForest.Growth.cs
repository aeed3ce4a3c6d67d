namespace FtEstimate.Simulation.Decoding.Matching;

// Each vertex under a growing region has an event in the queue, not after the first time at which something happens on one of its edges.
// What slows a neighbour down needs no new event: an event that comes too early looks again. What speeds it up announces itself.
internal sealed partial class AlternatingForest
{
    private readonly record struct Meeting(long Time, HalfEdge Along);

    /// <summary>Deals with all that happens now on the edges of a vertex.</summary>
    private void Attend(int vertex)
    {
        while (IsGrowing(vertex))
        {
            Meeting first = FirstMeeting(vertex);
            if (first.Time > now)
            {
                Schedule(vertex, first.Time);
                return;
            }

            ref CoveredVertex here = ref vertices[vertex];
            int other = first.Along.Other;
            int source = here.Source ^ first.Along.Parity;
            if (other < 0)
            {
                MeetBoundary(here.Top, new TightPath(source >> 1, -2 | (source & 1)));
            }
            else if (vertices[other].Top < 0)
            {
                Arrive(here.Top, other, source);
            }
            else
            {
                int there = vertices[other].Source ^ (source & 1);
                Meet(here.Top, vertices[other].Top, new TightPath(source >> 1, there));
            }
        }
    }

    /// <summary>The first thing to happen on the edges of a vertex under a growing region, if nothing changes before.</summary>
    private Meeting FirstMeeting(int vertex)
    {
        ref CoveredVertex here = ref vertices[vertex];
        long reach = here.Offset + regions[here.Top].Intercept;
        long earliest = Never;
        HalfEdge along = default;
        foreach (HalfEdge half in edges.At(vertex))
        {
            long time = half.Weight - reach;
            if (half.Other >= 0)
            {
                ref CoveredVertex there = ref vertices[half.Other];
                if (there.Top >= 0)
                {
                    ref Region region = ref regions[there.Top];
                    if (there.Top == here.Top || region.Slope < 0)
                    {
                        continue;
                    }

                    time = (time - there.Offset - region.Intercept) >> region.Slope;
                }
            }

            if (time < earliest)
            {
                earliest = time;
                along = half;
            }
        }

        return new Meeting(earliest, along);
    }

    /// <summary>Takes a vertex into account whose region has begun to grow or has arrived; growing neighbours are told.</summary>
    private void Begin(int vertex)
    {
        ref CoveredVertex here = ref vertices[vertex];
        long reach = here.Offset + regions[here.Top].Intercept;
        long earliest = Never;
        foreach (HalfEdge half in edges.At(vertex))
        {
            long time = half.Weight - reach;
            if (half.Other >= 0)
            {
                ref CoveredVertex there = ref vertices[half.Other];
                if (there.Top >= 0)
                {
                    ref Region region = ref regions[there.Top];
                    if (there.Top == here.Top || region.Slope < 0)
                    {
                        continue;
                    }

                    time = (time - there.Offset - region.Intercept) >> region.Slope;
                    if (region.Slope > 0)
                    {
                        Schedule(half.Other, Math.Max(time, now));
                    }
                }
            }

            earliest = Math.Min(earliest, time);
        }

        if (earliest < Never)
        {
            Schedule(vertex, Math.Max(earliest, now));
        }
    }

    /// <summary>Tells growing neighbours when they meet a vertex that is free or whose region does not shrink.</summary>
    private void Announce(int vertex)
    {
        ref CoveredVertex here = ref vertices[vertex];
        int slope = here.Top < 0 ? 0 : regions[here.Top].Slope;
        long reach = here.Top < 0 ? 0 : here.Offset + regions[here.Top].Intercept;
        foreach (HalfEdge half in edges.At(vertex))
        {
            if (half.Other >= 0 && IsGrowing(half.Other))
            {
                ref CoveredVertex there = ref vertices[half.Other];
                if (there.Top != here.Top)
                {
                    long time = (half.Weight - reach - there.Offset - regions[there.Top].Intercept) >> slope;
                    Schedule(half.Other, Math.Max(time, now));
                }
            }
        }
    }

    private void Arrive(int region, int vertex, int source)
    {
        ref CoveredVertex here = ref vertices[vertex];
        if (here.Owner == Unseen)
        {
            Touch(vertex);
        }

        here.Top = region;
        here.Owner = region;
        here.Offset = -regions[region].RadiusAt(now);
        here.Source = source;
        here.Below = regions[region].LastVertex;
        regions[region].LastVertex = vertex;
        Begin(vertex);
    }

    /// <summary>Lets a shrinking region leave the vertices it no longer reaches; at radius 0 it gives way.</summary>
    private void Shrink(int region)
    {
        while (regions[region].Slope < 0)
        {
            ref Region it = ref regions[region];
            long radius = it.RadiusAt(now);
            bool isBare = it.LastVertex < 0 || (it.Child < 0 && vertices[it.LastVertex].Below < 0);
            long next = isBare ? 0 : -vertices[it.LastVertex].Offset;
            if (radius > next)
            {
                ScheduleShrinking(region, now + radius - next);
                return;
            }

            if (!isBare)
            {
                int left = it.LastVertex;
                it.LastVertex = vertices[left].Below;
                vertices[left].Top = -1;
                vertices[left].Owner = Left;
                Announce(left);
            }
            else if (it.Child < 0)
            {
                Squeeze(region);
            }
            else
            {
                Shatter(region);
            }
        }
    }

    private bool IsGrowing(int vertex)
    {
        int top = vertices[vertex].Top;
        return top >= 0 && regions[top].Slope > 0;
    }

    private void Schedule(int vertex, long time)
    {
        ref CoveredVertex here = ref vertices[vertex];
        if (time < here.Queued)
        {
            here.Queued = time;
            queue.Add(time, vertex);
        }
    }

    private void ScheduleShrinking(int region, long time)
    {
        if (time < regions[region].Queued)
        {
            regions[region].Queued = time;
            queue.Add(time, ~region);
        }
    }
}
