"""
Runs every case beside its comparison scripts and prints the table of the README.

    python3 bench.py --jar ../../host/target/modestead.jar [--cases long-kernel,generator] [--repeats 5] [--scale 1] [--readme ../../../README.md]

Each contender is a whole process, start-up and reading of the file included, on the same cores; contenders take turns so that what disturbs the
machine disturbs all. A ratio is the median of this project over the median of a script; beside it stands the spread, (third quartile - first) / median,
of both. Peak memory is the process's largest resident set. The last columns fit the slope of log time over log size through three doublings.
A case counts only where both sides find the same rates.
"""
import argparse
import csv
import json
import math
import os
import shutil
import statistics
import subprocess
import sys
import tempfile
import time

HERE = os.path.dirname(os.path.abspath(__file__))
START, END = "<!-- performance: begin -->", "<!-- performance: end -->"

# name: full size, contenders, step whose modes are compared, how many leading rates, their relative tolerance
CASES = {
    "long-kernel": dict(size=20000, what="snapshots x 32 channels, Gaussian, rank 200, to spectrum and holdout residuals",
                        scripts=("textbook", "expert"), modes=4, tolerance=2e-2),
    "generator": dict(size=400, what="runs x 200 samples x 8 channels, exponential kernel, rank 60, full verdict with ladder",
                      scripts=("textbook", "expert"), modes=4, tolerance=1e-4),
    "bootstrap": dict(size=20000, what="rows x 16 channels, delay-linear of depth 20, 200 resamples",
                      scripts=("textbook", "expert"), modes=5, tolerance=1e-5),
    "start-up": dict(size=1, what="the three-flows workflow", scripts=("expert",), modes=0, tolerance=0),
}


def measured(command, folder):
    """Wall time in seconds and peak memory in bytes of one process."""
    with open(os.path.join(folder, "log.txt"), "ab") as log:
        began = time.monotonic()
        process = subprocess.Popen(command, stdout=log, stderr=log)
        _, status, usage = os.wait4(process.pid, 0)
        seconds = time.monotonic() - began
    if status != 0:
        with open(os.path.join(folder, "log.txt"), encoding="utf-8", errors="replace") as log:
            raise SystemExit("failed: " + " ".join(command) + "\n" + log.read()[-2000:])
    return seconds, usage.ru_maxrss * 1024


def command(contender, case, folder, java):
    if contender == "modestead":
        return java + ["run", folder, "--out", os.path.join(folder, "out")]
    return [sys.executable, os.path.join(HERE, case.replace("-", "_") + "_" + contender + ".py"), folder]


def modes(folder):
    """Leading rates of the project's mode table."""
    with open(os.path.join(folder, "out", "spectrum", "modes.csv"), encoding="utf-8") as table:
        return [complex(float(row["lambda_real"]), float(row["lambda_imag"])) for row in csv.DictReader(table)]


def agreement(case, folder):
    """Largest relative distance of a leading rate of the project from the script's nearest."""
    with open(os.path.join(folder, "result.json"), encoding="utf-8") as result:
        found = json.load(result)
    rates = [complex(a, b) for a, b in zip(found["real"], found["imag"])]
    leading = modes(folder)[:CASES[case]["modes"]]
    return max((min(abs(rate - other) for other in rates) / max(abs(rate), 1e-3) for rate in leading), default=0.0)


def generated(case, size, root):
    sys.path.insert(0, HERE)
    import generate
    folder = os.path.join(root, "%s-%d" % (case, size))
    os.makedirs(folder)
    getattr(generate, case.replace("-", "_"))(folder, size)
    return folder


def spread(values):
    if len(values) < 3:
        return float("nan")
    quarter = statistics.quantiles(values, n=4)
    return (quarter[2] - quarter[0]) / statistics.median(values)


def compared(case, scale, repeats, root, java):
    settings = CASES[case]
    size = max(1, round(settings["size"] * scale)) if case != "start-up" else 1
    folder = generated(case, size, root)
    contenders = ("modestead",) + settings["scripts"]
    seconds = {name: [] for name in contenders}
    memory = {name: 0 for name in contenders}
    apart = {}
    for turn in range(repeats):
        for name in contenders:
            if name == "textbook" and turn >= min(repeats, 3):
                continue
            took, peak = measured(command(name, case, folder, java), folder)
            seconds[name].append(took)
            memory[name] = max(memory[name], peak)
            if name != "modestead" and settings["modes"]:
                apart[name] = agreement(case, folder)
                if not apart[name] <= settings["tolerance"]:
                    raise SystemExit("%s: rates differ from the %s script by %.2g, more than %.2g" % (case, name, apart[name], settings["tolerance"]))
    return dict(case=case, size=size, seconds=seconds, memory=memory, apart=apart)


def slope(case, scale, root, java):
    """Exponent of time over size through three doublings up to the full size."""
    if case == "start-up":
        return float("nan")
    points = []
    for halvings in (3, 2, 1, 0):
        size = max(1, round(CASES[case]["size"] * scale / 2 ** halvings))
        folder = generated(case, size, tempfile.mkdtemp(dir=root))
        points.append((math.log(size), math.log(measured(command("modestead", case, folder, java), folder)[0])))
        shutil.rmtree(folder)
    mean_x = statistics.mean(x for x, _ in points)
    mean_y = statistics.mean(y for _, y in points)
    return sum((x - mean_x) * (y - mean_y) for x, y in points) / sum((x - mean_x) ** 2 for x, _ in points)


def row(result, exponent):
    case, seconds, memory = result["case"], result["seconds"], result["memory"]
    middle = {name: statistics.median(values) for name, values in seconds.items()}

    def ratio(name):
        if name not in middle:
            return "-"
        return "%.2f (± %s)" % (middle["modestead"] / middle[name], percent(spread(seconds["modestead"]), spread(seconds[name])))

    def cell(name):
        return "-" if name not in middle else "%.2f s, %.2f GB" % (middle[name], memory[name] / 1e9)

    what = CASES[case]["what"] if case == "start-up" else "%d %s" % (result["size"], CASES[case]["what"])
    return "| %s: %s | %s | %s | %s | %s | %s | %s | %s |" % (case, what, cell("modestead"), cell("textbook"), cell("expert"), ratio("textbook"),
                                                     ratio("expert"), "-" if math.isnan(exponent) else "%.2f" % exponent,
                                                     "-" if not result["apart"] else "%.1g" % max(result["apart"].values()))


def percent(first, second):
    if math.isnan(first) or math.isnan(second):
        return "?"
    return "%.0f %%" % (100 * math.hypot(first, second))


def written(readme, lines):
    with open(readme, encoding="utf-8") as given:
        text = given.read()
    if START not in text or END not in text:
        raise SystemExit("%s has no place for the table: %s ... %s" % (readme, START, END))
    before, rest = text.split(START, 1)
    after = rest.split(END, 1)[1]
    with open(readme, "w", encoding="utf-8") as out:
        out.write(before + START + "\n" + "\n".join(lines) + "\n" + END + after)


def machine():
    import numpy
    import scipy
    model = "unknown processor"
    if os.path.exists("/proc/cpuinfo"):
        with open("/proc/cpuinfo", encoding="utf-8") as info:
            names = [line.split(":", 1)[1].strip() for line in info if line.startswith("model name")]
            model = names[0] if names else model
    return "%d cores of %s; NumPy %s, SciPy %s, Python %s" % (os.cpu_count(), model, numpy.__version__, scipy.__version__, sys.version.split()[0])


def main():
    parser = argparse.ArgumentParser(description=__doc__.split("\n\n")[0].strip())
    parser.add_argument("--jar", required=True)
    parser.add_argument("--java", default="java", help="command that starts Java, with options")
    parser.add_argument("--cases", default=",".join(CASES))
    parser.add_argument("--repeats", type=int, default=5)
    parser.add_argument("--scale", type=float, default=1, help="of the sizes, to try the harness")
    parser.add_argument("--no-slope", action="store_true", help="leave out the runs at an eighth, a quarter and half of the size")
    parser.add_argument("--readme", help="write the table there, between its marks")
    arguments = parser.parse_args()
    java = arguments.java.split() + ["-jar", os.path.abspath(arguments.jar)]
    lines = ["Measured on %s." % machine(), "",
             "| case | this project | textbook | expert | / textbook | / expert | slope | rates apart |", "|---|---|---|---|---|---|---|---|"]
    root = tempfile.mkdtemp(prefix="modestead-bench-")
    try:
        for case in arguments.cases.split(","):
            result = compared(case, arguments.scale, arguments.repeats, root, java)
            exponent = float("nan") if arguments.no_slope else slope(case, arguments.scale, root, java)
            lines.append(row(result, exponent))
            print(lines[-1], flush=True)
    finally:
        shutil.rmtree(root)
    print("\n".join(lines))
    if arguments.readme and arguments.scale == 1:
        written(arguments.readme, lines)


if __name__ == "__main__":
    main()
