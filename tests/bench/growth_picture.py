"""Draws time against the number of values, one curve for each kind of work.

    /usr/bin/python3 growth_picture.py OUTPUT_FOLDER
"""
import sys
from pathlib import Path

import matplotlib

matplotlib.use("Agg")
import matplotlib.pyplot as pyplot  # noqa: E402
from matplotlib.ticker import FuncFormatter, NullLocator  # noqa: E402

from measurements import read_measurements, time_words  # noqa: E402

# Dark enough on white, told apart by people who do not tell red from green, and by their marks in print.
STYLES = (("#1b4f8a", "o"), ("#c8571b", "s"), ("#2a8c82", "^"), ("#8a3a77", "D"), ("#5c5c5c", "v"))
LINES = ((0.5, "the ceiling for anything automatic"), (0.01, "unnoticed below"))
COUNTS = {10: "10", 100: "100", 1000: "1,000", 10_000: "10,000", 100_000: "100,000", 1_000_000: "1 million"}


def curves(path):
    """{curve: ([values], [seconds])}; not a number, which breaks the curve, where no law was given."""
    found = {}
    for row, measured in read_measurements(path)["growth"].items():
        curve, values = row.rsplit("/", 1)
        counts, seconds = found.setdefault(curve, ([], []))
        counts.append(int(values))
        seconds.append(measured.seconds or float("nan"))
    return found


def draw(found, output):
    pyplot.rcParams.update({"font.family": "DejaVu Sans", "font.size": 10.5, "axes.edgecolor": "#888888",
                            "axes.spines.top": False, "axes.spines.right": False})
    figure, axes = pyplot.subplots(figsize=(9, 5.6), dpi=150)
    for seconds, words in LINES:
        axes.axhline(seconds, color="#aaaaaa", linewidth=1, linestyle=(0, (4, 4)), zorder=1)
        axes.text(10, seconds * 1.12, f"{time_words(seconds)}: {words}", color="#777777", fontsize=9)
    for (curve, (counts, seconds)), (colour, mark) in zip(found.items(), STYLES):
        axes.plot(counts, seconds, color=colour, marker=mark, markersize=4.5, linewidth=1.8, label=curve, zorder=2)
    axes.set_xscale("log")
    axes.set_yscale("log")
    axes.set_xticks(list(COUNTS))
    axes.xaxis.set_major_formatter(FuncFormatter(lambda count, _: COUNTS[round(count)]))
    axes.xaxis.set_minor_locator(NullLocator())
    axes.yaxis.set_major_formatter(FuncFormatter(lambda seconds, _: time_words(seconds * (1 + 1e-12))))
    axes.yaxis.set_minor_locator(NullLocator())
    axes.set_ylim(top=2)
    axes.grid(True, color="#e6e6e6", linewidth=0.8, zorder=0)
    axes.set_axisbelow(True)
    axes.set_xlabel("values in all")
    axes.set_ylabel("time of one computation")
    axes.set_title("Exact laws and estimates: time against the number of values", loc="left", fontsize=12.5, pad=14)
    axes.legend(frameon=False, loc="upper left", bbox_to_anchor=(0.0, -0.13), ncol=2, columnspacing=2.5)
    figure.savefig(output, bbox_inches="tight", facecolor="white")


if __name__ == "__main__":
    if len(sys.argv) != 2:
        sys.exit(__doc__)
    folder = Path(sys.argv[1])
    draw(curves(folder / "bench.json"), folder / "growth.png")
