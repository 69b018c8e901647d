"""Generator on occupation functions as the papers' formulas read: every pair of runs by double quadrature; then the whole verdict."""
import numpy as np
from common import exponential, halves, noise, quadrature, read, verdict

t, x, runs = read()
length, channels = runs[0][1] - runs[0][0], x.shape[1]
states = x.reshape(len(runs), length, channels)
train = len(runs) - round(0.2 * len(runs))
dose = np.random.default_rng(1).standard_normal(states.shape) * noise(states)
whole = [(0, length - 1, quadrature(t[:length]))]


def fit(samples, segments, rank):
    """Coefficients of the leading orthonormal functions, operator, observable."""
    pieces = [(run[first:last + 1], weight) for run in samples for first, last, weight in segments]
    m = len(pieces)
    gram, action = np.empty((m, m)), np.empty((m, m))
    for i, (a, u) in enumerate(pieces):
        for j, (b, v) in enumerate(pieces):
            if j >= i:
                gram[i, j] = gram[j, i] = u @ exponential(a, b) @ v
            ends = exponential(a[[-1, 0]], b) @ v
            action[i, j] = ends[0] - ends[1]
    values, vectors = np.linalg.eigh(gram)
    top = min(rank, int((values > 1e-13 * values[-1]).sum()))
    q = vectors[:, ::-1][:, :top] / np.sqrt(values[::-1][:top])
    return pieces, q, q.T @ action @ q, q.T @ np.array([v @ b for b, v in pieces])


def functions(points, pieces, q):
    return np.column_stack([exponential(points.reshape(-1, channels), b) @ v for b, v in pieces]) @ q


every = max(1, train * length // 4000)
some = states[:train].reshape(-1, channels)[::every]
fits, unseen = [], []
for sign in (0, 1, -1):
    pieces, q, matrix, observable = fit(states[:train] + sign * dose[:train], whole, 180)
    fits.append((matrix, observable, functions(some, pieces, q)))
    own = (pieces, q) if sign == 0 else own
    judged = states[train:] + sign * dose[train:]
    unseen.append(functions(judged, *own).reshape(*judged.shape[:2], -1))
_, _, other, _ = fit(states[:train], halves(t[:length]), 60)
verdict(fits, unseen, t[1] - t[0], other, 60)
