"""Step map of tall snapshots by a specialist: products of snapshots with each other, then everything at their number."""
import numpy as np
from common import snapshots, write

x, step = snapshots()
rank = 30
products = x.T @ x
values, vectors = np.linalg.eigh(products[:-1, :-1])
s, w = np.sqrt(values[::-1][:rank]), vectors[:, ::-1][:, :rank]
mu, v = np.linalg.eig((w / s).T @ products[:-1, 1:] @ (w / s))
modes = x[:, :-1] @ ((w / s) @ v)
first = (w / s).T @ products[:-1, 0]
amplitude = np.linalg.solve(v, first.astype(complex)) * np.linalg.norm(modes, axis=0)
write(np.log(mu.astype(complex)) / step, amplitude=np.abs(amplitude).tolist())
