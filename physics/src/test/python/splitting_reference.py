"""Splitting of the lowest pair of p^2 - 25 x^2 + x^4 with 60 digits: parity-split oscillator bases, two widths and sizes must agree."""
from mpmath import mp, mpf, sqrt


def band(size, omega, parity):
    """Rows of p^2 - 25 x^2 + x^4 on states parity, parity + 2, ..."""
    x2, p2 = 1 / (2 * mpf(omega)), mpf(omega) / 2
    n = [2 * j + parity for j in range(size)]
    d = [p2 * (2 * k + 1) - 25 * x2 * (2 * k + 1) + x2 * x2 * (6 * k * k + 6 * k + 3) for k in n]
    e = [(-p2 - 25 * x2 + x2 * x2 * (4 * k + 6)) * sqrt(mpf((k + 1) * (k + 2))) for k in n]
    f = [x2 * x2 * sqrt(mpf((k + 1) * (k + 2) * (k + 3) * (k + 4))) for k in n]
    return d, e, f


def lowest(size, omega, parity, guess):
    """Inverse iteration with the Rayleigh quotient on the pentadiagonal matrix, LDL^T without exchanges."""
    d, e, f = band(size, omega, parity)
    v, value = [mpf(1) / (1 + (j - 40) ** 2) for j in range(size)], mpf(guess)
    for _ in range(8):
        a, l1, l2 = [], [], []
        for j in range(size):
            q = d[j] - value - (l1[j - 1] ** 2 * a[j - 1] if j else 0) - (l2[j - 2] ** 2 * a[j - 2] if j > 1 else 0)
            a.append(q)
            l1.append((e[j] - (l2[j - 1] * l1[j - 1] * a[j - 1] if j else 0)) / q)
            l2.append(f[j] / q)
        y = list(v)
        for j in range(size):
            y[j] -= (l1[j - 1] * y[j - 1] if j else 0) + (l2[j - 2] * y[j - 2] if j > 1 else 0)
        y = [y[j] / a[j] for j in range(size)]
        for j in reversed(range(size)):
            y[j] -= (l1[j] * y[j + 1] if j + 1 < size else 0) + (l2[j] * y[j + 2] if j + 2 < size else 0)
        norm = sqrt(sum(t * t for t in y))
        v = [t / norm for t in y]
        value = sum(v[j] * (d[j] * v[j] + 2 * (e[j] * v[j + 1] if j + 1 < size else 0) + 2 * (f[j] * v[j + 2] if j + 2 < size else 0))
                    for j in range(size))
    return value


mp.dps = 60
for size, omega in ((220, 6), (260, 7)):
    even, odd = (lowest(size, omega, parity, -149.2194561421909) for parity in (0, 1))
    print(size, omega, mp.nstr(even, 20), mp.nstr(odd - even, 15))
