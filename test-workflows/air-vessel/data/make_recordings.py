"""Makes the invented recordings of this folder: python3 make_recordings.py (standard library only)."""
import datetime
import math
import random

STOPS = {"normal.csv": (48, 5, lambda stop: 1.0), "later.csv": (36, 6, lambda stop: 1.0 if stop < 18 else 0.96)}
START = {"normal.csv": datetime.datetime(2026, 3, 2, 6), "later.csv": datetime.datetime(2026, 4, 6, 6)}


def ring(t, frequency, damping, size, phase):
    omega = 2 * math.pi * frequency
    turned = omega * math.sqrt(1 - damping ** 2) * t + phase
    faded = size * math.exp(-damping * omega * t)
    return faded * math.cos(turned), faded * math.sin(turned)


for name, (stops, seed, volume) in STOPS.items():
    draw = random.Random(seed)
    with open(name, "w", newline="\n") as out:
        out.write("stop,time,pressure [bar],vessel level [m],flow [l/s]\n")
        for stop in range(stops):
            begin = START[name] + datetime.timedelta(hours=6 * stop)
            scatter = 1 + draw.gauss(0, 0.005)
            surge = 0.11 / math.sqrt(volume(stop)) * scatter
            size, phase = 1 + 0.3 * draw.random(), 0.3 * draw.gauss(0, 1)
            branch, turn = 0.5 + 0.5 * draw.random(), 2 * math.pi * draw.random()
            for k in range(120):
                a, b = ring(k, surge, 0.015, size, phase)
                c, d = ring(k, 0.31, 0.03, branch, turn)
                pressure = 4.2 + 0.8 * a + 0.3 * c + draw.gauss(0, 0.02)
                level = 1.6 + 0.25 * a - 0.01 * c + draw.gauss(0, 0.006)
                flow = 22 * b + 14 * d + draw.gauss(0, 0.5)
                time = begin + datetime.timedelta(seconds=k)
                out.write(f"{name[0]}{stop + 1:02d},{time:%Y-%m-%d %H:%M:%S},{pressure:.3f},{level:.4f},{flow:.2f}\n")
