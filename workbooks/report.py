"""What a workbook shows: its formula cells, its faults, and its report as lines for a terminal."""
import re
import textwrap

ERROR_RESULTS = 4  # com.sun.star.sheet.FormulaResult.ERROR
ANY_RESULT = 7
SHOWN_AS_ERROR = re.compile(r"Err:\d+|#[A-Z0-9/]+[!?]?|#+")
NOT_COMPUTED = "Not computed:"


def sheets(document):
    return [document.Sheets.getByIndex(index) for index in range(document.Sheets.Count)]


def formula_cells(sheet):
    """Every cell with a formula, in reading order of each range."""
    for area in sheet.queryFormulaCells(ANY_RESULT).RangeAddresses:
        for row in range(area.StartRow, area.EndRow + 1):
            for column in range(area.StartColumn, area.EndColumn + 1):
                yield sheet.getCellByPosition(column, row)


def position(cell):
    """Such as Summary.C7."""
    return cell.AbsoluteName.replace("$", "")


def fault(cell):
    """What is wrong with a cell, or None."""
    shown = cell.String
    if cell.getError() != 0 or SHOWN_AS_ERROR.fullmatch(shown):
        return f"{position(cell)} shows {shown or cell.getError()}"
    if shown.startswith(NOT_COMPUTED):
        return f"{position(cell)}: {shown}"
    return None


def faults(document):
    """Every formula cell that shows an error. A workbook without our formulas is a fault as well."""
    cells = [cell for sheet in sheets(document) for cell in formula_cells(sheet)]
    found = [words for words in map(fault, cells) if words]
    if not any("RKS." in cell.Formula for cell in cells):
        found.append("no cell asks Rankstead for anything")
    return found


def used_rows(sheet):
    cursor = sheet.createCursor()
    cursor.gotoEndOfUsedArea(False)
    return cursor.RangeAddress.EndRow + 1


def report_lines(document, width=110):
    """The Report sheet, labels and values aligned, long texts wrapped beside their label."""
    sheet = document.Sheets.getByName("Report")
    rows = [(sheet.getCellByPosition(0, row).String, sheet.getCellByPosition(1, row).String)
            for row in range(used_rows(sheet))]
    left = max(len(label) for label, value in rows if value) + 2
    lines = []
    for label, value in rows:
        if not value:
            lines += textwrap.wrap(label, width) or [""]
            continue
        first, *rest = textwrap.wrap(value, width - left) or [""]
        lines += [label.ljust(left) + first] + [" " * left + more for more in rest]
    return lines
