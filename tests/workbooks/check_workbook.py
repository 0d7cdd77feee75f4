"""Checks one sample workbook in a real office: check_workbook.py WORKBOOK EXTENSION LIBRARY SCRATCH_FOLDER"""
import sys
import unittest
from pathlib import Path

sys.path.insert(0, str(Path(__file__).resolve().parents[2] / "workbooks"))
from office import Office  # noqa: E402
from report import faults, formula_cells, position, report_lines  # noqa: E402

from library_answers import Question, open_library  # noqa: E402
from workbook_layout import FIRST_LINE, PLANS, Layout  # noqa: E402

WORKBOOK = EXTENSION = LIBRARY = SCRATCH = None


class Workbook(unittest.TestCase):
    @classmethod
    def setUpClass(cls):
        cls.library = open_library(LIBRARY)
        cls.plan = PLANS[WORKBOOK.stem]
        cls.office = cls.enterClassContext(Office(EXTENSION, SCRATCH / "office"))

    def setUp(self):
        self.document = self.open(WORKBOOK)

    def open(self, path):
        document = self.office.open(path)
        self.addCleanup(document.close, True)
        return document

    def assert_answers(self, document):
        """Every answering cell shows exactly what the library says of the same cells."""
        layout = Layout(document, self.plan)
        asked = {}
        for cell, line, word, settings in layout.answers():
            asked.setdefault((line, settings), []).append((cell, word))
        for (line, settings), cells in asked.items():
            with Question(self.library, self.plan.study, layout.arguments(line), settings) as question:
                for cell, word in cells:
                    self.assert_shows(cell, question.answer(word))
        self.assertGreaterEqual(sum(map(len, asked.values())), 80)

    def assert_shows(self, cell, expected):
        with self.subTest(cell=position(cell)):
            self.assertEqual(cell.Value if isinstance(expected, float) else cell.String, expected)

    def test_a_fresh_open_shows_what_the_library_says(self):
        self.assert_answers(self.document)

    def test_a_hard_recalculation_changes_nothing_and_nothing_is_an_error(self):
        self.document.calculateAll()
        self.assert_answers(self.document)
        self.assertEqual(faults(self.document), [])

    def test_settings_govern_every_cell(self):
        layout = Layout(self.document, self.plan)
        before = layout.summary.getCellRangeByName("A1:N20").DataArray
        layout.setting_cell("level").Value = 0.8
        self.assert_answers(self.document)
        self.assertNotEqual(layout.summary.getCellRangeByName("A1:N20").DataArray, before)

    def test_the_report_follows_the_chosen_line(self):
        layout = Layout(self.document, self.plan)
        lines = layout.lines()
        self.assertIn(layout.chosen_line_cell().String, lines)
        for line in lines:
            layout.chosen_line_cell().String = line
            self.assert_answers(self.document)
            self.assertEqual(faults(self.document), [])

    def test_one_formula_fills_each_block(self):
        layout = Layout(self.document, self.plan)
        for sheet in (layout.report, layout.summary, layout.sentences):
            answering = [cell for cell, *_ in layout.answers()
                         if cell.Spreadsheet.Name == sheet.Name and "Settings." in cell.Formula]
            formulas = [cell.Formula for cell in answering]
            for cell in answering[1:]:
                sheet.copyRange(cell.CellAddress, answering[0].RangeAddress)
            self.assertEqual([cell.Formula for cell in answering], formulas)

    def test_saved_as_ods_and_xlsx_and_opened_again(self):
        formulas = sum(1 for sheet in self.document.Sheets for _ in formula_cells(sheet))
        for ending, export_filter in (("ods", "calc8"), ("xlsx", "Calc MS Excel 2007 XML")):
            with self.subTest(ending=ending):
                path = SCRATCH / f"{WORKBOOK.stem}.{ending}"
                self.office.save(self.document, path, export_filter)
                again = self.open(path)
                again.calculateAll()
                self.assert_answers(again)
                self.assertEqual(faults(again), [])
                self.assertEqual(sum(1 for sheet in again.Sheets for _ in formula_cells(sheet)), formulas)

    def test_the_data_hold_ties_and_blanks(self):
        layout = Layout(self.document, self.plan)
        columns = [[row[0] for row in rows] for line in layout.lines()
                   for name, rows in layout.arguments(line).items() if name != "reference"]
        numbers = [[value for value in column if isinstance(value, float)] for column in columns]
        self.assertTrue(any(len(set(column)) < len(column) for column in numbers), "no ties")
        self.assertTrue(any("" in column for column in columns), "no blanks above a value")

    def test_the_report_carries_caution_and_build(self):
        shown = " ".join(" ".join(report_lines(self.document)).split())
        self.assertIn(" ".join(self.library.calls.rks_caution_line().decode().split()), shown)
        self.assertIn(self.library.calls.rks_build().decode(), shown)


if __name__ == "__main__":
    if len(sys.argv) != 5:
        sys.exit(__doc__)
    WORKBOOK, EXTENSION, LIBRARY, SCRATCH = (Path(argument).resolve() for argument in sys.argv[1:])
    SCRATCH.mkdir(parents=True, exist_ok=True)
    unittest.main(argv=sys.argv[:1], verbosity=2)
