"""Reference values of the oscillator functions phi_n(x), by the three-term recurrence in 320-bit fixed point.

phi_n = s_n p_n with s_{n+1} = sqrt(n/(n+1)) s_{n-1}, s_0 = s_1 = 1, turns the recurrence into
p_{n+1} = a_n x p_n - p_{n-1}, a_0 = a_1 = sqrt 2, a_{n+1} = n/(n+1) a_{n-1}, s_n = sqrt(a_n/sqrt 2):
no square root inside the loop. Whenever p has grown past 2^512 both neighbours are shifted down and the shift is
counted, so no point of the tail underflows. The recurrence is stable upwards: some 90 digits are carried, 40 are printed.

usage: /usr/bin/python3 hermite_reference.py > ../resources/ladderwell/numeric/hermite_reference.csv   (two minutes)
"""
import random
import sys

import mpmath

BITS = 320
mpmath.mp.prec = BITS


def ladder(x, wanted):
    """phi_n(x) for every n in wanted (ascending); x is an exact double."""
    top = max(wanted)
    X = int(mpmath.ldexp(mpmath.mpf(x), BITS))
    even = odd = int(mpmath.ldexp(mpmath.sqrt(2), BITS))
    start = mpmath.exp(-mpmath.mpf(x) ** 2 / 2) / mpmath.sqrt(mpmath.sqrt(mpmath.pi))
    previous, current, shift, n = 0, 1 << BITS, 0, 0
    found = {}
    wanted = set(wanted)
    root2 = mpmath.sqrt(2)
    while True:
        if n in wanted:
            a = even if n % 2 == 0 else odd
            s = mpmath.sqrt(mpmath.ldexp(mpmath.mpf(a), -BITS) / root2)
            found[n] = mpmath.ldexp(mpmath.mpf(current), shift - BITS) * s * start
        if n == top:
            return found
        a = even if n % 2 == 0 else odd
        previous, current = current, ((((a * X) >> BITS) * current) >> BITS) - previous
        # a_{n+2} = (n+1)/(n+2) a_n
        a = a * (n + 1) // (n + 2)
        if n % 2 == 0:
            even = a
        else:
            odd = a
        n += 1
        if n % 64 == 0 and abs(current) >> (BITS + 512):
            current >>= 512
            previous >>= 512
            shift += 512


def points(n, count, seed):
    """x across the swing of level n: centre, oscillating part, turning region in Airy lengths, tail."""
    r = random.Random(seed)
    mu = (2.0 * n + 1.0) ** 0.5
    airy = (2.0 * mu) ** (-1.0 / 3.0)
    fixed = [0.1 / mu, 0.5 * mu]
    turning = [mu + airy * z for z in (-40.0, -14.0, -12.3, -12.25, -12.15, -11.0, -6.0, -2.0, -0.5, 0.0, 0.7, 2.0, 5.0, 9.0,
                                       11.0, 12.1, 12.25, 12.5, 14.0, 20.0, 40.0, 60.0)]
    free = [mu * r.random() for _ in range(count)]
    near = [mu + airy * r.uniform(-30.0, 15.0) for _ in range(count)]
    return sorted(fixed + turning + free + near)


def main():
    plan = [
        (0, [1, 2, 3, 10, 30], 4), (50, [51, 60], 4), (200, [201, 250], 8), (400, [401, 447, 511, 512, 600, 1000], 8),
        (512, [513, 712, 1536, 4000], 10), (800, [801, 1000, 2848], 8), (2000, [2001, 2200, 5000], 8), (10000, [10001, 10200, 14000], 8),
        (20000, [20001, 20219], 8), (100000, [100001, 100200, 104000], 8), (996000, [996001, 996219, 998048, 1000000], 4),
        (999999, [1000000], 8),
    ]
    print("# phi_n(x) of the harmonic oscillator, 40 digits; columns n, x (exact double), phi")
    print("# made by physics/src/test/python/hermite_reference.py, Python %s, mpmath %s" % (sys.version.split()[0], mpmath.__version__))
    print("# command: /usr/bin/python3 hermite_reference.py > ../resources/ladderwell/numeric/hermite_reference.csv")
    for n, more, count in plan:
        for x in points(n, count, n):
            for level, value in sorted(ladder(x, [n] + more).items()):
                print("%d,%r,%s" % (level, x, mpmath.nstr(value, 40)))
        sys.stdout.flush()


if __name__ == "__main__":
    main()
