"""Three one-dimensional flows, fitted and judged over a ladder of ranks, as a short script would do it."""
import sys
import numpy as np
from common import quadrature, write

FLOWS = {"growth": lambda s, t: s * np.exp(t), "drift": lambda s, t: s + t, "escape": lambda s, t: s / (1 - s * t)}


def settle(rungs):
    """Relative change of the nearest rate from rung to rung, the plainest reading of a ladder."""
    out = []
    for (_, before), (_, after) in zip(rungs, rungs[1:]):
        out.append([float(np.min(np.abs(after - rate)) / max(abs(rate), 1e-9)) for rate in before])
    return out


t = np.linspace(0, 0.4, 41)
weight = quadrature(t)
all_rates = []
for flow in FLOWS.values():
    runs = np.array([flow(s, t) for s in np.linspace(-1, 1, 45)])
    held = np.isin(np.arange(45), [6, 14, 22, 30, 38])
    train, judge = runs[~held], runs[held]
    nodes = np.exp(np.multiply.outer(train, train))
    gram = np.einsum("isjt,s,t->ij", nodes, weight, weight)
    action = np.exp(np.multiply.outer(train[:, -1], train)) @ weight - np.exp(np.multiply.outer(train[:, 0], train)) @ weight
    values, vectors = np.linalg.eigh((gram + gram.T) / 2)
    rungs = []
    for rank in range(4, 11):
        q = vectors[:, ::-1][:, :rank] / np.sqrt(values[::-1][:rank])
        lam, v = np.linalg.eig(q.T @ action @ q)
        weights = np.linalg.lstsq(v, (q.T @ (train @ weight)).astype(complex), rcond=None)[0]
        functions = np.exp(np.multiply.outer(judge, train)) @ weight @ q @ v
        residual = np.linalg.norm(functions[:, 1:] - functions[:, :-1] * np.exp(lam * (t[1] - t[0])), axis=(0, 1))
        rungs.append((rank, lam))
    settle(rungs)
    all_rates += list(rungs[-1][1])
write(all_rates)
