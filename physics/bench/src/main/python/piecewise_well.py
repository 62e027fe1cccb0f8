"""All levels of a finite well by Chebyshev collocation on two domains of the half line, parity by parity."""
import numpy as np
from partner import serve

BOX = np.pi**2 / 2
# Textbook condition for depth 8 in units of the box.
KNOWN = np.array([0.6628034136891765, 2.603461128122489, 5.608649434860538]) * BOX


def differentiation(n, a, b):
    """nodes from b down to a and the matrix of the first derivative"""
    t = np.cos(np.pi * np.arange(n + 1) / n)
    c = np.ones(n + 1)
    c[[0, -1]] = 2
    c *= (-1.0) ** np.arange(n + 1)
    x = np.subtract.outer(t, t) + np.eye(n + 1)
    d = np.outer(c, 1 / c) / x
    d -= np.diag(d.sum(1))
    return (a + b) / 2 + (b - a) / 2 * t, d * 2 / (b - a)


def levels(inner=20, outer=34, far=3.7):
    """boundary values are eliminated: symmetry or zero in the middle, value and slope joined at the jump, zero far out"""
    out = []
    _, d1 = differentiation(inner, 0.0, 0.5)
    _, d2 = differentiation(outer, 0.5, far)
    size = inner + outer + 2
    h = np.zeros((size, size))
    h[: inner + 1, : inner + 1] = -0.5 * d1 @ d1
    h[inner + 1:, inner + 1:] = -0.5 * d2 @ d2 + 8 * BOX * np.eye(outer + 1)
    # x runs downwards in both domains: 0 is the jump from inside, `inner` the middle, inner + 1 far out, the last the jump from outside
    edge = [0, inner, inner + 1, size - 1]
    rest = [i for i in range(size) if i not in edge]
    for parity in (0, 1):
        c = np.zeros((4, size))
        c[0, 0], c[0, -1] = 1, -1
        c[1, : inner + 1], c[1, inner + 1:] = d1[0], -d2[-1]
        if parity == 0:
            c[2, : inner + 1] = d1[-1]
        else:
            c[2, inner] = 1
        c[3, inner + 1] = 1
        matrix = h[np.ix_(rest, rest)] - h[np.ix_(rest, edge)] @ np.linalg.solve(c[:, edge], c[:, rest])
        e = np.linalg.eigvals(matrix)
        e = e[abs(e.imag) < 1e-9].real
        out.extend(e[(e > 0) & (e < 8 * BOX)])
    return np.sort(out)


def error(found):
    return np.abs(found / KNOWN - 1).max() if len(found) == 3 else 1


serve({"collocation on two domains": (levels, error)})
