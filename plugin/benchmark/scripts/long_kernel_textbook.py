"""Kernel step map as the papers' formulas read: two square matrices of all snapshots and a full eigen-decomposition."""
import numpy as np
from common import gaussian, read, write

t, x, _ = read()
step = t[1] - t[0]
cut = len(x) - round(0.2 * len(x))
now, after = x[:cut - 1], x[1:cut]
rank = 200
gram = gaussian(now, now, 4)
action = gaussian(after, now, 4)
values, vectors = np.linalg.eigh(gram)
s = np.sqrt(values[::-1][:rank])
q = vectors[:, ::-1][:, :rank] / s
matrix = q.T @ action @ q
mu, v = np.linalg.eig(matrix)
joint = np.linalg.solve(v, (q.T @ now).astype(complex))
functions = gaussian(x[cut:], now, 4) @ q @ v
residual = np.linalg.norm(functions[1:] - functions[:-1] * mu, axis=0) / np.linalg.norm(functions[1:], axis=0)
write(np.log(mu.astype(complex)) / step, residual=residual.tolist(), weight=np.linalg.norm(joint, axis=1).tolist())
