"""Step map of logged channels by a specialist: two sums of products, and what it foretells."""
import numpy as np
from common import foretold, read, write

t, x, _ = read()
step, rank = t[1] - t[0], 16
now, after = x[:-1], x[1:]
values, vectors = np.linalg.eigh(now.T @ now)
s, w = np.sqrt(values[::-1][:rank]), vectors[:, ::-1][:, :rank]
mu, v = np.linalg.eig((w / s).T @ (now.T @ after) @ (w / s))
weights = np.linalg.solve(v, ((w * s).T).astype(complex))
foretold(t[-1], step, x[-1] @ (w / s) @ v, mu, weights)
write(np.log(mu.astype(complex)) / step)
