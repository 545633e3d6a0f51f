"""Labels, units, headings and cautions: every text of the twin where the workbook has it now."""

from __future__ import annotations

import re
from collections.abc import Iterator
from typing import Final

from engine.editions import EDITIONS
from engine.units import SYSTEMS, UNITS, symbol
from xlbridge.audit.finding import Observation, Place
from xlbridge.audit.manifest.pairing import CellPair, Pairing
from xlbridge.headless.nodes import render_value

_VERSION: Final = re.compile(r"template [\w.+-]+$")
#: what is fixed when a workbook is made
FIXED: Final = frozenset({*EDITIONS, *SYSTEMS})
UNIT_SYMBOLS: Final = frozenset(symbol(unit, system) for unit in UNITS for system in SYSTEMS) - {"", "text"}


def check(pairing: Pairing) -> Iterator[Observation]:
    """Compare every text that is neither an entry nor a formula; name the sheets that are gone."""
    for sheet in (s for s in pairing.twin.sheets if s not in pairing.alignment.by_twin):
        yield Observation("sheet_missing", Place(), f"there is no sheet {sheet}", sheet, cause=sheet)
    for pair in pairing.cells:
        expected = pairing.twin.constants[pair.cell.sheet].get((pair.cell.row, pair.cell.column))
        if isinstance(expected, str) and pair.cell not in pairing.own.entries:
            found = _found(pairing, pair)
            if plain(found) != plain(expected):
                yield _observed(pairing, pair, expected, found)


def plain(text: str) -> str:
    """A text without the spaces and line breaks that programs write in their own ways."""
    return " ".join(text.replace("_x000a_", " ").replace("_x000D_", " ").split())


def _found(pairing: Pairing, pair: CellPair) -> str:
    formula = pairing.book.formula(pair.place)
    if formula is not None:
        return formula.text
    value = pairing.book.constants[pair.place.sheet].get((pair.place.row, pair.place.column))
    return value if isinstance(value, str) else "" if value is None else render_value(value)


def _observed(pairing: Pairing, pair: CellPair, expected: str, found: str) -> Observation:
    words = f"the template says “{_short(expected)}” here, the workbook " + (
        f"“{_short(found)}”" if found else "nothing"
    )
    if pair.cell in pairing.own.cautions:
        kind, cause = "caution_changed", "cautions"
    elif expected in UNIT_SYMBOLS:
        kind, cause = "unit_changed", f"{expected} > {found}"
    elif _VERSION.search(expected) and _VERSION.sub("", expected) == _VERSION.sub("", found):
        kind, cause = "other_version", ""
    elif _VERSION.search(expected) or expected in FIXED:
        kind, cause = "made_for_changed", ""
    else:
        kind, cause = "label_changed", ""
    return Observation(kind, Place.of(pair.place), words, expected, found, cause=cause)


def _short(text: str) -> str:
    return text if len(text) <= 80 else f"{text[:77]}…"
