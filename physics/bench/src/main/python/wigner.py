"""The Wigner function on 201 x 201 points: a pure state of 200 oscillator levels, or a density operator of 120."""
import sys
import numpy as np
from partner import serve

POINTS = 201
x = np.linspace(-22, 22, POINTS)
h = x[1] - x[0]


def functions(count, points, kind=float):
    points = points.astype(kind)
    f = np.empty((count, len(points)), kind)
    f[0] = kind(np.pi)**kind(-0.25) * np.exp(-points * points / 2)
    f[1] = np.sqrt(kind(2)) * points * f[0]
    for n in range(1, count - 1):
        f[n + 1] = np.sqrt(kind(2) / (n + 1)) * points * f[n] - np.sqrt(kind(n) / (n + 1)) * f[n - 1]
    return f


def lattice(count):
    """A lattice on which no image in momentum falls on the grid: its step, the steps of y, the points, the index of each x."""
    reach = np.sqrt(2 * count + 1) + 4
    per_step = max(1, int(np.ceil(h * (22 + reach) / np.pi)))
    d = h / per_step
    steps = int(np.ceil(reach / d))
    points = x[0] + d * np.arange(-steps, (POINTS - 1) * per_step + steps + 1)
    return d, steps, np.clip(points, -37, 37), steps + per_step * np.arange(POINTS)


def waves(d, steps):
    y = d * np.arange(steps + 1)
    weight = np.full(steps + 1, 2 * d / np.pi)
    weight[0] /= 2
    return y, weight


def one_product(f, d, steps):
    y, weight = waves(d, steps)
    angle = 2 * np.outer(y, x)
    return np.concatenate([f.real * weight, f.imag * weight], axis=1) @ np.concatenate([np.cos(angle), np.sin(angle)])


def halves(f, d, steps):
    """cosines are even in p and sines odd: half the products and half the tables"""
    y, weight = waves(d, steps)
    middle = POINTS // 2
    angle = 2 * np.outer(y, x[middle:])
    even = (f.real * weight) @ np.cos(angle)
    odd = (f.imag * weight) @ np.sin(angle)
    out = np.empty((POINTS, POINTS))
    np.add(even, odd, out=out[:, middle:])
    np.subtract(even[:, ::-1], odd[:, ::-1], out=out[:, :middle + 1])
    return out


def pure_correlations(c):
    d, steps, points, at = lattice(len(c))
    psi = c @ functions(len(c), points)
    k = np.arange(steps + 1)
    return psi[at[:, None] + k] * psi[at[:, None] - k].conj(), d, steps


def whole_table(rho):
    d, steps, points, at = lattice(len(rho))
    phi = functions(len(rho), points)
    turned = np.ascontiguousarray(phi.T)
    table = turned @ (np.ascontiguousarray(rho.real) @ phi) + 1j * (turned @ (np.ascontiguousarray(rho.imag) @ phi))
    k = np.arange(steps + 1)
    return table[at[:, None] + k, at[:, None] - k], d, steps


def needed_pairs(rho):
    d, steps, points, at = lattice(len(rho))
    phi = functions(len(rho), points)
    half = np.concatenate([rho.real, rho.imag]) @ phi
    half = half.reshape(2, len(rho), -1)[:, :, ::-1].copy()
    f = np.empty((POINTS, 2, steps + 1))
    for i, centre in enumerate(at):
        mirror = len(points) - 1 - centre
        f[i] = np.einsum('mk,cmk->ck', phi[:, centre:centre + steps + 1], half[:, :, mirror:mirror + steps + 1])
    return f[:, 0] + 1j * f[:, 1], d, steps


def reference(matrix, vector):
    """at a few points, in extended precision: sum over y of a finer lattice"""
    count = len(matrix if vector is None else vector)
    d = np.longdouble(0.045)
    y = d * np.arange(-560, 561)
    values = {}
    for i, j in ((100, 100), (100, 103), (60, 100), (120, 88), (31, 140), (90, 95)):
        right = functions(count, np.longdouble(x[i]) + y, np.longdouble)
        left = functions(count, np.longdouble(x[i]) - y, np.longdouble)
        if vector is None:
            f = ((matrix.astype(np.clongdouble) @ left) * right).sum(axis=0)
        else:
            c = vector.astype(np.clongdouble)
            f = (c @ right) * (c @ left).conj()
        angle = 2 * np.longdouble(x[j]) * y
        values[i, j] = float((f.real * np.cos(angle) + f.imag * np.sin(angle)).sum() * d / np.longdouble(np.pi))
    return values


random = np.random.default_rng(5)
if sys.argv[1] == "pure":
    c = random.standard_normal(200) + 1j * random.standard_normal(200)
    c /= np.linalg.norm(c)
    exact = reference(None, c)
    work = {"one product": lambda: one_product(*pure_correlations(c)), "halves in p": lambda: halves(*pure_correlations(c))}
else:
    rho = random.standard_normal((120, 120)) + 1j * random.standard_normal((120, 120))
    rho = rho @ rho.conj().T
    rho /= np.trace(rho).real
    exact = reference(rho, None)
    work = {"whole table": lambda: one_product(*whole_table(rho)),
            "needed pairs, halves in p": lambda: halves(*needed_pairs(rho))}


def error(values):
    return max(abs(values[at] - value) for at, value in exact.items())


serve({name: (run, error) for name, run in work.items()})
