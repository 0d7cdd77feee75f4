"""A headless LibreOffice Calc with a profile and extensions of its own.

The user's profile is neither read nor written. The extension is unpacked into a folder that only this office looks
into, which needs no unopkg and works for root as well. Every wait has an end: a watchdog stops an office that hangs,
and the call that waited for it fails.
"""
import os
import re
import shutil
import signal
import subprocess
import threading
import time
import zipfile
from pathlib import Path

import uno
from com.sun.star.beans import PropertyValue
from com.sun.star.connection import NoConnectException

# Without the version in it, 7.4 tests its graphics at every start, which takes some five seconds.
PROFILE_SEED = """<?xml version="1.0" encoding="UTF-8"?>
<oor:items xmlns:oor="http://openoffice.org/2001/registry">
<item oor:path="/org.openoffice.Setup/Product"><prop oor:name="ooSetupLastVersion"><value>{}</value></prop></item>
</oor:items>
"""


class OfficeError(Exception):
    """The office is missing, did not start, or did not do what it was asked."""


def property_values(**values):
    """The named arguments as the office takes them."""
    return tuple(PropertyValue(Name=name, Value=value) for name, value in values.items())


def office_version(program):
    """Such as 7.4, of the office to be started."""
    shown = subprocess.run([program, "--version"], capture_output=True, text=True, timeout=60).stdout
    found = re.search(r"\b(\d+\.\d+)\.", shown)
    if not found:
        raise OfficeError(f"{program} --version did not tell a version: {shown!r}")
    return found.group(1)


class Office:
    """Use as `with Office(extension, home) as office:`; `home` is a folder that it may fill and empty."""

    def __init__(self, extension, home, seconds=300, start_seconds=90):
        self.extension = Path(extension).resolve()
        self.home = Path(home).resolve()
        self.seconds = seconds
        self.start_seconds = start_seconds
        self.process = None
        self.desktop = None

    def __enter__(self):
        program = shutil.which("soffice")
        if not program:
            raise OfficeError("soffice is not on the path: install libreoffice-calc")
        self._prepare(program)
        self._start(program)
        return self

    def __exit__(self, *_):
        self._stop()

    def arguments(self):
        """What makes soffice use this profile and this extension, also in a window."""
        return [f"-env:UserInstallation={(self.home / 'profile').as_uri()}",
                f"-env:BUNDLED_EXTENSIONS={(self.home / 'extensions').as_uri()}"]

    def open(self, path):
        """Opens a document; hidden, because an office without a display aborts on a visible one."""
        document = self.desktop.loadComponentFromURL(Path(path).resolve().as_uri(), "_blank", 0,
                                                     property_values(Hidden=True))
        if document is None:
            raise OfficeError(f"{path}: the office cannot open it")
        return document

    @staticmethod
    def save(document, path, export_filter):
        """Writes a copy, and makes sure that it is there: the office may fail without saying so."""
        path = Path(path).resolve()
        path.unlink(missing_ok=True)
        document.storeToURL(path.as_uri(), property_values(FilterName=export_filter))
        if not path.is_file() or path.stat().st_size == 0:
            raise OfficeError(f"{path}: the office did not write it")

    def _prepare(self, program):
        if not self.extension.is_file():
            raise OfficeError(f"{self.extension}: the extension is missing; build it first")
        shutil.rmtree(self.home, ignore_errors=True)
        user = self.home / "profile" / "user"
        user.mkdir(parents=True)
        (user / "registrymodifications.xcu").write_text(PROFILE_SEED.format(office_version(program)))
        with zipfile.ZipFile(self.extension) as archive:
            archive.extractall(self.home / "extensions" / "rankstead")

    def _start(self, program):
        pipe = f"rankstead-{os.getpid()}-{time.monotonic_ns()}"
        with open(self.home / "office.log", "wb") as log:
            self.process = subprocess.Popen(
                [program, "--headless", "--norestore", "--nologo", "--nodefault", "--nolockcheck",
                 f"--accept=pipe,name={pipe};urp;", *self.arguments()],
                stdin=subprocess.DEVNULL, stdout=log, stderr=log, start_new_session=True)
        self.watchdog = threading.Timer(self.seconds, self._kill)
        self.watchdog.daemon = True
        self.watchdog.start()
        try:
            self.desktop = self._connect(pipe)
        except BaseException:
            self._stop()
            raise

    def _connect(self, pipe):
        local = uno.getComponentContext()
        resolver = local.ServiceManager.createInstanceWithContext("com.sun.star.bridge.UnoUrlResolver", local)
        until = time.monotonic() + self.start_seconds
        while time.monotonic() < until and self.process.poll() is None:
            try:
                context = resolver.resolve(f"uno:pipe,name={pipe};urp;StarOffice.ComponentContext")
                return context.ServiceManager.createInstanceWithContext("com.sun.star.frame.Desktop", context)
            except NoConnectException:
                time.sleep(0.1)
        raise OfficeError(f"the office did not start; see {self.home / 'office.log'}")

    def _stop(self):
        self._ask_to_end()
        try:
            self.process.wait(20)
        except subprocess.TimeoutExpired:
            pass
        self._kill()
        self.process.wait(20)
        self.watchdog.cancel()

    def _ask_to_end(self):
        try:
            if self.desktop is not None:
                self.desktop.terminate()
        except Exception:  # the connection breaks while the office ends, in more ways than one
            pass

    def _kill(self):
        try:
            os.killpg(self.process.pid, signal.SIGKILL)
        except ProcessLookupError:
            pass
