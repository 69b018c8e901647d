"""Inputs of the cases: data files and workflows, the same bytes for the same size."""
import json
import os
from multiprocessing import Pool
import numpy as np

CHECK = {"from": "snapshots.snapshots", "to": "check.snapshots"}


def long_kernel(folder, size):
    """A motion on a torus seen through 32 bent channels with a little noise; the last fifth judges."""
    rng = np.random.default_rng(1)
    rows = size * 5 // 4
    t = np.arange(rows) * 0.02
    a, b = 2 * np.pi * 0.31 * t, 2 * np.pi * 0.097 * t
    state = np.stack([np.cos(a), np.sin(a), np.cos(b), np.sin(b)], 1)
    x = np.tanh(0.6 * state @ rng.normal(size=(4, 32))) + 0.02 * rng.normal(size=(rows, 32))
    table(folder, t, x)
    workflow(folder, "long kernel", [
        source(), step("snapshots", "snapshot-builder", {"time-column": "time", "holdout": "tail-share", "holdout-tail-share": 0.2}),
        step("kernel", "kernel-chooser", {"family": "gaussian", "scale-mode": "explicit", "scale": 4}),
        step("fit", "operator-fitter", {"estimator": "kernel-step", "landmarks": 200, "rank-rule": "fixed", "rank": 200}),
        step("spectrum", "spectrum-extractor", {"intervals": "none"}),
        step("check", "wellposedness-checker", {"extent": "residuals"})], kernel=True, check=True)


def generator(folder, size):
    """Runs of a linear flow of four damped rhythms; the last fifth of the runs judges."""
    rng = np.random.default_rng(2)
    step_matrix = np.zeros((8, 8))
    for k in range(4):
        angle, fade = 2 * np.pi * (0.2 + 0.15 * k) * 0.005, np.exp(-0.1 * (k + 1) * 0.005)
        step_matrix[2 * k:2 * k + 2, 2 * k:2 * k + 2] = fade * np.array([[np.cos(angle), -np.sin(angle)], [np.sin(angle), np.cos(angle)]])
    runs = size * 5 // 4
    x = np.empty((runs, 200, 8))
    x[:, 0] = rng.uniform(-0.6, 0.6, (runs, 8))
    for k in range(1, 200):
        x[:, k] = x[:, k - 1] @ step_matrix.T
    names = np.repeat(np.arange(runs), 200)
    table(folder, np.tile(np.arange(200) * 0.005, runs), x.reshape(-1, 8), names)
    workflow(folder, "generator", [
        source(), step("snapshots", "snapshot-builder", {"time-column": "time", "run-column": "run", "holdout": "run-share", "holdout-run-share": 0.2}),
        step("kernel", "kernel-chooser", {"family": "exponential"}),
        step("fit", "operator-fitter", {"estimator": "generator", "segment-samples": 0, "rank-rule": "fixed", "rank": 60}),
        step("spectrum", "spectrum-extractor", {"intervals": "none"}),
        step("check", "wellposedness-checker", {})], kernel=True, check=True)


def bootstrap(folder, size):
    """Five oscillators driven by noise, seen by 16 channels."""
    rng = np.random.default_rng(3)
    rows, step_time = size, 0.01
    y = np.zeros((rows, 16))
    for f in (0.7, 1.3, 2.1, 3.4, 5.2):
        factor = np.exp((-0.02 * 2 * np.pi * f + 2j * np.pi * f) * step_time)
        push = (rng.normal(size=rows) + 1j * rng.normal(size=rows)) * np.sqrt(1 - abs(factor) ** 2)
        z = np.empty(rows, complex)
        last = 0
        for k in range(rows):
            last = factor * last + push[k]
            z[k] = last
        y += np.real(np.outer(z, rng.normal(size=16) + 1j * rng.normal(size=16)))
    y += 0.05 * rng.normal(size=y.shape)
    table(folder, np.arange(rows) * step_time, y)
    workflow(folder, "bootstrap", [
        source(), step("snapshots", "snapshot-builder", {"time-column": "time", "delay-depth": 20}),
        step("fit", "operator-fitter", {"estimator": "linear", "rank-rule": "fixed", "rank": 40}),
        step("spectrum", "spectrum-extractor", {"intervals": "always", "replicates": 200})])


def tall(folder, size):
    """A field of many points that is the sum of fifteen rhythms, with noise; one snapshot a row."""
    rng = np.random.default_rng(4)
    t = np.arange(300) * 0.05
    rates = -0.02 * (1 + np.arange(15) % 4) + 2j * np.pi * (0.21 + 0.37 * np.arange(15))
    z = np.exp(np.outer(t, rates)) * (1.1 - 0.05 * np.arange(15))
    x = np.concatenate([z.real, z.imag], axis=1) @ rng.standard_normal((30, size))
    x += 1e-3 * rng.standard_normal(x.shape)
    np.save(os.path.join(folder, "data.npy"), x)
    workflow(folder, "tall", [
        step("source", "table-source", {"path": "data.npy", "copy": False}),
        step("snapshots", "snapshot-builder", {"row-step": 0.05}),
        step("fit", "operator-fitter", {"estimator": "linear", "rank-rule": "fixed", "rank": 30}),
        step("spectrum", "spectrum-extractor", {"intervals": "none"})])


def csv(folder, size):
    """Five oscillators driven by noise, seen by 16 channels, as text."""
    from scipy.signal import lfilter
    rng = np.random.default_rng(5)
    y = np.zeros((size, 16))
    for f in (0.7, 1.3, 2.1, 3.4, 5.2):
        factor = np.exp((-0.02 * 2 * np.pi * f + 2j * np.pi * f) * 0.01)
        push = (rng.standard_normal(size) + 1j * rng.standard_normal(size)) * np.sqrt(1 - abs(factor) ** 2)
        z = lfilter([1], [1, -factor], push)
        shape = rng.standard_normal(16) + 1j * rng.standard_normal(16)
        y += np.outer(z.real, shape.real) - np.outer(z.imag, shape.imag)
    y += 0.05 * rng.standard_normal(y.shape)
    with open(os.path.join(folder, "data.csv"), "w", encoding="utf-8") as out:
        out.write(",".join(["time"] + ["c%02d" % k for k in range(16)]) + "\n")
        with Pool(2) as pool:
            for text in pool.imap(lines, ((first, y[first:first + 50000]) for first in range(0, size, 50000))):
                out.write(text)
    workflow(folder, "csv", [
        source(), step("fit", "streaming-fit", {"time-column": "time", "holdout": "none", "rank-rule": "fixed", "rank": 16}),
        step("spectrum", "spectrum-extractor", {"intervals": "none"}), step("forecast", "forecast", {"route": "projection", "horizon": 1.0})],
        links=[("source.table", "fit.table"), ("fit.operator", "spectrum.operator"), ("fit.snapshots", "forecast.snapshots"),
               ("fit.operator", "forecast.operator"), ("spectrum.spectrum", "forecast.spectrum")])


def lines(part):
    first, rows = part
    pattern = "%.2f" + ",%.7g" * rows.shape[1] + "\n"
    return "".join([pattern % (0.01 * (first + k), *row) for k, row in enumerate(rows.tolist())])


def scale(folder, size):
    """The motion on a torus of the long kernel, 64 channels and a million snapshots."""
    rng = np.random.default_rng(6)
    t = np.arange(size) * 0.02
    a, b = 2 * np.pi * 0.31 * t, 2 * np.pi * 0.097 * t
    state = np.stack([np.cos(a), np.sin(a), np.cos(b), np.sin(b)], 1)
    x = np.tanh(0.6 * state @ rng.normal(size=(4, 64)))
    x += 0.02 * rng.standard_normal(x.shape)
    fields = np.dtype([("time", "<f8")] + [("c%02d" % k, "<f8") for k in range(64)])
    np.save(os.path.join(folder, "data.npy"), np.ascontiguousarray(np.concatenate([t[:, None], x], axis=1)).view(fields)[:, 0])
    workflow(folder, "scale", [
        step("source", "table-source", {"path": "data.npy", "copy": False}),
        step("fit", "streaming-fit", {"time-column": "time", "functions": "landmarks", "landmarks": 300, "kernel": "gaussian", "scale": 6,
                                      "holdout": "none", "rank-rule": "fixed", "rank": 300}),
        step("spectrum", "spectrum-extractor", {"intervals": "none"})],
        links=[("source.table", "fit.table"), ("fit.operator", "spectrum.operator")])


def out_of_core(folder, size, program):
    """Two rhythms of an invented recording, written as Parquet by the database in the project's jar."""
    import subprocess
    jar = os.path.join(os.path.dirname(program), "modestead.jar")
    subprocess.run(["java", "-cp", jar, os.path.join(os.path.dirname(os.path.abspath(__file__)), "ManyRows.java"),
                    os.path.join(folder, "data.parquet"), str(size)], check=True)
    with open(os.path.join(folder, "result.json"), "w", encoding="utf-8") as out:
        json.dump({"real": [0, 0], "imag": [2 * np.pi * 0.31, 2 * np.pi * 0.97]}, out)
    workflow(folder, "out of core", [
        step("source", "table-source", {"path": "data.parquet", "copy": False}),
        step("fit", "streaming-fit", {"time-column": "time", "delay-depth": 4, "holdout": "none", "rank-rule": "fixed", "rank": 4}),
        step("spectrum", "spectrum-extractor", {"intervals": "none"})],
        links=[("source.table", "fit.table"), ("fit.operator", "spectrum.operator")])


def start_up(folder, size):
    """The three flows that come as an example; nothing is made."""
    source_file = os.path.join(os.path.dirname(__file__), "..", "..", "..", "test-workflows", "three-flows", "workflow.json")
    with open(source_file, encoding="utf-8") as given, open(os.path.join(folder, "workflow.json"), "w", encoding="utf-8") as out:
        out.write(given.read())


def source():
    return step("source", "table-source", {"path": "data.csv", "copy": False})


def step(name, node, settings):
    return {"id": name, "node": node, "settings": settings}


def table(folder, t, x, runs=None):
    header = ["time"] + ["c%02d" % k for k in range(x.shape[1])]
    columns = [t[:, None], x]
    formats = ["%.10g"] + ["%.12g"] * x.shape[1]
    if runs is not None:
        header.insert(0, "run")
        columns.insert(0, runs[:, None])
        formats.insert(0, "run-%05d")
    np.savetxt(os.path.join(folder, "data.csv"), np.column_stack(columns), delimiter=",", fmt=formats, header=",".join(header), comments="")


def workflow(folder, name, steps, kernel=False, check=False, links=None):
    links = links or [("source.table", "snapshots.table"), ("snapshots.snapshots", "fit.snapshots"), ("fit.operator", "spectrum.operator")]
    if kernel:
        links += [("snapshots.snapshots", "kernel.snapshots"), ("kernel.kernel", "fit.kernel")]
    if check:
        links += [("snapshots.snapshots", "check.snapshots"), ("fit.operator", "check.operator"), ("spectrum.spectrum", "check.spectrum")]
    with open(os.path.join(folder, "workflow.json"), "w", encoding="utf-8") as out:
        json.dump({"format": "modestead-workflow/1", "name": name, "steps": steps,
                   "links": [{"from": a, "to": b} for a, b in links]}, out, indent=1)
