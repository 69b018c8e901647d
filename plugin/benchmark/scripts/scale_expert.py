"""Kernel step map of very many snapshots by a specialist: landmarks chosen among a part of them, Gram sums over blocks, all else at rank r."""
import sys
import numpy as np
import scipy.linalg as sl
from common import gaussian, landmarks, write

data = np.load(sys.argv[1] + "/data.npy")
now, step = data.view("<f8").reshape(len(data), -1)[:, 1:], 0.02
rank, scale, block = 300, 6, 20000
part = now[:-1:max(1, -(-len(now) // 50000))]
chosen, factor = landmarks(lambda a, b: gaussian(a, b, scale), np.ones(len(part)), np.ascontiguousarray(part), rank)
z, inverse = part[chosen], sl.solve_triangular(factor[chosen], np.eye(len(chosen)), lower=True).T
gram, moved, seen = np.zeros((len(z), len(z))), np.zeros((len(z), len(z))), np.zeros((len(z), now.shape[1]))
for a in range(0, len(now) - 1, block):
    rows = now[a:a + block + 1]
    f = gaussian(rows, z, scale) @ inverse
    gram += f[:-1].T @ f[:-1]
    moved += f[:-1].T @ f[1:]
    seen += f[:-1].T @ rows[:-1]
values, vectors = np.linalg.eigh(gram)
keep = values[::-1] > 1e-14 * values[-1]
q = (vectors[:, ::-1] / np.sqrt(np.abs(values[::-1])))[:, keep]
mu, v = np.linalg.eig(q.T @ moved @ q)
joint = np.linalg.solve(v, (q.T @ seen).astype(complex))
write(np.log(mu.astype(complex)) / step, weight=np.linalg.norm(joint, axis=1).tolist())
