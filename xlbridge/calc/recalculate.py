"""A workbook in a real Calc that has our functions; nothing is installed, and the file does not change."""

from __future__ import annotations

from collections.abc import Iterator
from contextlib import contextmanager
from pathlib import Path
from tempfile import TemporaryDirectory

from xlbridge.calc import extension
from xlbridge.calc.names import for_calc
from xlbridge.calc.office import Office
from xlbridge.values import Scalar


def values(path: Path) -> dict[tuple[str, str], Scalar]:
    """Return the value of every formula cell by sheet and address, recalculated."""
    with _opened(path) as (office, copy):
        return office.values(copy)


def pdf(path: Path) -> bytes:
    """Return a workbook printed with the values that it stores; only errors are looked up anew."""
    with _opened(path) as (office, copy), office.open(copy, recalculate=False) as book:
        return book.pdf(copy.with_suffix(".pdf")).read_bytes()


@contextmanager
def _opened(path: Path) -> Iterator[tuple[Office, Path]]:
    """An office with the functions, and a copy in which they have the names that Calc knows them by."""
    with TemporaryDirectory(prefix="storyledger-calc-") as name:
        folder = Path(name)
        extension.unpack(folder / "extensions" / "storyledger")
        copy = folder / path.name
        copy.write_bytes(for_calc(path.read_bytes()))
        with Office(folder / "extensions") as office:
            yield office, copy
