"""Kernel step map of very many snapshots by a specialist: landmarks chosen among a part of them, sums over blocks, all else at rank r."""
import sys
import numpy as np
import scipy.linalg as sl
from common import gaussian, landmarks, write

data = np.load(sys.argv[1] + "/data.npy")
now, step = data.view("<f8").reshape(len(data), -1)[:, 1:], 0.02
rank, scale, block = 300, 6, 20000
part = now[:-1:max(1, -(-len(now) // 50000))]
chosen, factor = landmarks(lambda a, b: gaussian(a, b, scale), np.ones(len(part)), np.ascontiguousarray(part), rank)
z, lower = part[chosen], factor[chosen]
triangle, moved, seen = np.zeros((0, rank)), np.zeros((rank, rank)), np.zeros((rank, now.shape[1]))
for a in range(0, len(now) - 1, block):
    rows = now[a:a + block + 1]
    f = sl.solve_triangular(lower, gaussian(rows, z, scale).T, lower=True).T
    q, triangle = np.linalg.qr(np.concatenate([triangle, f[:-1]]))
    top = len(q) - len(f) + 1
    moved = q[:top].T @ moved[:top] + q[top:].T @ f[1:]
    seen = q[:top].T @ seen[:top] + q[top:].T @ rows[:-1]
u, s, wt = np.linalg.svd(triangle)
w = wt.T
mu, v = np.linalg.eig((u / s).T @ moved @ w)
joint = np.linalg.solve(v, ((u / s).T @ seen).astype(complex))
write(np.log(mu.astype(complex)) / step, weight=np.linalg.norm(joint, axis=1).tolist())
