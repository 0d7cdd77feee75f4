"""What the benchmark programs wrote: each measurement by its name, as the least of its repetitions."""
import json
from dataclasses import dataclass, field
from pathlib import Path

UNITS = {"ns": 1e-9, "us": 1e-6, "ms": 1e-3, "s": 1.0}


@dataclass
class Measurement:
    seconds: float = None  # none where the row gave no result
    refusal: str = ""
    law: str = ""
    figures: dict = field(default_factory=dict)  # p, bound, predicted, goal


def _seconds(run):
    return run["cpu_time"] * UNITS[run["time_unit"]]


def read_measurements(path):
    """{table: {row: Measurement}}, both in the order of the program; a row's name may hold further slashes."""
    tables = {}
    runs = [run for run in json.loads(Path(path).read_text())["benchmarks"] if run["run_type"] == "iteration"]
    for run in sorted(runs, key=lambda run: run["family_index"]):  # they were interleaved
        table, row = run["run_name"].split("/", 1)
        found = tables.setdefault(table, {}).setdefault(row, Measurement())
        found.figures.update({name: run[name] for name in ("p", "bound", "predicted") if name in run})
        if run.get("error_occurred"):
            found.refusal = run["error_message"]
            continue
        found.law = run.get("label", "")
        found.seconds = min(_seconds(run), found.seconds or float("inf"))
    return tables


def read_true_errors(path):
    """{row: relative error}"""
    lines = Path(path).read_text().splitlines()
    return {row: float(error) for row, error in (line.split("\t") for line in lines)}


def goals(rows):
    """The rows named `seconds/what`, by what they are; the goal, if there is one, is among the figures."""
    found = {}
    for row, measured in rows.items():
        seconds, what = row.split("/", 1)
        if float(seconds) > 0:
            measured.figures["goal"] = float(seconds)
        found[what] = measured
    return found


def time_words(seconds):
    """Such as 2.87 us: three digits."""
    for unit, size in (("s", 1.0), ("ms", 1e-3), ("us", 1e-6)):
        if seconds >= size:
            return f"{seconds / size:.3g} {unit}"
    return f"{seconds / 1e-9:.3g} ns"


def ratio_words(ratio):
    """Such as 6,300 or 0.42: two digits below a hundred."""
    return f"{ratio:,.0f}" if ratio >= 100 else f"{ratio:.2g}"


def markdown(headings, rows, right_from=1):
    """A table; columns from `right_from` on are aligned to the right."""
    rule = ["---" if column < right_from else "---:" for column in range(len(headings))]
    return "\n".join("| " + " | ".join(cells) + " |" for cells in (headings, rule, *rows))
