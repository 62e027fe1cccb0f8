"""Density frames |sum_k c_k(t) phi_k(x)|^2: 220 oscillator levels, 600 points, 400 times, table and coefficients given."""
import numpy as np
from partner import serve

LEVELS, POINTS, TIMES = 220, 600, 400
h = 48.0 / POINTS
x = -24 + h / 2 + h * np.arange(POINTS)
phi = np.empty((LEVELS, POINTS))
phi[0] = np.pi**-0.25 * np.exp(-x * x / 2)
phi[1] = np.sqrt(2.0) * x * phi[0]
for k in range(1, LEVELS - 1):
    phi[k + 1] = np.sqrt(2.0 / (k + 1)) * x * phi[k] - np.sqrt(k / (k + 1.0)) * phi[k - 1]
random = np.random.default_rng(3)
c0 = random.standard_normal(LEVELS) + 1j * random.standard_normal(LEVELS)
c0 /= np.linalg.norm(c0)
c = c0 * np.exp(-1j * np.outer(np.linspace(0, 10, TIMES), np.arange(LEVELS) + 0.5 + 0.01 * np.arange(LEVELS) ** 2))
half_even = np.ascontiguousarray(phi[::2, POINTS // 2:])
half_odd = np.ascontiguousarray(phi[1::2, POINTS // 2:])


def complex_product():
    return np.abs(c @ phi) ** 2


def stacked():
    """real and imaginary parts in one real product"""
    s = np.concatenate([c.real, c.imag]) @ phi
    s *= s
    return s[:TIMES] + s[TIMES:]


def parity():
    """even and odd levels on half the grid: psi(+-x) = even +- odd"""
    s = np.concatenate([c.real, c.imag])
    e = np.ascontiguousarray(s[:, ::2]) @ half_even
    o = np.ascontiguousarray(s[:, 1::2]) @ half_odd
    plus, minus = e + o, e - o
    plus *= plus
    minus *= minus
    half = POINTS // 2
    out = np.empty((TIMES, POINTS))
    np.add(plus[:TIMES], plus[TIMES:], out=out[:, half:])
    np.add(minus[:TIMES, ::-1], minus[TIMES:, ::-1], out=out[:, :half])
    return out


def error(density):
    """largest error against sums in extended precision, at every 40th time"""
    psi = c[::40].astype(np.clongdouble) @ phi.astype(np.longdouble)
    return np.abs(density[::40] - (psi.real**2 + psi.imag**2)).max()


serve({name: (work, error) for name, work in
       (("complex product", complex_product), ("stacked real product", stacked), ("parity", parity))})
