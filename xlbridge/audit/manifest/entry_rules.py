"""Data validation: each entry of the twin has its rule, and none lets more in."""

from __future__ import annotations

from collections.abc import Iterator
from math import inf
from typing import Final

from openpyxl.worksheet.datavalidation import DataValidation
from openpyxl.worksheet.worksheet import Worksheet

from xlbridge.audit.finding import Observation, Place
from xlbridge.audit.manifest.pairing import Pairing, SheetSides
from xlbridge.headless.references import Bounds, Cell

Areas = tuple[Bounds, ...]
Ruled = tuple[Areas, DataValidation]
Span = tuple[float, bool, float, bool]

NUMBERS: Final = frozenset({"decimal", "whole"})


def check(pairing: Pairing) -> Iterator[Observation]:
    """Look at every entry that has a rule in the twin."""
    for sides in pairing.sheets:
        found = list(rules(sides.found))
        keys = {(areas, _key(rule)) for areas, rule in found}
        for areas, rule in rules(sides.twin):
            moved = tuple(pairing.alignment.area_from_twin(sides.pair.twin, area)[1] for area in areas)
            if (moved, _key(rule)) not in keys:
                yield from _cells(pairing, sides, areas, rule, found)


def rules(sheet: Worksheet) -> Iterator[Ruled]:
    """The rules of a sheet with their areas."""
    for rule in sheet.data_validations.dataValidation:
        yield tuple(Bounds(r.min_row, r.min_col, r.max_row, r.max_col) for r in rule.sqref.ranges), rule


def _key(rule: DataValidation) -> tuple[object, ...]:
    """What must be the same for two rules to allow the same."""
    return rule.type, _span(rule) if rule.type in NUMBERS else _listed(rule), _refuses(rule)


def _cells(
    pairing: Pairing,
    sides: SheetSides,
    areas: Areas,
    rule: DataValidation,
    found: list[Ruled],
) -> Iterator[Observation]:
    for cell in _entries(pairing, sides, areas):
        place = pairing.alignment.from_twin(cell)
        if place is None:
            continue
        here = [r for a, r in found if any(area.contains(place.row, place.column) for area in a)]
        expected, cause = shown(rule), f"{cell.sheet} {rule.sqref if here else ''}"
        if not here:
            words = f"the cell may hold anything; the template allows {expected}"
            yield Observation("entry_rule_missing", Place.of(place), words, expected, cause=cause)
        elif not any(_as_strict(r, rule) for r in here):
            words = f"the cell may hold {shown(here[0])}; the template allows {expected}"
            yield Observation(
                "entry_rule_widened", Place.of(place), words, expected, shown(here[0]), cause=cause
            )


def _entries(pairing: Pairing, sides: SheetSides, areas: Areas) -> Iterator[Cell]:
    for cell in pairing.own.entries:
        if cell.sheet == sides.pair.twin and any(area.contains(cell.row, cell.column) for area in areas):
            yield cell


def shown(rule: DataValidation) -> str:
    """What a rule allows, in words."""
    if not _refuses(rule):
        return "anything, after a warning"
    if rule.type == "list":
        return f"one of {_listed(rule)}"
    if rule.type not in NUMBERS:
        return f"what fits {rule.type or 'no rule'} {rule.formula1 or ''}".strip()
    words = {"between": f"a number from {rule.formula1} to {rule.formula2}"}
    return words.get(rule.operator or "between", f"a number, {rule.operator} {rule.formula1}")


def _refuses(rule: DataValidation) -> bool:
    return bool(rule.showErrorMessage) and rule.errorStyle in (None, "stop")


def _listed(rule: DataValidation) -> str:
    return (rule.formula1 or "").removeprefix("=").strip('"')


def _as_strict(found: DataValidation, expected: DataValidation) -> bool:
    """Whether whatever a rule lets in, the expected one does."""
    if _refuses(expected) and not _refuses(found):
        return False
    if expected.type == "list":
        return found.type == "list" and _options(found) <= _options(expected)
    if expected.type not in NUMBERS:
        return found.type == expected.type and found.formula1 == expected.formula1
    if found.type not in NUMBERS:
        return False
    low, low_open, high, high_open = _span(expected)
    other_low, other_low_open, other_high, other_high_open = _span(found)
    below = other_low < low or (other_low == low and low_open and not other_low_open)
    above = other_high > high or (other_high == high and high_open and not other_high_open)
    return not below and not above


def _options(rule: DataValidation) -> frozenset[str]:
    """The words of a list; a list that stands elsewhere is one by its name."""
    return frozenset(word.strip().casefold() for word in _listed(rule).split(","))


def _span(rule: DataValidation) -> Span:
    """The lower end and whether it is left out, then the upper end; all numbers if it cannot be told."""
    everything = (-inf, False, inf, False)
    first, second = _number(rule.formula1), _number(rule.formula2)
    if first is None:
        return everything
    if rule.operator in (None, "between"):
        return (first, False, second, False) if second is not None else everything
    ends = {
        "greaterThan": (first, True, inf, False),
        "greaterThanOrEqual": (first, False, inf, False),
        "lessThan": (-inf, False, first, True),
        "lessThanOrEqual": (-inf, False, first, False),
        "equal": (first, False, first, False),
    }
    return ends.get(rule.operator, everything)


def _number(text: str | None) -> float | None:
    try:
        return float(text) if text is not None else None
    except ValueError:
        return None
