"""
Runs every case beside its comparison scripts and prints the table of the README.

    python3 bench.py --jar ../../host/target/modestead.jar [--cases long-kernel,generator] [--minutes 45] [--scale 1] [--readme ../../../README.md]

Each contender is a whole process, start-up and reading of the file included, on the same cores; contenders take turns so that what disturbs the
machine disturbs all. A ratio is the median of this project over the median of a script; beside it stands the spread, (largest - smallest) / median
of the times of both, added as squares. Peak memory is that of the largest process. The slope is that of log time over log size through three doublings.
A ratio counts only where both sides find the same rates: the column tells how far apart they are, relatively, and what is allowed.
A script that needs long is run once, and stopped after four minutes; whatever is left out because the time is over is told in the table.
"""
import argparse
import csv
import json
import math
import os
import shutil
import signal
import statistics
import subprocess
import sys
import tempfile
import time

HERE = os.path.dirname(os.path.abspath(__file__))
START, END = "<!-- performance: begin -->", "<!-- performance: end -->"
PATIENCE = 240

# name: full size, what it is, contenders, how many leading rates are compared, their relative tolerance, how often it is run, Java's options
CASES = {
    "start-up": dict(size=1, what="the three-flows workflow", scripts=("expert",), modes=0, tolerance=0, repeats=5, only=()),
    "tall": dict(size=200000, what="states x 300 snapshots, rank 30, from an NPY file to the mode table (Java may take 7.5 GB)",
                 scripts=("textbook", "expert"), modes=30, tolerance=1e-6, repeats=3, java="-Xmx7500m"),
    "long-kernel": dict(size=20000, what="snapshots x 32 channels, Gaussian, rank 200, to spectrum and holdout residuals",
                        scripts=("textbook", "expert"), modes=4, tolerance=2e-2, repeats=3, only=("spectrum.modes", "check.findings")),
    "generator": dict(size=400, what="runs x 200 samples x 8 channels, exponential kernel, rank 60, full verdict with ladder",
                      scripts=("textbook", "expert"), modes=4, tolerance=1e-4, repeats=3, only=("spectrum.modes", "check.findings", "check.ladder"),
                      doublings=(1, -1, -2)),  # below a hundred runs there is no rank 60
    "bootstrap": dict(size=20000, what="rows x 16 channels, delay-linear of depth 20, 200 resamples",
                      scripts=("textbook", "expert"), modes=5, tolerance=1e-5, repeats=3),
    "csv": dict(size=2000000, what="rows x 16 channels of CSV to the forecast table",
                scripts=("textbook", "expert"), modes=10, tolerance=1e-7, repeats=3, only=("spectrum.modes", "forecast.forecast")),
    "scale": dict(size=1000000, what="snapshots x 64 channels, Gaussian, rank 300, from an NPY file to the mode table",
                  scripts=("textbook", "expert"), modes=2, tolerance=2e-2, repeats=1),
    "out-of-core": dict(size=100000000, what="rows x 4 channels of Parquet, delay-linear of depth 4, to the mode table (Java may take 512 MB)",
                        scripts=(), modes=2, tolerance=1e-6, repeats=1, java="-Xmx512m", slope=False),
}


class Stopped(Exception):
    """A process that gave no result: in a few words why."""


def measured(command, folder, options=""):
    """Wall time in seconds and peak memory in bytes of one process."""
    place = os.path.join(folder, "log.txt")
    with open(place, "wb") as log:
        began = time.monotonic()
        process = subprocess.Popen(command, stdout=log, stderr=log, env=dict(os.environ, MODESTEAD_OPTIONS=options), start_new_session=True)
        status = None
        while status is None:
            done, code, usage = os.wait4(process.pid, os.WNOHANG)
            seconds = time.monotonic() - began
            if done:
                status = code
            elif seconds > PATIENCE and options != "-Xmx512m":
                os.killpg(process.pid, signal.SIGKILL)
                os.wait4(process.pid, 0)
                raise Stopped("stopped after %d s" % PATIENCE)
            else:
                time.sleep(0.005)
    if status != 0:
        with open(place, encoding="utf-8", errors="replace") as log:
            text = log.read()
        if "MemoryError" in text or os.WIFSIGNALED(status):
            raise Stopped("out of memory")
        sys.stderr.write("failed: " + " ".join(command) + "\n" + text[-2000:] + "\n")
        raise Stopped("failed")
    return seconds, usage.ru_maxrss * 1024


def command(contender, case, folder, program):
    if contender == "modestead":
        only = CASES[case].get("only", ("spectrum.modes",))
        return [program, "run", folder, "--out", os.path.join(folder, "out")] + [word for table in only for word in ("--only", table)]
    return [sys.executable, os.path.join(HERE, case.replace("-", "_") + "_" + contender + ".py"), folder]


def modes(folder):
    """Leading rates of the project's mode table."""
    with open(os.path.join(folder, "out", "spectrum", "modes.csv"), encoding="utf-8") as table:
        return [complex(float(row["lambda_real"]), float(row["lambda_imag"])) for row in csv.DictReader(table)]


def agreement(case, folder):
    """Largest relative distance of a leading rate of the project from the nearest of the script, or of what the input was made of."""
    with open(os.path.join(folder, "result.json"), encoding="utf-8") as result:
        found = json.load(result)
    rates = [complex(a, b) for a, b in zip(found["real"], found["imag"])]
    leading = modes(folder)[:CASES[case]["modes"]]
    return max((min(abs(rate - other) for other in rates) / max(abs(rate), 1e-3) for rate in leading), default=float("inf"))


def generated(case, size, root, program):
    """Makes the input in a process of its own: what a parent ever held counts as peak memory of the processes that it starts later."""
    folder = tempfile.mkdtemp(prefix="%s-%d-" % (case, size), dir=root)
    name, rest = case.replace("-", "_"), [program] if case == "out-of-core" else []
    code = "import sys; sys.path.insert(0, sys.argv[1]); import generate; getattr(generate, sys.argv[2])(sys.argv[3], int(sys.argv[4]), *sys.argv[5:])"
    subprocess.run([sys.executable, "-c", code, HERE, name, folder, str(size), *rest], check=True)
    return folder


def spread(values):
    return (max(values) - min(values)) / statistics.median(values) if len(values) > 1 else float("nan")


def compared(case, scale, root, program, deadline):
    settings = CASES[case]
    size = max(1, round(settings["size"] * scale)) if case != "start-up" else 1
    folder = generated(case, size, root, program)
    contenders = ("modestead",) + settings["scripts"]
    seconds, memory, apart, stopped = {name: [] for name in contenders}, {name: 0 for name in contenders}, {}, {}
    for turn in range(settings["repeats"]):
        if turn > 0 and time.monotonic() > deadline:
            break
        for name in contenders:
            if name in stopped or name == "textbook" and turn > 0 and seconds[name][0] > 30:
                continue
            try:
                took, peak = measured(command(name, case, folder, program), folder, settings.get("java", "") if name == "modestead" else "")
            except Stopped as why:
                stopped[name] = str(why)
                continue
            seconds[name].append(took)
            memory[name] = max(memory[name], peak)
            if settings["modes"] and "modestead" not in stopped and (name != "modestead" or not settings["scripts"]):
                apart[name] = max(apart.get(name, 0), agreement(case, folder))
        print(case, {name: ["%.2f" % value for value in values] for name, values in seconds.items()}, stopped, apart, file=sys.stderr, flush=True)
    shutil.rmtree(folder)
    return dict(case=case, size=size, seconds=seconds, memory=memory, apart=apart, stopped=stopped)


def slope(result, scale, root, program, deadline):
    """Exponent of time over size through three doublings, up to the full size where the smallest is possible."""
    case = result["case"]
    if case == "start-up" or not CASES[case].get("slope", True) or not result["seconds"]["modestead"]:
        return float("nan")
    points = [(math.log(result["size"]), math.log(statistics.median(result["seconds"]["modestead"])))]
    for doubling in CASES[case].get("doublings", (-1, -2, -3)):
        if time.monotonic() > deadline:
            return float("nan")
        size = max(1, round(CASES[case]["size"] * scale * 2.0 ** doubling))
        folder = generated(case, size, root, program)
        try:
            took = measured(command("modestead", case, folder, program), folder, CASES[case].get("java", ""))[0]
        except Stopped:
            return float("nan")
        points.append((math.log(size), math.log(took)))
        shutil.rmtree(folder)
    print(case, "sizes and times", [("%.0f" % math.exp(x), "%.2f" % math.exp(y)) for x, y in points], file=sys.stderr, flush=True)
    mean_x = statistics.mean(x for x, _ in points)
    mean_y = statistics.mean(y for _, y in points)
    return sum((x - mean_x) * (y - mean_y) for x, y in points) / sum((x - mean_x) ** 2 for x, _ in points)


def row(result, exponent):
    case, seconds, memory, stopped = result["case"], result["seconds"], result["memory"], result["stopped"]
    tolerance = CASES[case]["tolerance"]
    middle = {name: statistics.median(values) for name, values in seconds.items() if values}

    def ratio(name):
        if "modestead" in middle and stopped.get(name, "").startswith("stopped"):
            return "below %.2f" % (math.ceil(100 * middle["modestead"] / PATIENCE) / 100)
        if name not in middle or "modestead" not in middle:
            return "-"
        if CASES[case]["modes"] and not result["apart"].get(name, 0) <= tolerance:
            return "not counted"
        return "%.2f (± %s)" % (middle["modestead"] / middle[name], percent(spread(seconds["modestead"]), spread(seconds[name])))

    def cell(name):
        if name not in middle:
            return stopped.get(name, "-")
        once = ", once" if len(seconds[name]) == 1 else ""
        return "%.2f s, %.2f GB%s" % (middle[name], memory[name] / 1e9, once)

    what = CASES[case]["what"] if case == "start-up" else "%d %s" % (result["size"], CASES[case]["what"])
    return "| %s: %s | %s | %s | %s | %s | %s | %s | %s |" % (
        case, what, cell("modestead"), cell("textbook"), cell("expert"), ratio("textbook"), ratio("expert"),
        "-" if math.isnan(exponent) else "%.2f" % exponent,
        "-" if not result["apart"] else "%s, %.0g allowed" % (" and ".join("%.1g" % value for value in result["apart"].values()), tolerance))


def percent(first, second):
    if math.isnan(first) or math.isnan(second):
        return "once"
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
    versions = subprocess.run([sys.executable, "-c", "import numpy, scipy; print('NumPy %s, SciPy %s' % (numpy.__version__, scipy.__version__))"],
                              check=True, capture_output=True, text=True).stdout.strip()
    model = "unknown processor"
    if os.path.exists("/proc/cpuinfo"):
        with open("/proc/cpuinfo", encoding="utf-8") as info:
            names = [line.split(":", 1)[1].strip() for line in info if line.startswith("model name")]
            model = names[0] if names else model
    return "%d cores of %s; %s, Python %s" % (os.cpu_count(), model, versions, sys.version.split()[0])


def main():
    parser = argparse.ArgumentParser(description=__doc__.split("\n\n")[0].strip())
    parser.add_argument("--jar", required=True, help="the runnable jar; the launch script beside it is what is run")
    parser.add_argument("--cases", default=",".join(CASES))
    parser.add_argument("--minutes", type=float, default=45, help="after which nothing is repeated and no slope is measured any more")
    parser.add_argument("--scale", type=float, default=1, help="of the sizes, to try the harness")
    parser.add_argument("--no-slope", action="store_true", help="leave out the runs at an eighth, a quarter and half of the size")
    parser.add_argument("--readme", help="write the table there, between its marks")
    arguments = parser.parse_args()
    program = os.path.join(os.path.dirname(os.path.abspath(arguments.jar)), "modestead")
    deadline = time.monotonic() + 60 * arguments.minutes
    lines = ["Measured on %s." % machine(), "",
             "| case | this project | textbook | expert | / textbook | / expert | slope | rates apart |", "|---|---|---|---|---|---|---|---|"]
    root = tempfile.mkdtemp(prefix="modestead-bench-")
    try:
        warm = generated("start-up", 1, root, program)
        measured(command("modestead", "start-up", warm, program), warm)
        for case in arguments.cases.split(","):
            try:
                result = compared(case, arguments.scale, root, program, deadline)
                exponent = float("nan") if arguments.no_slope else slope(result, arguments.scale, root, program, deadline)
                lines.append(row(result, exponent))
            except Exception as failure:  # a case that cannot be made must not take the others with it
                sys.stderr.write("%s: %r\n" % (case, failure))
                lines.append("| %s: %s | could not be measured | - | - | - | - | - | - |" % (case, CASES[case]["what"]))
            print(lines[-1], flush=True)
            if arguments.readme and arguments.scale == 1:
                written(arguments.readme, lines)
    finally:
        shutil.rmtree(root)
    print("\n".join(lines))


if __name__ == "__main__":
    main()
