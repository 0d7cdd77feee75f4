"""Where the sample workbooks keep what: the line names, the data under each, the settings, the cells that answer."""
import re
from dataclasses import dataclass

from report import formula_cells, used_rows

HEADING_ROW, FIRST_LINE = 3, 4  # of Summary, Sentences and Data, from 0
FIRST_SETTING = 3


@dataclass(frozen=True)
class Plan:
    """A study, the columns of one block of Data that are its arguments, and whether Summary holds a target."""
    study: str
    columns: dict
    reference: bool = False


PLANS = {
    "ward-round-rota": Plan("groups", {"first": 1, "second": 0}),
    "walking-clinic": Plan("pairs", {"before": 0, "after": 1}),
    "laboratory-turnaround": Plan("groups", {"first": 0, "second": 1}),
    "arrival-to-treatment": Plan("single", {"values": 0}, reference=True),
}


class Layout:
    """One open workbook, read by position: nothing here uses the formulas that are to be checked."""

    def __init__(self, document, plan):
        self.plan = plan
        self.report, self.summary, self.sentences, self.data, self.settings = (
            document.Sheets.getByName(name) for name in ("Report", "Summary", "Sentences", "Data", "Settings"))

    def lines(self):
        """The row of each line name on Summary."""
        names = {}
        for row in range(FIRST_LINE, used_rows(self.summary)):
            name = self.summary.getCellByPosition(0, row).String
            if not name:
                break
            names[name] = row
        return names

    def arguments(self, line):
        """The cells of every argument of the study, for one line, without the rows in which none of them has a value
        below the last row in which one has."""
        headings = self.data.getCellRangeByPosition(0, HEADING_ROW, 50, HEADING_ROW).DataArray[0]
        start = headings.index(line)
        found = {name: self._filled(start + offset) for name, offset in self.plan.columns.items()}
        longest = max(map(len, found.values()))
        found = {name: rows + (("",),) * (longest - len(rows)) for name, rows in found.items()}
        if self.plan.reference:
            found["reference"] = ((self.summary.getCellByPosition(1, self.lines()[line]).Value,),)
        return found

    def _filled(self, column):
        rows = self.data.getCellRangeByPosition(column, FIRST_LINE, column, used_rows(self.data) - 1).DataArray
        last = max(index for index, (value,) in enumerate(rows) if value != "")
        return rows[:last + 1]

    def settings_block(self):
        return self.settings.getCellRangeByPosition(0, FIRST_SETTING, 1, used_rows(self.settings) - 1).DataArray

    def setting_cell(self, name):
        for row in range(FIRST_SETTING, used_rows(self.settings)):
            if self.settings.getCellByPosition(0, row).String == name:
                return self.settings.getCellByPosition(1, row)
        raise AssertionError(f"Settings has no row {name}")

    def chosen_line_cell(self):
        return self.report.getCellRangeByName("B3")

    def answers(self):
        """Every cell that asks a study: the cell, its line, its answer word, its settings."""
        settings = self.settings_block()
        for sheet in (self.report, self.summary, self.sentences):
            for cell in formula_cells(sheet):
                formula = cell.Formula
                if f"RKS.{self.plan.study.upper()}(" in formula:
                    own = re.search(r';"([^"]*)"\)$', formula)
                    yield cell, *self._asked(sheet, cell.CellAddress), ((own.group(1),),) if own else settings

    def _asked(self, sheet, address):
        if sheet.Name == "Report":
            return self.chosen_line_cell().String, sheet.getCellByPosition(0, address.Row).String
        return (sheet.getCellByPosition(0, address.Row).String,
                sheet.getCellByPosition(address.Column, HEADING_ROW).String)
