"""Clean and legally edited workbooks raise no alarm: a matrix of workbooks and edits.

``STORYLEDGER_BENCH=1`` runs all of it, about 340 workbooks; without it a sample in which every edit and
every workbook occurs.
"""

from __future__ import annotations

import os
from collections.abc import Iterator
from itertools import product
from pathlib import Path
from typing import Any, NamedTuple

import pytest

from engine.editions import EDITIONS
from engine.units import SYSTEMS
from tests.support import office as offices
from tests.support.as_excel import as_excel
from tests.support.audited import audited, changed, computed_book
from tests.support.legal_edits import EDITS, OFFICE_EDITS, Edit, OfficeEdit, level_removed
from tests.support.packages import parts_of
from workbook_templates.build import write_native
from workbook_templates.parts import together
from xlbridge.headless.book import Book
from xlbridge.headless.compute import compute_into

FULL = os.environ.get("STORYLEDGER_BENCH") == "1"
#: without the variable one workbook in so many
SAMPLE = 7


class Base(NamedTuple):
    """A workbook to be edited."""

    edition: str
    units: str
    parts: tuple[str, ...]
    levels: int
    issue: bool = False

    def __str__(self) -> str:
        which = "issue copy" if self.issue else f"{len(self.parts)} parts"
        return f"{self.edition} {self.units} {which} {self.levels} levels"

    @property
    def given(self) -> dict[str, Any]:
        return {"edition": self.edition, "units": self.units, "parts": [*self.parts]}


def bases() -> Iterator[Base]:
    for edition in EDITIONS:
        for units in SYSTEMS:
            yield Base(edition, units, (), 3)
            yield Base(edition, units, ("drift",), 6)
            yield Base(edition, units, ("drift", "diaphragm", "torsion", "weights"), 4)
            yield Base(edition, units, tuple(sorted(together(edition))), 3)
    yield Base("7-22", "us", ("drift",), 4, issue=True)
    yield Base("7-16", "si", (), 3, issue=True)


BASES = tuple(bases())


def matrix(edits: tuple[Any, ...]) -> list[tuple[Base, Any]]:
    """Every edit of every workbook, or every edit and every workbook at least once.

    A level whose weights are listed on a sheet of their own is not taken out of the story table alone.
    """
    numbers = range(len(BASES)), range(len(edits))
    pairs = [(b, e) for b, e in product(*numbers) if FULL or (b + 3 * e) % SAMPLE == 0]
    found = [(BASES[b], edits[e]) for b, e in pairs]
    return [(b, e) for b, e in found if e is not level_removed or "weights" not in b.parts]


def named(value: object) -> str:
    return value.__name__ if callable(value) else str(value)


@pytest.fixture(scope="module")
def made(tmp_path_factory: pytest.TempPathFactory) -> dict[Base, Path]:
    return Made(tmp_path_factory.mktemp("legal"))


class Made(dict[Base, Path]):
    """The workbooks, each made when it is first asked for."""

    def __init__(self, folder: Path) -> None:
        super().__init__()
        self._folder = folder

    def __missing__(self, base: Base) -> Path:
        folder = self._folder / str(len(self))
        folder.mkdir(exist_ok=True)
        if base.issue:
            self[base] = folder / "story.xlsx"
            write_native(base.given, self[base], base.levels)
        else:
            self[base] = computed_book(folder, base.given, base.levels)
        return self[base]


def copied(path: Path, folder: Path) -> Path:
    target = folder / path.name
    target.write_bytes(path.read_bytes())
    return target


def alarms(path: Path) -> list[str]:
    outcome = audited(path)
    assert outcome.checked_cells == outcome.formula_cells > 100
    assert outcome.not_checked == ()
    return [f"{f.kind.key} {f.places[0]} {f.words}" for f in outcome.findings]


@pytest.mark.parametrize(("base", "edit"), matrix(EDITS), ids=named)
def test_a_legal_edit_raises_no_alarm(made: dict[Base, Path], tmp_path: Path, base: Base, edit: Edit) -> None:
    assert alarms(changed(copied(made[base], tmp_path), edit)) == []


@pytest.mark.parametrize(("base", "edit"), matrix(OFFICE_EDITS), ids=named)
def test_a_legal_edit_in_calc_raises_no_alarm(
    made: dict[Base, Path], office: offices.Office, tmp_path: Path, base: Base, edit: OfficeEdit
) -> None:
    with office.open(made[base], recalculate=False) as book:
        edit(book, base.levels)
        stored = book.store(tmp_path / "calc.xlsx")
    compute_into(stored, tmp_path / "computed.xlsx", force=True)
    assert alarms(tmp_path / "computed.xlsx") == []


@pytest.mark.parametrize("base", BASES if FULL else BASES[::4], ids=str)
def test_a_package_as_excel_writes_it_raises_no_alarm(
    made: dict[Base, Path], tmp_path: Path, base: Base
) -> None:
    path = as_excel(made[base], tmp_path / "excel.xlsx")
    parts = parts_of(path)
    assert b't="shared"' in b"".join(parts.values())
    assert "xl/calcChain.xml" in parts
    before, after = Book.open(made[base]), Book.open(path)
    assert (before.constants, before.names) == (after.constants, after.names)
    assert {s: {p: f.text for p, f in fs.items()} for s, fs in before.formulas.items()} == {
        s: {p: f.text for p, f in fs.items()} for s, fs in after.formulas.items()
    }
    assert alarms(path) == []


def test_the_matrix_has_at_least_300_workbooks() -> None:
    without = sum("weights" in base.parts for base in BASES)
    assert len(BASES) * (len(EDITS) + len(OFFICE_EDITS) + 1) - without >= 300
    sampled = [*matrix(EDITS), *matrix(OFFICE_EDITS)]
    assert {edit for _, edit in sampled} == {*EDITS, *OFFICE_EDITS}
    assert {base for base, _ in sampled} == set(BASES)
    assert len(sampled) >= 30
