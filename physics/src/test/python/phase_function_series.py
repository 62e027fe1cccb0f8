"""Derives the exact coefficients in PhaseFunction.java and prints them.

usage: /usr/bin/python3 phase_function_series.py        (seconds; only the standard library)

Turning point. With x = mu t, mu^2 = 2n+1, d = 1 - t, e = mu^-4 and Z = 2^(1/3) mu^(4/3) W(d), the equation
Z Z'^2 - {Z,x}/2 = x^2 - mu^2 reads 2 W W'^2 = -2 d + d^2 + e/2 {W,d}; W = W0 + e W1 + e^2 W2 + ... as power series in d.

WKB. y'' = mu^4 (t^2-1) y in t, y = exp(int S), S = sum mu^(2-2k) q_k(t) (t^2-1)^(-(3k-1)/2), q_0 = -1 (decaying for t > 1).
Odd orders of log y are integrals p(t) (t^2-1)^(-3k/2); even ones follow from them as -1/2 log of the phase's slope.
"""
from fractions import Fraction as F

TERMS = 14


def times(a, b, terms=None):
    product = [F(0)] * (len(a) + len(b) - 1)
    for i, x in enumerate(a):
        for j, y in enumerate(b):
            product[i + j] += x * y
    return product if terms is None else (product + [F(0)] * terms)[:terms]


def plus(a, b, factor=1):
    n = max(len(a), len(b))
    return [(a[i] if i < len(a) else F(0)) + factor * (b[i] if i < len(b) else F(0)) for i in range(n)]


def slope(a):
    return [i * a[i] for i in range(1, len(a))] + [F(0)]


def inverse(a):
    r = [1 / a[0]] + [F(0)] * (len(a) - 1)
    for k in range(1, len(a)):
        r[k] = -sum(a[i] * r[k - i] for i in range(1, k + 1)) / a[0]
    return r


def leading():
    """W0 = -d S^(2/3), S = sum 3 binomial(1/2,k) (-d/2)^k/(2k+3)."""
    s, c = [], F(1)
    for k in range(TERMS):
        s.append(3 * c * F(-1, 2) ** k / (2 * k + 3))
        c *= (F(1, 2) - k) / (k + 1)
    f = [F(1)] + [F(0)] * (TERMS - 1)
    for k in range(1, TERMS):
        f[k] = sum((F(2, 3) * i - (k - i)) * s[i] * f[k - i] for i in range(1, k + 1)) / k
    return [F(0)] + [-v for v in f[: TERMS - 1]]


def schwarzian(orders):
    """The orders in e of {W,d} = g' - g^2/2, g = W''/W'."""
    first = [slope(w) for w in orders]
    second = [slope(w) for w in first]
    head, g = inverse(first[0]), []
    for k in range(len(orders)):
        rest = second[k]
        for j in range(k):
            rest = plus(rest, times(g[j], first[k - j], TERMS), -1)
        g.append(times(rest, head, TERMS))
    result = []
    for k in range(len(orders)):
        s = slope(g[k])
        for j in range(k + 1):
            s = plus(s, times(g[j], g[k - j], TERMS), F(-1, 2))
        result.append(s)
    return result


def turning_point():
    orders = [leading()]
    for k in (1, 2):
        first = [slope(w) for w in orders]
        right = [v / 4 for v in schwarzian(orders)[k - 1]]
        for a in range(k):
            for b in range(k):
                if 0 <= k - a - b < k:
                    right = plus(right, times(times(orders[a], first[b], TERMS), first[k - a - b], TERMS), -1)
        a = [2 * v for v in times(orders[0], first[0], TERMS)]
        b = times(first[0], first[0], TERMS)
        w = [F(0)] * TERMS
        for j in range(TERMS):
            known = sum(a[i] * w[j - i + 1] * (j - i + 1) for i in range(2, j + 1)) + sum(b[i] * w[j - i] for i in range(1, j + 1))
            w[j] = (right[j] - known) / (a[1] * j + b[0])
        orders.append(w)
    return orders


def wkb():
    d = [F(-1), F(0), F(1)]
    q = [[F(-1)]]
    for k in range(1, 5):
        right = plus(times(slope(q[-1]), d), times([F(0), F(3 * k - 4)], q[-1]), -1)
        for j in range(1, k):
            right = plus(right, times(q[j], q[k - j]))
        q.append([v / 2 for v in right])
    second = [v / 2 for v in q[2]]
    ratio = [-v for v in q[4]]
    fourth = [-v / 2 for v in plus(ratio, times(q[2], q[2]), F(-1, 2))]
    odd = []
    for m in (1, 2):
        top = 6 * m - 3
        right, p = q[2 * m] + [F(0)] * 20, [F(0)] * (top + 2)
        p[1] = -right[0]
        for j in range(2, top, 2):
            p[j + 1] = ((j - 1 - top) * p[j - 1] - right[j]) / (j + 1)
        odd.append(p)
    return odd[0], second, odd[1], fourth


def main():
    for k, w in enumerate(turning_point()):
        print("W%d:" % k, ", ".join(str(v) if k < 1 or i < 5 else repr(float(v)) for i, v in enumerate(w[:10])))
    for k, p in enumerate(wkb(), 1):
        print("order %d:" % k, " + ".join("(%s) t^%d" % (v, i) for i, v in enumerate(p) if v))


if __name__ == "__main__":
    main()
