"""Levels of p^2/2 + x^4 in oscillator bases split by parity: `values` and `vectors` of the lowest 50, `thousand` values."""
import sys

import numpy as np
from partner import serve
from scipy.linalg import eig_banded

# Levels 0, 49 and 999: own recomputation with 64-bit mantissas.
KNOWN = {0: 0.667986259155777108, 49: 250.18335869707518736, 999: 13755.898570503518}


def bands(size, omega):
    """The two parities of the matrix, lower band storage"""
    n = np.arange(size, dtype=float)
    x2, p2 = 1 / (2 * omega), omega / 4
    d = p2 * (2 * n + 1) + x2 * x2 * (6 * n * n + 6 * n + 3)
    e = (-p2 + x2 * x2 * (4 * n + 6)) * np.sqrt((n + 1) * (n + 2))
    f = x2 * x2 * np.sqrt((n + 1) * (n + 2) * (n + 3) * (n + 4))
    return [np.array([d[p::2], e[p::2], f[p::2]]) for p in (0, 1)]


def levels(count, size, omega, vectors, some):
    """lowest levels; `some` asks for these only, otherwise all of the matrix are computed"""
    out = np.empty(count)
    for parity, band in enumerate(bands(size, omega)):
        wanted = (count - parity + 1) // 2
        choice = dict(select="i", select_range=(0, wanted - 1)) if some else {}
        found = eig_banded(band, lower=True, eigvals_only=not vectors, check_finite=False, **choice)
        out[parity::2] = (found[0] if vectors else found)[:wanted]
    return out


def error(found):
    return max(abs(found[n] / e - 1) for n, e in KNOWN.items() if n < len(found))


what = sys.argv[1]
count, size, omega = (1000, 1400, 13.0) if what == "thousand" else (50, 108, 5.2)
serve({"eig_banded, the lowest": (lambda: levels(count, size, omega, what == "vectors", True), error),
       "eig_banded, all of the matrix": (lambda: levels(count, size, omega, what == "vectors", False), error)})
