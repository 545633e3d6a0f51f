"""Calls of our extension in a real Calc, beside the same in built-in functions in the same run."""

from __future__ import annotations

import resource
from contextlib import ExitStack
from math import isclose
from pathlib import Path
from typing import Any

from openpyxl import Workbook
from openpyxl.worksheet.formula import ArrayFormula
from openpyxl.worksheet.worksheet import Worksheet

from tests.support.office import Office
from tests.support.story_books import story_book
from xlbridge.calc.names import for_calc
from xlbridge.catalogue import CATALOGUE

LEVELS = 40
PLACES = {"weights": f"$C$1:$C${LEVELS}", "heights": f"$D$1:$D${LEVELS}", "k": "$E$1"}
ONE = {**PLACES, "w_x": "C{row}", "h_x": "D{row}"}
ALL = {**PLACES, "w_x": PLACES["weights"], "h_x": PLACES["heights"]}


def native(places: dict[str, str], row: int = 1) -> str:
    """The built-in formula of ELF_CVX with its places put in."""
    put = {name: place.format(row=row) for name, place in places.items()}
    return f"={CATALOGUE['ELF_CVX'].native.format_map(put)}"


def ours(places: dict[str, str], row: int = 1) -> str:
    put = [places[argument.name].format(row=row) for argument in CATALOGUE["ELF_CVX"].arguments]
    return f"=ELF_CVX({','.join(put)})"


def book(path: Path, formula: Any, count: int, array: bool) -> Path:
    """A workbook of ``count`` cells: one formula each, or 40 a formula."""
    workbook = Workbook()
    sheet: Worksheet = workbook.active
    for row in range(1, LEVELS + 1):
        sheet.cell(row, 3, 900.0 + row)
        sheet.cell(row, 4, 13.0 * (LEVELS + 1 - row))
    sheet["E1"] = 1.4
    for n in range(count // LEVELS):
        if array:
            area = f"{sheet.cell(1, 7 + n).coordinate}:{sheet.cell(LEVELS, 7 + n).coordinate}"
            sheet.cell(1, 7 + n, ArrayFormula(area, formula(ALL)))
        else:
            for row in range(1, LEVELS + 1):
                sheet.cell(row, 7 + n, formula(ONE, row))
    workbook.save(path)
    path.write_bytes(for_calc(path.read_bytes()))
    return path


def test_calls_over_built_in_formulas(
    full: bool, figure: Any, best: Any, office_with_addin: Office, tmp_path: Path
) -> None:
    count = 4000 if full else 80
    kinds = {"calls": (ours, False), "array calls": (ours, True), "formulas": (native, False)}
    kinds["array formulas"] = native, True
    with ExitStack() as stack:
        books = {
            name: stack.enter_context(
                office_with_addin.open(book(tmp_path / f"{name}.xlsx", f, count, array))
            )
            for name, (f, array) in kinds.items()
        }
        taken = dict(zip(books, best(*(b.recalculate for b in books.values())), strict=True))
        values = {name: list(b.formulas().values()) for name, b in books.items()}
    assert all(isclose(x, y, rel_tol=1e-12) for x, y in zip(values["calls"], values["formulas"], strict=True))
    figure("calls of ELF_CVX over formulas, 40 levels", taken["calls"] / taken["formulas"], "target 20")
    for peer, target in (("formulas", "target 1.5"), ("array formulas", "no target")):
        ratio = taken["array calls"] / taken[peer]
        figure(f"array calls of ELF_CVX over {peer}, 40 levels, a cell", ratio, target)


def test_a_workbook_opened_recalculated_and_stored(
    full: bool, figure: Any, addins: Path, office_with_addin: Office, tmp_path: Path
) -> None:
    """All of it in one office of its own, started and ended: the CPU of every process together."""
    path = story_book(tmp_path, {"edition": "7-22", "units": "us", "parts": ["drift"]}, LEVELS if full else 4)
    path.write_bytes(for_calc(path.read_bytes()))
    before = resource.getrusage(resource.RUSAGE_CHILDREN)
    with Office(addins) as office, office.open(path) as opened:
        opened.store(tmp_path / "stored.xlsx")
    after = resource.getrusage(resource.RUSAGE_CHILDREN)
    used = after.ru_utime + after.ru_stime - before.ru_utime - before.ru_stime
    assert (tmp_path / "stored.xlsx").exists()
    figure("CPU seconds to open, recalculate and store 40 levels in Calc", used, "target below 3")
