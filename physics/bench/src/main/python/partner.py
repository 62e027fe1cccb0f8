"""What all NumPy partners share: they time their variants when asked, and say what errors they reach.

A partner is started once per task. It prints one line `ready`, a tab and the OpenBLAS kernel with its threads. For each line `go` it reads
it times every variant and prints `name<TAB>milliseconds<TAB>error` for each, then an empty line. It ends with its input.
"""
import sys
import time

import numpy  # noqa: F401  (loads the BLAS library before it is asked about)


def blas():
    """The OpenBLAS kernel in use and its number of threads."""
    try:
        from threadpoolctl import threadpool_info
    except ImportError:
        return "unknown (python3-threadpoolctl is not installed)"
    found = ["%s, %d thread%s, OpenBLAS %s" % (i["architecture"], i["num_threads"], "s"[: i["num_threads"] > 1], i["version"])
             for i in threadpool_info() if i.get("internal_api") == "openblas"]
    return "; ".join(found) or "no OpenBLAS"


def sample(work, least=0.3):
    """Shortest time of work() in ms over at least `least` seconds or three runs. The last result is kept, as a notebook keeps it."""
    times, result = [], None
    start = time.perf_counter()
    while len(times) < 3 or time.perf_counter() - start < least:
        before = time.perf_counter()
        result = work()  # noqa: F841
        times.append(time.perf_counter() - before)
    return min(times) * 1e3


def serve(variants):
    """variants: {name: (work, error)}; error takes what work returned and gives the largest error."""
    errors = {}
    for name, (work, error) in variants.items():
        errors[name] = float(error(work()))
    print("ready\t" + blas(), flush=True)
    for line in sys.stdin:
        if line.strip() != "go":
            break
        for name, (work, _) in variants.items():
            work()
            print("%s\t%.6f\t%.3g" % (name, sample(work), errors[name]))
        print(flush=True)
