"""Reference legs on WGS84 by GeodSolve (Debian geographiclib-tools); see README.md."""
import random
import subprocess

random.seed(1)
legs = []
for exponent in (-1, 0, 1, 2, 3, 4, 5):
    for lat in (-85, -47.3, -10, 0, 23.4, 47, 61.2, 80):
        lon, bearing = random.uniform(-180, 180), random.uniform(-180, 180)
        out = subprocess.run(["GeodSolve", "-p", "7"], input="%.10f %.10f %.6f %.6f\n" % (lat, lon, bearing, 10.0**exponent),
                             capture_output=True, text=True, check=True).stdout.split()
        legs.append("%.10f %.10f %s %s" % (lat, lon, out[0], out[1]))
out = subprocess.run(["GeodSolve", "-i", "-p", "7"], input="\n".join(legs) + "\n", capture_output=True, text=True, check=True).stdout
print("lat1\tlon1\tlat2\tlon2\tbearing1_deg\tbearing2_deg\tlength_m")
for leg, answer in zip(legs, out.splitlines()):
    print("\t".join(leg.split() + answer.split()))
