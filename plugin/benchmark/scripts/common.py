"""What the comparison scripts share: reading, writing, and the pieces that a specialist has at hand."""
import json
import sys
import numpy as np
import pandas
import scipy.linalg as sl


def read():
    """The recorded table: times, values, and the rows of each run."""
    frame = pandas.read_csv(sys.argv[1] + "/data.csv")
    runs = []
    if "run" in frame:
        codes, _ = pandas.factorize(frame.pop("run"))
        edges = np.flatnonzero(np.diff(codes)) + 1
        runs = list(zip(np.r_[0, edges], np.r_[edges, len(codes)]))
    t = frame.pop("time").to_numpy()
    return t, np.ascontiguousarray(frame.to_numpy()), runs or [(0, len(t))]


def samples():
    """The recorded array, one sample a row, and the time from row to row."""
    return np.load(sys.argv[1] + "/data.npy"), 0.05


def snapshots():
    """The recorded array with one snapshot a column, and the time between them."""
    x, step = samples()
    return x.T, step


def foretold(last, step, functions, mu, weights, steps=100):
    """Writes the table of what comes after the last sample."""
    powers = mu[None, :] ** np.arange(1, steps + 1)[:, None]
    values = ((powers * functions) @ weights).real
    frame = pandas.DataFrame(values)
    frame.insert(0, "time", last + step * np.arange(1, steps + 1))
    frame.to_csv(sys.argv[1] + "/forecast.csv", index=False)


def write(rates, **more):
    rates = np.asarray(rates)
    with open(sys.argv[1] + "/result.json", "w", encoding="utf-8") as out:
        json.dump({"real": rates.real.tolist(), "imag": rates.imag.tolist(), **more}, out)


def gaussian(x, y, scale):
    square = (x * x).sum(1)[:, None] + (y * y).sum(1)[None, :] - 2 * x @ y.T
    np.maximum(square, 0, out=square)
    square *= -0.5 / scale ** 2
    return np.exp(square, out=square)


def exponential(x, y):
    return np.exp(x @ y.T)


def landmarks(kernel, diagonal, x, rank, stop=1e-13):
    """Partial Cholesky with diagonal pivoting: rows of the chosen points, and the factor."""
    distance = diagonal.copy()
    factor = np.empty((rank, len(x)))
    chosen = []
    for k in range(rank):
        pivot = int(np.argmax(distance))
        if not distance[pivot] > stop * diagonal.max():
            factor = factor[:k]
            break
        chosen.append(pivot)
        column = kernel(x, x[pivot:pivot + 1])[:, 0]
        if k:
            column -= factor[:k, pivot] @ factor[:k]
        column /= np.sqrt(distance[pivot])
        factor[k] = column
        distance -= column * column
        distance[pivot] = 0
    return np.array(chosen), factor.T


def compressed(now, after, rank):
    """Operator on the leading orthonormal functions: those functions in the features, the matrix, singular values."""
    q, r = np.linalg.qr(now)
    u, s, wt = np.linalg.svd(r)
    rank = min(rank, int((s > 1e-14 * s[0]).sum()))
    u, s, w = q @ u[:, :rank], s[:rank], wt[:rank].T
    return w, (u / s).T @ after @ w, s, u


def weights(vectors, observable):
    return np.linalg.lstsq(vectors, observable.astype(complex), rcond=None)[0]


def quadrature(t):
    """Weights that integrate the polynomial through six neighbours exactly on every interval."""
    p = len(t)
    out = np.zeros(p)
    degree = min(5, p - 1)
    for k in range(p - 1):
        first = min(max(k - degree // 2, 0), p - 1 - degree)
        h = t[k + 1] - t[k]
        u = (t[first:first + degree + 1] - t[k]) / h
        out[first:first + degree + 1] += h * np.linalg.solve(np.vander(u, increasing=True).T, 1 / np.arange(1, degree + 2))
    return out


def settle(rungs):
    """Relative change of the nearest rate from rung to rung, the plainest reading of a ladder."""
    out = []
    for (_, before), (_, after) in zip(rungs, rungs[1:]):
        out.append([float(np.min(np.abs(after - rate)) / max(abs(rate), 1e-9)) for rate in before])
    return out
