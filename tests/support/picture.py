"""The picture of the story table in README.md: ``python -m tests.support.picture``.

The demonstration's workbook, computed by the command and printed by LibreOffice Calc; the page with the
story forces is cut to what is on it. Needs LibreOffice Calc and poppler-utils.
"""

from __future__ import annotations

import subprocess
from pathlib import Path
from tempfile import TemporaryDirectory

import numpy as np

from tests.support.command import ROOT, run
from tests.support.office import Office

PICTURE = ROOT / "workbook_templates" / "pictures" / "story_table.png"
WIDTH = 1200
HEADING = "Story forces"
#: points; a larger gap below the table is the way down to the page's footer
GAP, MARGIN, HEADER = 60, 6, 12


def main() -> None:
    """Make the picture anew."""
    PICTURE.parent.mkdir(exist_ok=True)
    with TemporaryDirectory() as name:
        folder = Path(name)
        assert run("demo", folder / "demo").code == 0
        with Office() as office, office.open(folder / "demo" / "story.xlsx", recalculate=False) as book:
            page = _page(book.pdf(folder / "printed.pdf"))
        left, top, width, height = _box(folder / "printed.pdf", page)
        scale = WIDTH / width
        box = {"-x": left, "-y": top, "-W": width, "-H": height}
        cut = [word for key, points in box.items() for word in (key, str(round(points * scale)))]
        target = str(PICTURE.with_suffix(""))
        _poppler("-png", "-r", f"{72 * scale:.4f}", *cut, *page, folder / "printed.pdf", target)


def _page(pdf: Path) -> list[str]:
    """The options that choose the page on which the story forces are printed."""
    text = subprocess.run(["pdftotext", str(pdf), "-"], capture_output=True, encoding="utf-8", check=True)
    number = str(next(n for n, page in enumerate(text.stdout.split("\f"), 1) if HEADING in page))
    return ["-f", number, "-l", number, "-singlefile"]


def _box(pdf: Path, page: list[str]) -> tuple[int, int, int, int]:
    """Left, top, width and height of the table with what stands over it, in points."""
    _poppler("-gray", "-r", "72", *page, pdf, pdf.with_suffix(""))
    kind, size, _, pixels = pdf.with_suffix(".pgm").read_bytes().split(b"\n", 3)
    assert kind == b"P5"
    columns, rows = map(int, size.split())
    inked = np.frombuffer(pixels, np.uint8).reshape(rows, columns) < 250
    lines = np.flatnonzero(inked.any(axis=1))
    end = int(lines[np.argmax(np.diff(lines) > GAP)])
    filled = np.flatnonzero(inked[lines[0] + HEADER : end + 1].any(axis=0))
    left, top = int(filled[0]) - MARGIN, int(lines[0]) - MARGIN
    return left, top, int(filled[-1]) + MARGIN - left, end + MARGIN - top


def _poppler(*arguments: object) -> None:
    subprocess.run(["pdftoppm", *map(str, arguments)], check=True)


if __name__ == "__main__":
    main()
