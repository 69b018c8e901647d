"""Step map of tall snapshots as the papers' formulas read: thin singular value decomposition of all states."""
import numpy as np
from common import snapshots, write

x, step = snapshots()
rank = 30
now, after = x[:, :-1], x[:, 1:]
u, s, wt = np.linalg.svd(now, full_matrices=False)
u, s, w = u[:, :rank], s[:rank], wt[:rank].T
mu, v = np.linalg.eig(u.T @ after @ (w / s))
modes = u @ v
amplitude = np.linalg.lstsq(modes, now[:, 0].astype(complex), rcond=None)[0]
write(np.log(mu.astype(complex)) / step, amplitude=np.abs(amplitude).tolist())
