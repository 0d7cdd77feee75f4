"""Writes ratios.md: the table of goals for README, in ratios, which differ less between machines than times do.

    /usr/bin/python3 ratios.py BUILD_FOLDER OUTPUT_FOLDER LOAD_BEFORE
"""
import json
import sys
from pathlib import Path

from goals import NONE, goal_words, size_words
from machine import machine_lines
from measurements import goals, markdown, ratio_words, read_measurements, read_true_errors, time_words


def cells(row, measured, errors, times):
    compared = row in times and measured.seconds
    faster = f"{ratio_words(times[row] / measured.seconds)} times as long" if compared else NONE
    return [row, time_words(measured.figures["goal"]), goal_words(measured), faster,
            size_words(measured.figures.get("bound")), size_words(errors.get(row))]


def main(build, output, load):
    output = Path(output)
    rows = goals(read_measurements(output / "bench.json")["goal"])
    errors = read_true_errors(output / "errors.tsv")
    times = json.loads((output / "scipy.json").read_text())
    table = markdown(["work", "goal", "ours / goal", "SciPy takes", "stated bound", "true error"],
                     [cells(row, measured, errors, times) for row, measured in rows.items()
                      if "goal" in measured.figures])
    (output / "ratios.md").write_text("\n".join([table, "", *machine_lines(build, float(load))]) + "\n")


if __name__ == "__main__":
    if len(sys.argv) != 4:
        sys.exit(__doc__)
    main(*sys.argv[1:])
