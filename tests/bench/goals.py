"""Makes the Markdown of goals.sh from what the programs wrote into one folder.

    /usr/bin/python3 goals.py BUILD_FOLDER OUTPUT_FOLDER LOAD_BEFORE
"""
import json
import sys
from pathlib import Path

from machine import machine_lines
from measurements import Measurement, goals, markdown, ratio_words, read_measurements, read_true_errors, time_words

NONE = "-"
NOTES = """\
- Times are the least of all repetitions, of the processor: it is one thread, and nothing waits.
- Rows of a p take ranked data in and give both tails. The statistic lies two standard deviations below its mean unless
  the row says otherwise.
- The true error is against whole numbers computed in this run; a dash: not feasible, or not in the time of this run.
- SciPy's times are for data without ties; those of the rank sum are of the first p of that size in a process, for it
  remembers its law. Cannot, size: it would take hours, or terabytes. It has no estimate: there NumPy writes down all
  differences and takes their median, without limits.
- Kruskal-Wallis, Friedman, Jonckheere-Terpstra and van Elteren are not in this version: their goals are left out."""


def scipy_words(row, times):
    """SciPy's time, or why it has none."""
    if row in times:
        return time_words(times[row]) + (" (NumPy)" if row.startswith("estimate") else "")
    if " p, " in row:
        return "cannot (size)" if "no ties" in row else "cannot (ties)"
    return NONE


def size_words(number):
    """Such as 2.4e-14; 0 is what it is."""
    return NONE if number is None else f"{number:.1e}" if number else "0"


def time_words_or_none(seconds):
    return time_words(seconds) if seconds else NONE


def goal_words(measured):
    """Ours over the goal."""
    return ratio_words(measured.seconds / measured.figures["goal"]) if measured.seconds else "missed"


def goal_cells(row, measured, errors, times):
    goal = measured.figures.get("goal")
    ours = measured.seconds
    return [row, time_words(goal) if goal else NONE,
            time_words(ours) if ours else measured.refusal,
            goal_words(measured) if goal else NONE,
            scipy_words(row, times),
            ratio_words(times[row] / ours) if ours and row in times else NONE,
            measured.law or NONE,
            *(size_words(measured.figures.get(name)) for name in ("p", "bound")), size_words(errors.get(row))]


def goals_section(rows, errors, times):
    unknown = sorted({*errors, *times} - set(rows))
    if unknown:
        raise SystemExit(f"no row is called {', '.join(unknown)}")
    with_goal = [row for row in rows.values() if row.figures.get("goal")]
    reached = sum(1 for row in with_goal if row.seconds and row.seconds <= row.figures["goal"])
    kept = sum(1 for row in errors if errors[row] <= rows[row].figures["bound"])
    return [
        "## Goals", "",
        markdown(["work", "goal", "ours", "ours / goal", "SciPy", "SciPy / ours", "law", "smaller tail",
                  "stated bound", "true error"],
                 [goal_cells(row, measured, errors, times) for row, measured in rows.items()]), "",
        f"{reached} of {len(with_goal)} goals reached. The true error is within the stated bound in {kept} of "
        f"{len(errors)} rows.", "", NOTES]


def calc_section(calc, engine):
    """`engine`: the same questions through the C interface."""
    block, cell, small = calc["block"], calc["cell"], calc["small"]
    reading = (block["known"] - cell["known"]) / (block["cells"] - 1)
    a_cell = small["new"] / small["cells"]
    in_library = engine["10 answers on 18 pairs"].seconds / 10
    goal = 10e-6 + 0.6e-3 * small["values"] / 1000
    rows = [
        [f"{block['cells']} answers over one new table of {block['values']:,} tied values", time_words(block["new"]),
         f"{ratio_words(block['new'] / cell['new'])} times one answer over such a table ({time_words(cell['new'])})"],
        [f"the same {block['cells']} answers, known to the memo", time_words(block["known"]),
         f"{time_words(reading)} a cell: {time_words(reading / block['values'] * 1000)} for each 1,000 cells read "
         "(goal: 0.6 ms)"],
        ["what is new in the former, median", time_words(block["analysis"]),
         f"{ratio_words(block['analysis'] / cell['analysis'])} times what is new in one answer: 1 is one analysis"],
        [f"{small['cells']:,} answers over {small['tables']} new tables of 18 pairs", time_words(small["new"]),
         f"{time_words(a_cell)} a cell; {time_words(in_library)} of it in the library; "
         f"{time_words(a_cell - in_library)} beyond (goal: {time_words(goal)})"]]
    return ["## In Calc", "", markdown(["one hard recalculation of", "time", "that is"], rows, right_from=3)]


def crossover_section(rows):
    """One line for each size; the fastest law beside the one that is chosen."""
    sizes = {}
    for row, measured in rows.items():
        shape, values, law = row.rsplit("/", 2)
        sizes.setdefault((shape, values), {})[law] = measured
    laws = [law for law in dict.fromkeys(law for found in sizes.values() for law in found) if law != "chosen"]
    foreseen = {law for found in sizes.values() for law in found if "predicted" in found[law].figures}
    lines = []
    for (shape, values), found in sizes.items():
        cells = [shape, values]
        for law in laws:
            measured = found.get(law, Measurement())
            if law in foreseen:
                cells.append(time_words_or_none(measured.figures.get("predicted")))
            cells.append(time_words_or_none(measured.seconds))
        chosen = found["chosen"]
        fastest = min((measured.seconds for measured in found.values() if measured.seconds), default=None)
        cells += [chosen.law or NONE, time_words(chosen.seconds) if chosen.seconds else chosen.refusal,
                  ratio_words(chosen.seconds / fastest) if chosen.seconds else NONE]
        lines.append(cells)
    headings = ["shape", "values"]
    for law in laws:
        headings += [f"{law}, predicted", "measured"] if law in foreseen else [law]
    return ["## Crossovers of the laws", "",
            markdown([*headings, "chosen", "takes", "of the fastest"], lines), "",
            "`chosen` is what a study gets. The law that counts all statistics at once in whole numbers, for small "
            "samples without ties, is measured only where it is chosen."]


def main(build, output, load):
    output = Path(output)
    tables = read_measurements(output / "bench.json")
    sections = [["# Rankstead: times and errors", "", *machine_lines(build, float(load))],
                goals_section(goals(tables["goal"]), read_true_errors(output / "errors.tsv"),
                              json.loads((output / "scipy.json").read_text()))]
    if (output / "calc.json").exists():
        sections.append(calc_section(json.loads((output / "calc.json").read_text()), tables["calc"]))
    sections += [["## Growth", "", "![Time against the number of values](growth.png)"],
                 crossover_section(tables["crossover"])]
    text = "\n\n".join("\n".join(lines) for lines in sections) + "\n"
    (output / "goals.md").write_text(text)
    print(text, end="")


if __name__ == "__main__":
    if len(sys.argv) != 4:
        sys.exit(__doc__)
    main(*sys.argv[1:])
