"""Blocks drawn anew and the whole fit repeated, 200 times."""
import numpy as np
from common import read, write

t, x, _ = read()
step, depth, rank = t[1] - t[0], 20, 40
states = np.concatenate([x[depth - 1 - d:len(x) - d] for d in range(depth)], axis=1)
now, after = states[:-1], states[1:]


def fit(a, b):
    u, s, wt = np.linalg.svd(a, full_matrices=False)
    u, s, w = u[:, :rank], s[:rank], wt[:rank].T
    return np.log(np.linalg.eigvals(u.T @ b @ (w / s)).astype(complex)) / step


rates = fit(now, after)
m = len(now)
block = max(int(np.ceil(np.cbrt(m))), 2 * depth)
rng = np.random.default_rng(1)
spread = []
for _ in range(200):
    first = rng.integers(0, m, size=-(-m // block))
    rows = ((first[:, None] + np.arange(block)) % m).ravel()[:m]
    found = fit(now[rows], after[rows])
    spread.append([found[np.argmin(np.abs(found - rate))] for rate in rates])
spread = np.array(spread)
write(rates, deviation=np.hypot(spread.real.std(0), spread.imag.std(0)).tolist())
