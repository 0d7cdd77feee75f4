"""Opens workbooks in a headless office with the extension, recalculates them, prints each report and writes it as PDF
and PNG. Ends with status 1, and says why, if a cell shows an error or a file is missing.

    /usr/bin/python3 show.py EXTENSION OUTPUT_FOLDER WORKBOOK...
"""
import shlex
import subprocess
import sys
from pathlib import Path

from office import Office, OfficeError
from report import faults, report_lines


def write_pictures(pdf):
    """A PNG of each page; fails if a number did not fit its column."""
    for old in pdf.parent.glob(f"{pdf.stem}-*.png"):
        old.unlink()
    subprocess.run(["pdftoppm", "-r", "90", "-png", str(pdf), str(pdf.with_suffix(""))], check=True, timeout=120)
    pictures = sorted(pdf.parent.glob(f"{pdf.stem}-*.png"))
    if not pictures:
        raise OfficeError(f"{pdf}: no picture of it was written")
    text = subprocess.run(["pdftotext", "-layout", str(pdf), "-"], check=True, timeout=120, capture_output=True,
                          text=True).stdout
    if "###" in text:
        raise OfficeError(f"{pdf}: a column is too narrow for its number (###)")
    return pictures


def show(office, workbook, output):
    """Prints and writes one workbook; returns what is wrong with it."""
    document = office.open(workbook)
    try:
        document.calculateAll()
        print(f"\n{'=' * 110}\n{workbook.name}\n{'=' * 110}")
        print("\n".join(report_lines(document)))
        pdf = output / f"{workbook.stem}.pdf"
        office.save(document, pdf, "calc_pdf_Export")
        pictures = write_pictures(pdf)
        print(f"\nWritten: {pdf}\n         {pictures[0]} (and {len(pictures) - 1} more)")
        return [f"{workbook.name}: {words}" for words in faults(document)]
    finally:
        document.close(True)


def main(extension, output, *workbooks):
    output = Path(output).resolve()
    output.mkdir(parents=True, exist_ok=True)
    if not workbooks:
        raise OfficeError("no workbook was named")
    with Office(extension, output / "office") as office:
        wrong = [words for workbook in workbooks for words in show(office, Path(workbook), output)]
    for words in wrong:
        print(words, file=sys.stderr)
    if wrong:
        return 1
    print(f"\nAll {len(workbooks)} workbooks were computed without an error. Their pages are in {output}")
    print("\nTo open one in a window, with the extension and without touching your own profile:\n    "
          + shlex.join(["soffice", *office.arguments(), str(Path(workbooks[0]).resolve())]))
    return 0


if __name__ == "__main__":
    if len(sys.argv) < 4:
        sys.exit(__doc__)
    try:
        sys.exit(main(*sys.argv[1:]))
    except (OfficeError, subprocess.SubprocessError) as problem:
        sys.exit(f"Not shown: {problem}")
