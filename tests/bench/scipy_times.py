"""How long SciPy takes for those rows of the table of goals that it can do, as JSON {row: seconds of the processor}.

    /usr/bin/python3 scipy_times.py OUTPUT [--quick]

Its exact rank sum law keeps what it has computed for as long as the process lives, so each measurement is made in a
process of its own, which has answered for samples of five before: as the first p of its size in a run of Python.
"""
import json
import multiprocessing
import random
import sys
import time
from pathlib import Path

import numpy
from scipy import stats

DEVIATIONS = 2  # of the statistic below its mean, as in the rows of ours


def changes(n):
    """1 to n with signs, and T+ that far below its mean."""
    order = random.Random(21).sample(range(1, n + 1), n)
    excess = n * (n + 1) / 4 + DEVIATIONS * (n * (n + 1) * (2 * n + 1) / 24) ** 0.5
    for place, size in enumerate(order):
        if excess <= 0:
            break
        order[place] = -size
        excess -= size
    return numpy.array(order, dtype=float)


def two_samples(m, n):
    """1 to m + n, with U of the first sample that far below its mean."""
    generator = random.Random(20)
    pooled = generator.sample(range(1, m + n + 1), m + n)
    wanted = m * (m + n + 1) / 2 - DEVIATIONS * (m * n * (m + n + 1) / 12) ** 0.5
    total = sum(pooled[:m])
    while total > wanted:
        mine, other = generator.randrange(m), generator.randrange(m, m + n)
        if pooled[mine] > pooled[other]:
            total -= pooled[mine] - pooled[other]
            pooled[mine], pooled[other] = pooled[other], pooled[mine]
    return numpy.array(pooled[:m], dtype=float), numpy.array(pooled[m:], dtype=float)


def samples_with(m, n, u):
    """As above, with this U: u // n values of the first sample above the second, and one within it."""
    above, within = divmod(u, n)
    first = [*range(1, m - above), m - above + within, *range(m + n - above + 1, m + n + 1)][-m:]
    second = sorted(set(range(1, m + n + 1)) - set(first))
    return numpy.array(first, dtype=float), numpy.array(second, dtype=float)


def signed_rank(n):
    data = changes(n)
    return lambda: stats.wilcoxon(data, method="exact")


def rank_sum(m, n, u=None):
    first, second = two_samples(m, n) if u is None else samples_with(m, n, u)
    if u is not None:
        assert stats.mannwhitneyu(first, second, method="asymptotic").statistic == u
    return lambda: stats.mannwhitneyu(first, second, method="exact")


def median_difference(m, n):
    first, second = two_samples(m, n)
    return lambda: numpy.median(numpy.subtract.outer(first, second))


# Row: work, processes, and calls in each; only the rank sum law remembers. SciPy has no estimate; NumPy can take the
# median of all differences once they are written down.
ROWS = {
    **{f"signed rank p, no ties, n = {n}": (signed_rank(n), 1, 50) for n in (10, 25, 50)},
    "signed rank p, no ties, n = 1e3": (signed_rank(1000), 1, 3),
    **{f"rank sum p, no ties, {n} v {n}": (rank_sum(n, n), processes, 1)
       for n, processes in ((10, 20), (25, 10), (50, 3))},
    "rank sum p, no ties, 100 v 100": (rank_sum(100, 100), 1, 1),
    "rank sum p, no ties, 100 v 100, U = 500": (rank_sum(100, 100, 500), 3, 1),
    "estimate and table limits, no ties, 1e3 a side": (median_difference(1000, 1000), 1, 5),
}


def seconds_of(work):
    begin = time.process_time()
    work()
    return time.process_time() - begin


def measure(work, calls, answers):
    signed_rank(5)()
    rank_sum(5, 5)()
    answers.put(min(seconds_of(work) for _ in range(calls)))


def seconds_in_a_fresh_process(work, calls):
    context = multiprocessing.get_context("fork")
    answers = context.Queue()
    process = context.Process(target=measure, args=(work, calls, answers))
    process.start()
    seconds = answers.get(timeout=300)
    process.join()
    return seconds


def main(output, quick):
    times = {row: min(seconds_in_a_fresh_process(work, calls) for _ in range(min(processes, 3) if quick else processes))
             for row, (work, processes, calls) in ROWS.items()}
    Path(output).write_text(json.dumps(times, indent=1))


if __name__ == "__main__":
    if len(sys.argv) not in (2, 3) or sys.argv[2:] not in ([], ["--quick"]):
        sys.exit(__doc__)
    main(sys.argv[1], "--quick" in sys.argv)
