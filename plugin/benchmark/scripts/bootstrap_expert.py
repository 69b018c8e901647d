"""Sums of blocks are kept and drawn; each replicate is fitted from sums within the leading functions."""
import numpy as np
from common import read, write

t, x, _ = read()
step, depth, rank, wide = t[1] - t[0], 20, 40, 48
states = np.concatenate([x[depth - 1 - d:len(x) - d] for d in range(depth)], axis=1)
now, after = states[:-1], states[1:]
values, vectors = np.linalg.eigh(now.T @ now)
s = np.sqrt(values[::-1][:wide])
map_ = vectors[:, ::-1][:, :wide] / s
p, q = now @ map_, after @ map_
rates = np.log(np.linalg.eigvals((p.T @ q)[:rank, :rank]).astype(complex)) / step
m = len(now)
cells = 400
edges = np.arange(cells + 1) * m // cells
gram = np.array([p[a:b].T @ p[a:b] for a, b in zip(edges, edges[1:])]).reshape(cells, -1)
cross = np.array([p[a:b].T @ q[a:b] for a, b in zip(edges, edges[1:])]).reshape(cells, -1)
rng = np.random.default_rng(1)
spread = []
for _ in range(200):
    counts = np.bincount(rng.integers(0, cells, size=cells), minlength=cells).astype(float)
    g, c = (counts @ gram).reshape(wide, wide), (counts @ cross).reshape(wide, wide)
    g, c = g * np.outer(s, s), c * np.outer(s, s)
    value, vector = np.linalg.eigh(g)
    turn = vector[:, ::-1][:, :rank] / np.sqrt(value[::-1][:rank])
    found = np.log(np.linalg.eigvals(turn.T @ c @ turn).astype(complex)) / step
    spread.append([found[np.argmin(np.abs(found - rate))] for rate in rates])
spread = np.array(spread)
write(rates, deviation=np.hypot(spread.real.std(0), spread.imag.std(0)).tolist())
