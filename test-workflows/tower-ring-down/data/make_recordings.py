"""Makes the invented recordings of this folder: python3 make_recordings.py (standard library only)."""
import math
import random

# name, frequency in Hz (damped), damping ratio, shape over the channels, size at release
MODES = [
    ("first sway east-west", 1.18, 0.014, (1.00, 0.05, 0.62, 0.03, 0.30), 40),
    ("first sway north-south", 1.31, 0.017, (-0.04, 1.00, -0.03, 0.60, -0.02), 28),
    ("twist", 1.93, 0.021, (0.35, 0.80, 0.22, 0.50, 0.10), 16),
    ("second sway east-west", 3.86, 0.024, (1.00, 0.03, -0.55, -0.02, -0.95), 14),
]
CHANNELS = ["roof ew [mg]", "roof ns [mg]", "floor 7 ew [mg]", "floor 7 ns [mg]", "floor 4 ew [mg]"]
RELEASES, SAMPLES, STEP, NOISE = 10, 500, 0.04, 0.4

draw = random.Random(20260311)
with open("recordings.csv", "w", newline="\n") as out:
    out.write("release,time," + ",".join(CHANNELS) + "\n")
    for release in range(RELEASES):
        started = [(size * (0.6 + 0.8 * draw.random()), 2 * math.pi * draw.random()) for *_, size in MODES]
        for k in range(SAMPLES):
            t = k * STEP
            values = [draw.gauss(0, NOISE) for _ in CHANNELS]
            for (_, frequency, damping, shape, _), (size, phase) in zip(MODES, started):
                omega = 2 * math.pi * frequency
                decay = damping * omega / math.sqrt(1 - damping ** 2)
                swing = size * math.exp(-decay * t) * math.cos(omega * t + phase)
                values = [value + part * swing for value, part in zip(values, shape)]
            out.write(f"r{release + 1:02d},{t:.2f}," + ",".join(f"{value:.3f}" for value in values) + "\n")
