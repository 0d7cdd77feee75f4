"""What a cell costs in a real Calc beyond the engine, as JSON {row: seconds}.

    /usr/bin/python3 calc_cells.py EXTENSION SCRATCH_FOLDER OUTPUT [--quick]

All rows are measured in one process of the office. The data are new before each recalculation, unless the row says
that the memo knows them. Times are those of one hard recalculation of the document, seen from outside the office.
"""
import json
import random
import sys
import time
from pathlib import Path
from statistics import median

sys.path.insert(0, str(Path(__file__).resolve().parents[2] / "workbooks"))
from office import Office, OfficeError, property_values  # noqa: E402

# A report block: the fourteen number answers and texts that a page shows most.
BLOCK = ("p", "estimate", "lower", "upper", "confidence", "chance", "statistic", "method", "accuracy", "n first",
         "n second", "sentence", "notes", "check")
WORDS = ("p", "estimate", "lower", "upper", "n", "zeros", "method", "notes", "sentence", "check")
LEVELS = 13
A_SIDE = 1000
TABLES = 200
PAIRS = 18


def tied(generator, count, levels):
    return [float(generator.randrange(levels)) for _ in range(count)]


class Sheet:
    """The only sheet of a new document that is recalculated on demand."""

    def __init__(self, office):
        self.document = office.open_new()
        self.document.enableAutomaticCalculation(False)
        self.cells = self.document.Sheets.getByIndex(0)

    def range(self, name):
        return self.cells.getCellRangeByName(name)

    def put_rows(self, name, rows):
        self.range(name).setDataArray(tuple(tuple(row) for row in rows))

    def recalculation(self):
        begin = time.perf_counter()
        self.document.calculateAll()
        return time.perf_counter() - begin

    def require_answers(self, checks):
        """Nothing is measured that is not an answer."""
        for row in self.range(checks).getDataArray():
            if any(shown != "ok" for shown in row):
                raise OfficeError(f"{checks} shows {row} instead of ok")

    def close(self):
        self.document.close(True)


class MeasuredOffice(Office):
    def open_new(self):
        document = self.desktop.loadComponentFromURL("private:factory/scalc", "_blank", 0, property_values(Hidden=True))
        if document is None:
            raise OfficeError("the office opens no new document")
        return document


def large_table(office, answers, repetitions, shift):
    """Seconds of one recalculation with new data, with data that the memo knows, and of the difference. The tables are
    the same for all `answers`, but for the shift, which makes them new to the memo and no other work."""
    generator = random.Random(20)
    sheet = Sheet(office)
    last = len(answers)
    sheet.put_rows(f"D1:D{last}", [[word] for word in answers])
    for row in range(1, last + 1):
        sheet.range(f"E{row}").setFormula(f"=RKS.GROUPS($A$1:$A${A_SIDE};$B$1:$B${A_SIDE};D{row})")
    new, known = [], []
    for _ in range(repetitions):
        table = zip(tied(generator, A_SIDE, LEVELS), tied(generator, A_SIDE, LEVELS))
        sheet.put_rows(f"A1:B{A_SIDE}", [(first + shift, second + shift) for first, second in table])
        new.append(sheet.recalculation())
        known.append(sheet.recalculation())
    if "check" in answers:
        sheet.require_answers(f"E{answers.index('check') + 1}")
    sheet.close()
    return {"new": min(new), "known": min(known), "analysis": median(map(float.__sub__, new, known))}


def small_tables(office, repetitions):
    """Seconds of one recalculation: a row for each table, its answers in A to J, its pairs in L to AU."""
    generator = random.Random(18)
    sheet = Sheet(office)
    sheet.put_rows("A1:J1", [WORDS])
    sheet.range(f"A2:J{TABLES + 1}").setFormulaArray(tuple(
        tuple(f"=RKS.PAIRS($L{row}:$AC{row};$AD{row}:$AU{row};{column}$1)" for column in "ABCDEFGHIJ")
        for row in range(2, TABLES + 2)))
    times = []
    for _ in range(repetitions):
        sheet.put_rows(f"L2:AU{TABLES + 1}", [tied(generator, 2 * PAIRS, 40) for _ in range(TABLES)])
        times.append(sheet.recalculation())
    sheet.require_answers(f"J2:J{TABLES + 1}")
    sheet.close()
    return min(times)


def main(extension, scratch, output, quick):
    repetitions = 5 if quick else 20
    with MeasuredOffice(extension, scratch) as office:
        block = large_table(office, BLOCK, repetitions, 0)
        cell = large_table(office, BLOCK[:1], repetitions, 100)
        small = small_tables(office, repetitions)
    Path(output).write_text(json.dumps({
        "block": {**block, "cells": len(BLOCK), "values": 2 * A_SIDE}, "cell": cell,
        "small": {"new": small, "cells": TABLES * len(WORDS), "tables": TABLES, "values": 2 * PAIRS}}, indent=1))


if __name__ == "__main__":
    if len(sys.argv) not in (4, 5) or sys.argv[4:] not in ([], ["--quick"]):
        sys.exit(__doc__)
    main(*sys.argv[1:4], "--quick" in sys.argv)
