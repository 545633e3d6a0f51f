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

Key = tuple[tuple[Bounds, ...], str, tuple[str, ...], tuple[str, str, bool]]


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
    def key(self) -> Key:
        """What must be the same for two rules to do the same to the same cells."""
        return self.areas, self.rule.type, tuple(self.rule.formula), look(self.rule)


def check(pairing: Pairing) -> Iterator[Observation]:
    """Look at every cell that the twin marks."""
    for sides in pairing.sheets:
        found, expected = list(marks(sides.found)), list(marks(sides.twin))
        moved = [_moved(pairing, sides, mark) for mark in expected]
        strange = [mark for mark in found if mark.key not in moved]
        keys = {mark.key for mark in found}
        for mark, key in zip(expected, moved, strict=True):
            areas: tuple[Bounds, ...] = key[0]
            if key not in keys or any(_meet(a, b) for o in strange for a in o.areas for b in areas):
                yield from _cells(pairing, sides, mark, expected, found)


def marks(sheet: Worksheet) -> Iterator[Mark]:
    """The rules of a sheet."""
    for formatting in sheet.conditional_formatting:
        areas = tuple(Bounds(r.min_row, r.min_col, r.max_row, r.max_col) for r in formatting.sqref.ranges)
        for rule in formatting.rules if areas else ():
            yield Mark(areas, rule)


def _moved(pairing: Pairing, sides: SheetSides, mark: Mark) -> Key:
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


def _meet(one: Bounds, other: Bounds) -> bool:
    across = one.left <= other.right and other.left <= one.right
    return across and one.top <= other.bottom and other.top <= one.bottom


def _cells(
    pairing: Pairing, sides: SheetSides, mark: Mark, expected: list[Mark], found: list[Mark]
) -> Iterator[Observation]:
    for row, column in pairing.twin.formulas[sides.pair.twin]:
        cell = Cell(sides.pair.twin, row, column)
        place = pairing.alignment.from_twin(cell)
        if place is None or not mark.covers(row, column):
            continue
        wanted = _expected(pairing, mark, cell, place)
        ours = {_expected(pairing, m, cell, place) for m in expected if m.covers(row, column)}
        here = [other for other in found if other.covers(place.row, place.column)]
        alike = [o for o in here if o.rule.type == mark.rule.type and _formula(o, place) == wanted]
        same = [o for o in alike if look(o.rule) == look(mark.rule)]
        text = "; ".join(mark.rule.formula)
        if not same:
            cause = "another look" if alike else sides.pair.twin
            words = f"the mark of {text} is missing or looks another way"
            yield Observation("mark_changed", Place.of(place), words, text, cause=cause)
            continue
        strange = (o for o in here if _formula(o, place) not in ours)
        if any(o.rule.priority < same[0].rule.priority and _covers_up(o.rule) for o in strange):
            words = "a conditional format that comes before that of the verdict covers it up"
            yield Observation("mark_overlaid", Place.of(place), words, text, cause=sides.pair.twin)


def _covers_up(rule: Rule) -> bool:
    """Whether a rule that comes first leaves nothing of the colours of those after it."""
    return bool(rule.stopIfTrue) or look(rule)[:2] != ("", "")


def _expected(pairing: Pairing, mark: Mark, cell: Cell, place: Cell) -> str:
    node = notation.moved(parse(_written(mark, cell)), cell.sheet, pairing.alignment.area_from_twin)
    return notation.canonical(node, place.sheet)


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
