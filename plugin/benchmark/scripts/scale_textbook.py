"""Kernel step map as the papers' formulas read: square matrices of all snapshots, which no memory holds."""
import sys
import numpy as np
from common import gaussian, write

data = np.load(sys.argv[1] + "/data.npy")
x = data.view("<f8").reshape(len(data), -1)[:, 1:]
step = 0.02
now, after = x[:-1], x[1:]
gram = gaussian(now, now, 6)
values, vectors = np.linalg.eigh(gram)
q = vectors[:, ::-1][:, :300] / np.sqrt(values[::-1][:300])
mu = np.linalg.eigvals(q.T @ gaussian(after, now, 6) @ q)
write(np.log(mu.astype(complex)) / step)
