"""What the library answers about a sheet's cells when it is asked without an office: through its C contract."""
import sys
from ctypes import byref, c_char_p, c_void_p
from pathlib import Path

sys.path.insert(0, str(Path(__file__).resolve().parents[1] / "scipy"))
from library import BLANK, OK, Cell, Inquiry, Library  # noqa: E402


def open_library(path):
    library = Library(str(path))
    library.calls.rks_caution_line.restype = c_char_p
    return library


def cells(rows):
    """A block of cells as the office hands it out: a number, a text, or an empty text for a blank."""
    flat = [value for row in rows for value in row]
    block = (Cell * len(flat))()
    for cell, value in zip(block, flat):
        if isinstance(value, str):
            cell.text = value.encode()
            cell.length = len(cell.text)
            cell.kind = 2 if value else 0
        else:
            cell.kind, cell.number = 1, value
    return block, len(rows), len(rows[0])


class Question(Inquiry):
    """One study about blocks of cells, governed by a block of settings; run when it is made."""

    def __init__(self, library, study, arguments, settings):
        self.calls = library.calls
        self.handle = c_void_p()
        self._require(self.calls.rks_inquiry_new(study.encode(), byref(self.handle)), "new")
        blocks = {name: cells(rows) for name, rows in {**arguments, "settings": settings}.items()}
        for name, block in blocks.items():
            self._require(self.calls.rks_inquiry_cells(self.handle, name.encode(), *block), name)
        self._require(self.calls.rks_inquiry_run(self.handle), "run")

    def answer(self, word):
        """The number or the text that a cell is to show; an empty text where there is nothing to show."""
        status, number = self.status_and_number(word)
        if status == OK:
            return number
        return "" if status == BLANK else self.text(word)
