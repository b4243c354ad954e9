"""Reference lengths and ascents of recorded tracks, by an independent parser
and an independent geodesic library. From testdata/, after `npm ci`:

    apt-get install python3-gpxpy geographiclib-tools
    python3 tracks/reference.py > tracks/reference.tsv

The parser is Debian's python3-gpxpy, the distances are GeodSolve's of Debian's
geographiclib-tools; segments are summed each for itself.
"""
import subprocess

import gpxpy

FILES = """stoplight/gpx/sample-ride.gpx
togeojson/test/data/blue_hills.gpx
togeojson/test/data/multitrackgpx.gpx
togeojson/test/data/run.gpx
gps-distance/test/oregon.gpx
gpx-parse/tests/integration/data/route-1.1.gpx
gpxparser/test/test.xml""".split()


def length(points):
    legs = zip(points, points[1:])
    text = "".join("%.10f %.10f %.10f %.10f\n" % (a.latitude, a.longitude, b.latitude, b.longitude) for a, b in legs)
    out = subprocess.run(["GeodSolve", "-i", "-p", "6"], input=text, capture_output=True, text=True, check=True).stdout
    return sum(float(line.split()[2]) for line in out.splitlines())


def rises(points):
    heights = [p.elevation for p in points if p.elevation is not None]
    return sum(max(0, b - a) for a, b in zip(heights, heights[1:]))


def steady_rises(points, step):
    """Rises of at least a step (hysteresis), the usual guard against noise."""
    heights = [p.elevation for p in points if p.elevation is not None]
    total, base = 0, heights[0]
    for h in heights:
        if abs(h - base) >= step:
            total += max(0, h - base)
            base = h
    return total


print("file\ttrack\tsegments\tpoints\tlength_m\tascent_m\tascent_5m_steps_m")
for name in FILES:
    with open("node_modules/" + name, encoding="utf-8") as f:
        track = gpxpy.parse(f).tracks[0]
    segments = [s.points for s in track.segments if s.points]
    points = [p for s in segments for p in s]
    print("\t".join([name, track.name or "", str(len(segments)), str(len(points)), "%.3f" % sum(length(s) for s in segments if len(s) > 1),
                     "%.3f" % sum(rises(s) for s in segments), "%.3f" % steady_rises(points, 5)]))
