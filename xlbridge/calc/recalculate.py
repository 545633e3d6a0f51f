"""A workbook recalculated by a real Calc that has our functions; nothing is installed."""

from __future__ import annotations

from pathlib import Path
from tempfile import TemporaryDirectory

from xlbridge.calc import extension
from xlbridge.calc.names import for_calc
from xlbridge.calc.office import Office
from xlbridge.values import Scalar


def values(path: Path) -> dict[tuple[str, str], Scalar]:
    """Return the value of every formula cell by sheet and address; the file does not change."""
    with TemporaryDirectory(prefix="storyledger-calc-") as name:
        folder = Path(name)
        extension.unpack(folder / "extensions" / "storyledger")
        copy = folder / path.name
        copy.write_bytes(for_calc(path.read_bytes()))
        with Office(folder / "extensions") as office:
            return office.values(copy)


def pdf(path: Path) -> bytes:
    """Return a workbook printed with the values that it stores."""
    with (
        TemporaryDirectory(prefix="storyledger-calc-") as name,
        Office() as office,
        office.open(path, recalculate=False) as book,
    ):
        return book.pdf(Path(name) / "printed.pdf").read_bytes()
