"""Coefficients at 1000 times and <x>, <p>, Var x, Var p of them: coherent state of 100 quanta in H = n(n-1)/2, 220 levels."""
import numpy as np
from partner import serve
from scipy.special import gammaln

MEAN, LEVELS, TIMES, BLOCK = 100.0, 220, 1000, 32
n = np.arange(LEVELS)
c0 = np.exp(-MEAN / 2 + n * np.log(np.sqrt(MEAN)) - 0.5 * gammaln(n + 1))
energy = 0.5 * n * (n - 1.0)
t = np.linspace(0, 2 * np.pi, TIMES, endpoint=False)
root1, root2 = np.sqrt(n[1:]), np.sqrt(n[2:] * n[1:-1])
quanta = (c0 * c0) @ n  # H is diagonal, so <n> is constant


def states_direct():
    return c0 * np.exp(-1j * np.multiply.outer(t, energy))


def states_two_level():
    """e^{-iE(t_q + t_r)} as products of two small tables, for the uniform grid of times"""
    step = t[1] - t[0]
    fine = np.exp(-1j * np.outer(np.arange(BLOCK) * step, energy))
    coarse = c0 * np.exp(-1j * np.outer(t[0] + np.arange((TIMES + BLOCK - 1) // BLOCK) * BLOCK * step, energy))
    return (coarse[:, None, :] * fine[None, :, :]).reshape(-1, LEVELS)[:TIMES]


def means(a, a2):
    x, p = np.sqrt(2) * a.real, np.sqrt(2) * a.imag
    return x, p, a2.real + quanta + 0.5 - x * x, -a2.real + quanta + 0.5 - p * p


def means_product(psi):
    conj = psi.conj()
    return means((conj[:, :-1] * psi[:, 1:]) @ root1, (conj[:, :-2] * psi[:, 2:]) @ root2)


def means_einsum(psi):
    conj = psi.conj()
    return means(np.einsum("tn,tn->t", conj[:, :-1], psi[:, 1:] * root1),
                 np.einsum("tn,tn->t", conj[:, :-2], psi[:, 2:] * root2))


def means_matmul(psi):
    conj = psi.conj()
    return means(np.matmul(conj[:, None, :-1], (psi[:, 1:] * root1)[:, :, None])[:, 0, 0],
                 np.matmul(conj[:, None, :-2], (psi[:, 2:] * root2)[:, :, None])[:, 0, 0])


def means_real(psi):
    r, i = np.ascontiguousarray(psi.real), np.ascontiguousarray(psi.imag)
    re1 = (r[:, :-1] * r[:, 1:] + i[:, :-1] * i[:, 1:]) @ root1
    im1 = (r[:, :-1] * i[:, 1:] - i[:, :-1] * r[:, 1:]) @ root1
    re2 = (r[:, :-2] * r[:, 2:] + i[:, :-2] * i[:, 2:]) @ root2
    return means(re1 + 1j * im1, re2)


def phase_sums():
    """Not means of the states: for diagonal H, <a> is a sum over level differences, and on the grid a product of two small matrices."""
    step = t[1] - t[0]
    fine = np.arange(BLOCK) * step
    coarse = t[0] + np.arange((TIMES + BLOCK - 1) // BLOCK) * BLOCK * step

    def along(weights, difference):
        left = weights * np.exp(-1j * np.outer(coarse, difference))
        return (left @ np.exp(-1j * np.outer(fine, difference)).T).ravel()[:TIMES]

    return means(along(c0[:-1] * c0[1:] * root1, energy[1:] - energy[:-1]),
                 along(c0[:-2] * c0[2:] * root2, energy[2:] - energy[:-2]))


def error(result):
    """largest error of <x> and <p> over the amplitude of <x>, sqrt(2 MEAN); exact: <a> = sqrt(MEAN) exp(MEAN (e^{-it} - 1))"""
    z = np.exp(-1j * t.astype(np.longdouble).astype(np.clongdouble))
    a = np.sqrt(np.longdouble(MEAN)) * np.exp(MEAN * (z - 1))
    x, p = result[0], result[1]
    root = np.sqrt(np.longdouble(2))
    return max(np.abs(x - root * a.real).max(), np.abs(p - root * a.imag).max()) / np.sqrt(2 * MEAN)


def keep(states, read):
    """the task asks for the coefficients too, so they are made and kept"""
    def work():
        psi = states()
        return read(psi) + (psi,)
    return work, error


serve({
    "table, products": keep(states_two_level, means_product),
    "table, einsum": keep(states_two_level, means_einsum),
    "table, matmul": keep(states_two_level, means_matmul),
    "table, real parts": keep(states_two_level, means_real),
    "exp, products": keep(states_direct, means_product),
    "* table, phase sums": (lambda: phase_sums() + (states_two_level(),), error),
})
