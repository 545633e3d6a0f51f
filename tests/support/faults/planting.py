"""From an operator and a seed to a spoilt file."""

from __future__ import annotations

import io
from dataclasses import dataclass
from pathlib import Path
from random import Random

import openpyxl

from tests.support.audited import audited
from tests.support.faults.catalogue import Fault
from tests.support.faults.scene import NoPlace, Scene
from xlbridge.audit.audit import Audit
from xlbridge.audit.cells import agree
from xlbridge.audit.subject import Subject
from xlbridge.headless.compute import compute
from xlbridge.headless.references import Cell, parse_address
from xlbridge.headless.store import store


@dataclass(frozen=True)
class Planted:
    """A spoilt workbook and the places of its fault."""

    fault: Fault
    before: Subject
    path: Path
    places: tuple[tuple[str, ...], ...]
    causes: int

    def __str__(self) -> str:
        places = [" or ".join(group) for group in self.places]
        return f"{self.fault.name} at {', '.join(places[:6])}"


def plant(fault: Fault, before: Subject, seed: int, path: Path) -> Planted | None:
    """Spoil a copy of a workbook; nothing where it has no place for the fault.

    The copy is recalculated headless, unless it is the fault that it was not.
    """
    random = Random(f"{fault.name} {seed} {before.path.name}")
    scene = Scene(before, openpyxl.load_workbook(io.BytesIO(before.book.data)), random)
    try:
        fault.plant(scene)
    except NoPlace:
        return None
    saved = path.with_suffix(".saved.xlsx")
    scene.book.save(saved)
    values = compute(saved).values
    if not scene.recalculated:
        values, new = _kept(before), values
        scene.touch(
            *(
                str(Cell(s, *parse_address(a)))
                for (s, a), value in new.items()
                if not agree(values[s, a], value)
            )
        )
    assert scene.touched, fault.name
    stored = {(cell.sheet, cell.address): value for cell, value in scene.stored.items()}
    store(saved, path, {**values, **stored}, force=True)
    for change in scene.package:
        path.write_bytes(change(path.read_bytes()))
    places = tuple(dict.fromkeys(scene.touched))
    return Planted(fault, before, path, places, len(places) if fault.needs_earlier_issue else scene.causes)


def audit_of(planted: Planted) -> Audit:
    """The audit of a spoilt workbook; a plausible entry is held against the issue that was checked before."""
    return audited(planted.path, planted.before.path if planted.fault.needs_earlier_issue else None)


def resaved(before: Subject, folder: Path) -> Path:
    """The same workbook, saved and recalculated in the same way, without a fault."""
    path = folder / f"{before.path.stem}, saved.xlsx"
    if not path.exists():
        saved = folder / "saved.xlsx"
        openpyxl.load_workbook(io.BytesIO(before.book.data)).save(saved)
        store(saved, path, compute(saved).values)
    return path


def _kept(before: Subject) -> dict[tuple[str, str], object]:
    """The values that the file had."""
    return {(c.sheet, c.address): before.book.stored(c) for c in before.book.formula_cells()}
