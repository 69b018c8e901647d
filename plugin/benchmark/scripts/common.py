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


def halves(t):
    """Cuts a run into two segments that share their middle sample: first and last sample of each, and the weights of its integral."""
    middle = (len(t) - 1) // 2
    return [(0, middle, quadrature(t[:middle + 1])), (middle, len(t) - 1, quadrature(t[middle:]))]


def noise(x):
    """Deviation of the noise, one a channel, of runs x samples x channels: what a cubic through two neighbours on either side misses."""
    missed = x[:, 2:-2] - (4 * (x[:, 1:-3] + x[:, 3:-1]) - x[:, :-4] - x[:, 4:]) / 6
    return np.median(np.abs(missed.reshape(-1, x.shape[2])), axis=0) / 0.6745 / np.sqrt(1 + 34 / 36)


def cleared(lam, plain, noisier, tau):
    """Largest relative residual of eigenfunctions over one step and up to each mode's own time, with the share of the noise taken off."""
    longest = (plain.shape[1] - 1) * tau
    own = np.minimum(longest / 2, np.minimum(1 / np.maximum(np.abs(lam.real), 1e-300), 2 * np.pi / np.maximum(np.abs(lam.imag), 1e-300)))
    worst = np.zeros(len(lam))
    for share in (0, 0.25, 0.5, 1):
        lags = np.clip(np.ceil(share * own / tau - 1e-6).astype(int), 1, plain.shape[1] - 1)
        for lag in np.unique(lags):
            k = lags == lag
            sums = [missed(lam[k], values[:, :, k], lag, tau) for values in (plain, *noisier)]
            miss, size = 2 * np.array(sums[0]) - np.mean(sums[1:], axis=0)
            ratio = np.where(size < 0.5 * sums[0][1], sums[0][0] / sums[0][1], np.maximum(miss, 0) / size)
            worst[k] = np.maximum(worst[k], np.sqrt(ratio))
    return worst


def missed(lam, values, lag, tau):
    later = values[:, lag:]
    apart = later - values[:, :-lag] * np.exp(lam * lag * tau)
    return (apart.real ** 2 + apart.imag ** 2).sum((0, 1)), (later.real ** 2 + later.imag ** 2).sum((0, 1))


def half_rates(lam, values, tau):
    """Change of every rate from the first to the second half of the runs."""
    middle = values.shape[1] // 2
    found = []
    for part in (values[:, :middle], values[:, middle:]):
        found.append(np.log((part[:, :-1].conj() * part[:, 1:]).sum((0, 1)) / (np.abs(part[:, :-1]) ** 2).sum((0, 1))) / tau)
    return np.abs(found[1] - found[0])


def nearest(rates, others):
    return np.abs(rates[:, None] - others[None, :]).argmin(1)


def verdict(fits, unseen, tau, other, fitted):
    """
    What decides whether modes exist: at nested ranks rates, joint and solo weights, sizes on the data and residuals on unseen runs less
    the noise's share, each beside those of two fits to noisier runs; at the fitted rank the rates of both halves; the rates with another step.

    fits: matrix, observable and leading functions at some training states, of the fit and of the two noisier ones
    unseen: leading functions, runs x samples x R, on the runs that judge and on their two noisier copies
    other: matrix with another step
    """
    most = min(len(matrix) for matrix, _, _ in fits)
    rungs = []
    for rank in sorted({min(rank, most) for rank in {2, fitted, 180} | {round(2 + k * 178 / 13) for k in range(14)}}):
        found = []
        for matrix, observable, sampled in fits:
            lam, v = np.linalg.eig(matrix[:rank, :rank])
            joint, solo = weights(v, observable[:rank]), v.conj().T @ observable[:rank]
            size = np.sqrt((np.abs(sampled[:, :rank] @ v) ** 2).mean(0))
            found.append((lam, np.linalg.norm(joint, axis=1), np.linalg.norm(joint - solo, axis=1), 1 / size, v))
        lam, weight, gap, norm, v = found[0]
        functions = [(values[:, :, :rank].reshape(-1, rank) @ v).reshape(*values.shape[:2], rank) for values in unseen]
        effects = [np.abs(np.log(norm / noisier[3][nearest(lam, noisier[0])])) for noisier in found[1:]]
        rungs.append(dict(rank=rank, lam=lam, weight=weight, gap=gap, norm=norm, effect=np.max(effects, axis=0),
                          residual=cleared(lam, functions[0], functions[1:], tau)))
        if rank == min(fitted, most):
            write(lam, residual=rungs[-1]["residual"].tolist(), weight=weight.tolist(), half=half_rates(lam, functions[0], tau).tolist())
    settled = [np.abs(after["lam"][nearest(before["lam"], after["lam"])] - before["lam"]) / np.maximum(np.abs(before["lam"]), 1e-9)
               for before, after in zip(rungs, rungs[1:])]
    again = np.linalg.eigvals(other[:min(fitted, len(other)), :min(fitted, len(other))])
    return rungs, settled, again
