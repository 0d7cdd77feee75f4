"""The public C contract, called through ctypes: what a foreign program sees of the library."""
import ctypes
from ctypes import POINTER, Structure, byref, c_char_p, c_double, c_int32, c_size_t, c_void_p

OK, BLANK, NO_ANSWER = 0, 1, 50


class Cell(Structure):
    _fields_ = [("kind", c_int32), ("reserved", c_int32), ("number", c_double), ("text", c_char_p),
                ("length", c_size_t)]


class Library:
    """The calls, with their argument types declared once."""

    def __init__(self, path):
        self.calls = calls = ctypes.CDLL(path)
        calls.rks_inquiry_new.argtypes = [c_char_p, POINTER(c_void_p)]
        calls.rks_inquiry_free.argtypes = [c_void_p]
        calls.rks_inquiry_free.restype = None
        calls.rks_inquiry_cells.argtypes = [c_void_p, c_char_p, POINTER(Cell), c_size_t, c_size_t]
        calls.rks_inquiry_set.argtypes = [c_void_p, c_char_p, c_char_p]
        calls.rks_inquiry_run.argtypes = [c_void_p]
        calls.rks_inquiry_number.argtypes = [c_void_p, c_char_p, POINTER(c_double)]
        calls.rks_inquiry_text.argtypes = [c_void_p, c_char_p, POINTER(c_char_p), POINTER(c_size_t)]
        calls.rks_inquiry_message.argtypes = [c_void_p]
        calls.rks_inquiry_message.restype = c_char_p
        for name in ("rks_signed_rank_tail", "rks_signed_rank_critical"):
            getattr(calls, name).argtypes = [c_size_t, c_double, c_int32, POINTER(c_double)]
        for name in ("rks_rank_sum_tail", "rks_rank_sum_critical"):
            getattr(calls, name).argtypes = [c_size_t, c_size_t, c_double, c_int32, POINTER(c_double)]
        calls.rks_build.restype = c_char_p

    def law(self, name, *arguments):
        """One of the four law calls."""
        out = c_double()
        status = getattr(self.calls, name)(*arguments, byref(out))
        if status != OK:
            raise AssertionError("%s%r returned %d" % (name, arguments, status))
        return out.value

    def ask(self, study, data, settings):
        return Inquiry(self.calls, study, data, settings)


class Inquiry:
    """One study, run. A value of None is a blank cell."""

    def __init__(self, calls, study, data, settings):
        self.calls = calls
        self.handle = c_void_p()
        self._require(calls.rks_inquiry_new(study.encode(), byref(self.handle)), "new")
        cells = [(name, _cells(values)) for name, values in data.items()]
        for name, block in cells:
            self._require(calls.rks_inquiry_cells(self.handle, name.encode(), block, len(block), 1), name)
        for name, value in settings.items():
            self._require(calls.rks_inquiry_set(self.handle, name.encode(), str(value).encode()), name)
        self._require(calls.rks_inquiry_run(self.handle), "run")

    def _require(self, status, what):
        if status != OK:
            raise AssertionError("%s returned %d: %s" % (what, status, self.message()))

    def message(self):
        return (self.calls.rks_inquiry_message(self.handle) or b"").decode() if self.handle else ""

    def status_and_number(self, answer):
        out = c_double()
        return self.calls.rks_inquiry_number(self.handle, answer.encode(), byref(out)), out.value

    def number(self, answer):
        """The number, or None where the library gives none."""
        status, value = self.status_and_number(answer)
        if status in (BLANK, NO_ANSWER):
            return None
        self._require(status, answer)
        return value

    def text(self, answer):
        out = c_char_p()
        self.calls.rks_inquiry_text(self.handle, answer.encode(), byref(out), None)
        return out.value.decode()

    def close(self):
        self.calls.rks_inquiry_free(self.handle)
        self.handle = c_void_p()

    def __enter__(self):
        return self

    def __exit__(self, *_):
        self.close()


def _cells(values):
    block = (Cell * len(values))()
    for cell, value in zip(block, values):
        cell.kind = 0 if value is None else 1
        cell.number = 0.0 if value is None else value
    return block
