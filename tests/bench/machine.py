"""The machine that was measured, named for the table."""
import os
import platform
import re
import shutil
import subprocess
from pathlib import Path


def _first_line(*command):
    return subprocess.run(command, capture_output=True, text=True, timeout=60).stdout.splitlines()[0].strip()


def processor():
    found = re.search(r"^model name\s*:\s*(.+)$", Path("/proc/cpuinfo").read_text(), re.MULTILINE)
    return found.group(1) if found else platform.machine()


def compiler(build):
    """The one that CMake used in this build folder."""
    cache = (Path(build) / "CMakeCache.txt").read_text()
    program = re.search(r"^CMAKE_CXX_COMPILER:\w+=(.+)$", cache, re.MULTILINE).group(1)
    return re.sub(r"^c\+\+ ", "g++ ", _first_line(program, "--version"))  # Debian's other name for it


def memory():
    kilobytes = int(re.search(r"^MemTotal:\s*(\d+)", Path("/proc/meminfo").read_text(), re.MULTILINE).group(1))
    return f"{kilobytes / 2**20:.0f} GB"


def machine_lines(build, load_before):
    """Markdown, one line each. The load is that before the measurements: above 0 somebody else was at work."""
    lines = [f"Machine: {processor()}, {os.cpu_count()} cores, {memory()}; one thread is used",
             f"Compiler: {compiler(build)}, Release",
             f"System: {_first_line('uname', '-sr')}; load before the run {load_before:.2f}"]
    lines.append(_first_line("/usr/bin/python3", "-c", "import numpy, scipy; "
                             "print(f'SciPy {scipy.__version__}, NumPy {numpy.__version__}')"))
    if shutil.which("soffice"):
        lines.append(f"Office: {_first_line('soffice', '--version')}")
    return [f"- {line}" for line in lines]
