"""Makes the invented recordings of this folder: python3 make_recordings.py (standard library only)."""
import math
import random

# frequency in Hz (damped), damping ratio, shape over the stations, size in mHz after the trip
SWINGS = [
    (0.42, 0.045, (1.00, 0.80, 0.15, -0.55, -0.70), 38),
    (1.12, 0.085, (0.55, -1.00, 0.10, 0.05, -0.05), 24),
]
RECOVERY = (-1 / 9, (1.00, 0.98, 1.02, 1.00, 0.97), -55)  # rate in 1/s, shape, size in mHz: governors bring the frequency back
CHANNELS = ["north [mHz]", "north east [mHz]", "centre [mHz]", "south [mHz]", "coast [mHz]"]
EVENTS, SAMPLES, STEP, NOISE = 12, 250, 0.1, 0.5

draw = random.Random(20260418)
with open("recordings.csv", "w", newline="\n") as out:
    out.write("event,time," + ",".join(CHANNELS) + "\n")
    for event in range(EVENTS):
        started = [(size * (0.6 + 0.8 * draw.random()), 2 * math.pi * draw.random()) for *_, size in SWINGS]
        dip = RECOVERY[2] * (0.6 + 0.8 * draw.random())
        for k in range(SAMPLES):
            t = k * STEP
            values = [draw.gauss(0, NOISE) + part * dip * math.exp(RECOVERY[0] * t) for part in RECOVERY[1]]
            for (frequency, damping, shape, _), (size, phase) in zip(SWINGS, started):
                omega = 2 * math.pi * frequency
                decay = damping * omega / math.sqrt(1 - damping ** 2)
                swing = size * math.exp(-decay * t) * math.cos(omega * t + phase)
                values = [value + part * swing for value, part in zip(values, shape)]
            out.write(f"e{event + 1:02d},{t:.1f}," + ",".join(f"{value:.3f}" for value in values) + "\n")
