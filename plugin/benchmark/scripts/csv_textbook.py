"""Step map of logged channels as the papers' formulas read, and what it foretells."""
import numpy as np
from common import foretold, read, write

t, x, _ = read()
step, rank = t[1] - t[0], 16
now, after = x[:-1], x[1:]
u, s, wt = np.linalg.svd(now, full_matrices=False)
u, s, w = u[:, :rank], s[:rank], wt[:rank].T
matrix = u.T @ after @ (w / s)
mu, v = np.linalg.eig(matrix)
weights = np.linalg.solve(v, ((w * s).T).astype(complex))
foretold(t[-1], step, x[-1] @ (w / s) @ v, mu, weights)
write(np.log(mu.astype(complex)) / step)
