"""Oscillator functions: `table` is phi_0 ... phi_219 at 600 points, `single` is phi_20000 at 1000 points."""
import sys

import numpy as np
from partner import serve


def table(levels, x):
    """normalised recurrence, row by row"""
    f = np.empty((levels, len(x)), dtype=x.dtype)
    f[0] = x.dtype.type(np.pi) ** -0.25 * np.exp(-x * x / 2)
    f[1] = np.sqrt(2.0) * x * f[0]
    for n in range(1, levels - 1):
        f[n + 1] = np.sqrt(2.0 / (n + 1)) * x * f[n] - np.sqrt(n / (n + 1.0)) * f[n - 1]
    return f


def table_in_place(levels, x):
    """the same without temporary rows"""
    f = np.empty((levels, len(x)))
    f[0] = np.pi**-0.25 * np.exp(-x * x / 2)
    f[1] = np.sqrt(2.0) * x * f[0]
    n = np.arange(1.0, levels)
    up, down = np.sqrt(2.0 / (n + 1)), np.sqrt(n / (n + 1))
    scratch = np.empty_like(x)
    for k in range(1, levels - 1):
        np.multiply(x, f[k], out=f[k + 1])
        f[k + 1] *= up[k - 1]
        np.multiply(f[k - 1], down[k - 1], out=scratch)
        f[k + 1] -= scratch
    return f


def single(n, x, every=16):
    """recurrence on mantissas with an exponent for each point, rescaled every few steps"""
    kind = x.dtype.type
    before, now = np.zeros_like(x), np.full_like(x, kind(np.pi) ** kind(-0.25))
    log = np.zeros_like(x)
    for k in range(n):
        before, now = now, (np.sqrt(kind(2) / kind(k + 1)) * x) * now - np.sqrt(kind(k) / kind(k + 1)) * before
        if k % every == every - 1:
            size = np.maximum(np.abs(before), np.abs(now))
            big = size > 1e100
            if big.any():
                factor = np.where(big, 1 / size, kind(1))
                before, now = before * factor, now * factor
                log -= np.log(factor)
    with np.errstate(under="ignore"):
        return now * np.exp(log - x * x / 2)


def single_in_place(n, x, every=16):
    """the same without temporary rows and with the roots made beforehand"""
    k = np.arange(n, dtype=float)
    up, down = np.sqrt(2 / (k + 1)), np.sqrt(k / (k + 1))
    before, now, scratch = np.zeros_like(x), np.full_like(x, np.pi**-0.25), np.empty_like(x)
    log = np.zeros_like(x)
    for i in range(n):
        np.multiply(x, now, out=scratch)
        scratch *= up[i]
        before *= down[i]
        np.subtract(scratch, before, out=before)
        before, now = now, before
        if i % every == every - 1:
            size = np.maximum(np.abs(before), np.abs(now))
            if size.max() > 1e100:
                factor = np.where(size > 1e100, 1 / size, 1.0)
                before *= factor
                now *= factor
                log -= np.log(factor)
    with np.errstate(under="ignore"):
        return now * np.exp(log - x * x / 2)


if sys.argv[1] == "table":
    h = 48.0 / 600
    x = -24 + h / 2 + h * np.arange(600)
    identity = np.eye(200)

    def error(f):
        """distance from orthonormal of the lowest 200, which the grid integrates to rounding"""
        return np.abs(f[:200] @ f[:200].T * h - identity).max()

    serve({"recurrence": (lambda: table(220, x), error), "recurrence in place": (lambda: table_in_place(220, x), error)})
else:
    x = np.linspace(0, 215, 1000)
    some = slice(0, 1000, 111)
    exact = single(20000, x[some].astype(np.longdouble))

    def error(f):
        """largest error at ten points, against the recurrence in extended precision"""
        return np.abs(f[some] - exact).max()

    serve({"recurrence": (lambda: single(20000, x), error),
           "recurrence in place": (lambda: single_in_place(20000, x), error)})
