#!/usr/bin/python3
"""Compares librankstead, through its C contract, with an exact reference and with SciPy on random cases.

    /usr/bin/python3 compare.py --library build/capi/librankstead.so [--seed 1] [--cases 1500]

Prints how many cases were compared for each quantity; exit status 1 if any disagrees.
"""
import argparse
import sys

import check_reference
import compare_cases
import compare_large
from cases import cases
from library import Library
from tally import Tally


def main():
    parser = argparse.ArgumentParser(description=__doc__.splitlines()[0])
    parser.add_argument("--library", required=True, help="path of librankstead.so")
    parser.add_argument("--seed", type=int, default=20240607)
    parser.add_argument("--cases", type=int, default=1500)
    options = parser.parse_args()
    library, tally = Library(options.library), Tally()
    print("%s, seed %d" % (library.calls.rks_build().decode(), options.seed))
    check_reference.check(options.seed, tally)
    for case in cases(options.seed, options.cases):
        try:
            compare_cases.compare(library, case, tally)
        except AssertionError as refused:
            tally.holds("answered", case, False, str(refused))
    compare_large.compare(library, options.seed, tally)
    return tally.report()


if __name__ == "__main__":
    sys.exit(main())
