"""Conditional formats: each verdict is marked as in the twin, and nothing stops its mark."""

from __future__ import annotations

from collections.abc import Iterator
from typing import NamedTuple

from openpyxl.formatting.rule import Rule
from openpyxl.styles import PatternFill
from openpyxl.worksheet.worksheet import Worksheet

from xlbridge.audit import notation
from xlbridge.audit.finding import Observation, Place
from xlbridge.audit.manifest.pairing import Pairing, SheetSides
from xlbridge.headless.nodes import render
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.references import Bounds, Cell
from xlbridge.headless.shapes import parse


class Mark(NamedTuple):
    """A rule with its areas; its formula is written for the first cell of them."""

    areas: tuple[Bounds, ...]
    rule: Rule

    @property
    def first(self) -> tuple[int, int]:
        """The row and column of the cell that the formula is written for."""
        return min(a.top for a in self.areas), min(a.left for a in self.areas)

    def covers(self, row: int, column: int) -> bool:
        """Whether the rule holds for a cell."""
        return any(area.contains(row, column) for area in self.areas)

    @property
    def key(self) -> tuple[object, ...]:
        """What must be the same for two rules to do the same to the same cells."""
        return self.areas, self.rule.type, tuple(self.rule.formula), look(self.rule)


def check(pairing: Pairing) -> Iterator[Observation]:
    """Look at every cell that the twin marks."""
    for sides in pairing.sheets:
        found = list(marks(sides.found))
        keys = {mark.key for mark in found}
        stops = any(mark.rule.stopIfTrue for mark in found)
        for mark in marks(sides.twin):
            if stops or _moved(pairing, sides, mark) not in keys:
                yield from _cells(pairing, sides, mark, found)


def marks(sheet: Worksheet) -> Iterator[Mark]:
    """The rules of a sheet."""
    for formatting in sheet.conditional_formatting:
        areas = tuple(Bounds(r.min_row, r.min_col, r.max_row, r.max_col) for r in formatting.sqref.ranges)
        for rule in formatting.rules if areas else ():
            yield Mark(areas, rule)


def _moved(pairing: Pairing, sides: SheetSides, mark: Mark) -> tuple[object, ...]:
    """The key of a rule of the twin where the workbook has its areas now."""
    title, move = sides.pair.twin, pairing.alignment.area_from_twin
    areas = tuple(move(title, area)[1] for area in mark.areas)
    formulas = tuple(render(notation.moved(parse(text), title, move)) for text in mark.rule.formula)
    return areas, mark.rule.type, formulas, look(mark.rule)


def look(rule: Rule) -> tuple[str, str, bool]:
    """The colours of text and fill that a rule gives, and whether the text is bold."""
    font, fill = (rule.dxf.font, rule.dxf.fill) if rule.dxf else (None, None)
    ink = font.color.rgb if font and font.color else ""
    return _six(ink), _six(fill.bgColor.rgb if isinstance(fill, PatternFill) else ""), bool(font and font.b)


def _six(colour: object) -> str:
    return colour[-6:].upper() if isinstance(colour, str) else ""


def _cells(pairing: Pairing, sides: SheetSides, mark: Mark, found: list[Mark]) -> Iterator[Observation]:
    formulas = pairing.twin.formulas[sides.pair.twin]
    for row, column in formulas:
        place = pairing.alignment.from_twin(Cell(sides.pair.twin, row, column))
        if place is None or not mark.covers(row, column):
            continue
        expected = _written(mark, Cell(sides.pair.twin, row, column))
        node = notation.moved(parse(expected), sides.pair.twin, pairing.alignment.area_from_twin)
        wanted = notation.canonical(node, place.sheet)
        here = [other for other in found if other.covers(place.row, place.column)]
        alike = [o for o in here if o.rule.type == mark.rule.type and _formula(o, place) == wanted]
        same = [o for o in alike if look(o.rule) == look(mark.rule)]
        cause = "another look" if alike and not same else sides.pair.twin
        if not same:
            words = f"the mark of {'; '.join(mark.rule.formula)} is missing or looks another way"
            yield Observation("mark_changed", Place.of(place), words, expected, cause=cause)
        elif any(o.rule.stopIfTrue and o.rule.priority < same[0].rule.priority for o in here):
            words = "a conditional format before that of the verdict ends the marking"
            yield Observation("mark_overlaid", Place.of(place), words, expected, cause=cause)


def _formula(mark: Mark, place: Cell) -> str:
    """The formula of a rule for one cell, to be compared; nothing where it has none that can be read."""
    try:
        return notation.canonical(parse(_written(mark, place)), place.sheet)
    except (NotEvaluated, IndexError):
        return ""


def _written(mark: Mark, cell: Cell) -> str:
    """The formula of a rule as it holds for one of its cells."""
    down, right = cell.row - mark.first[0], cell.column - mark.first[1]
    return notation.filled(mark.rule.formula[0], down, right)
