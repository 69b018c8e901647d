"""Generator on occupation functions as the papers' formulas read: every pair of runs by double quadrature; then the ladder."""
import numpy as np
from common import exponential, quadrature, read, settle, write

t, x, runs = read()
held = round(0.2 * len(runs))
train, judge = runs[:len(runs) - held], runs[len(runs) - held:]
m = len(train)
weight = [quadrature(t[a:b]) for a, b in train]
gram = np.empty((m, m))
action = np.empty((m, m))
for i, (a, b) in enumerate(train):
    for j, (c, d) in enumerate(train):
        if j >= i:
            gram[i, j] = gram[j, i] = weight[i] @ exponential(x[a:b], x[c:d]) @ weight[j]
        ends = exponential(x[[b - 1, a]], x[c:d]) @ weight[j]
        action[i, j] = ends[0] - ends[1]
values, vectors = np.linalg.eigh(gram)
top = min(180, int((values > 1e-13 * values[-1]).sum()))
s, q = np.sqrt(values[::-1][:top]), vectors[:, ::-1][:, :top]
q = q / s
observable = np.array([weight[i] @ x[a:b] for i, (a, b) in enumerate(train)])
unseen = np.concatenate([np.column_stack([exponential(x[a:b], x[c:d]) @ weight[j] for j, (c, d) in enumerate(train)]) for a, b in judge])
length = judge[0][1] - judge[0][0]
rungs, residuals, most = [], [], len(s)
for rank in sorted({min(rank, most) for rank in {2, 60, 180} | {round(2 + k * 178 / 13) for k in range(14)}}):
    lam, v = np.linalg.eig(q[:, :rank].T @ action @ q[:, :rank])
    joint = np.linalg.lstsq(v, (q[:, :rank].T @ observable).astype(complex), rcond=None)[0]
    functions = (unseen @ q[:, :rank] @ v).reshape(len(judge), length, rank)
    tau = t[1] - t[0]
    missed = np.linalg.norm(functions[:, 1:] - functions[:, :-1] * np.exp(lam * tau), axis=(0, 1)) / np.linalg.norm(functions[:, 1:], axis=(0, 1))
    rungs.append((rank, lam))
    residuals.append(missed.tolist())
    if rank == min(60, most):
        write(lam, residual=missed.tolist(), weight=np.linalg.norm(joint, axis=1).tolist())
settle(rungs)
