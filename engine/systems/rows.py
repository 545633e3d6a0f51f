"""The rows of Table 12.2-1 by edition and name, and how sure each is.

A name is the letter of the row's group (A bearing wall, B building frame, C moment frame, D and E dual,
G cantilever column …) and the printed words: it stays when an edition moves the row to another number.
"""

from __future__ import annotations

from collections.abc import Mapping
from functools import cache
from types import MappingProxyType
from typing import Final

from engine.editions import EDITIONS
from engine.require import choice
from engine.tables import table

Row = Mapping[str, str]

TITLE: Final = "Table 12.2-1"
MARKS: Final = MappingProxyType(
    {"H": "", "M": " (from memory: confirm)", "U": " (uncertain: take it from the standard)"}
)


@cache
def rows(edition: str) -> Mapping[str, Row]:
    """Return the rows of an edition by name, group by group: its own, and those of the editions before."""
    place = EDITIONS.index(choice("edition", edition, EDITIONS))
    printed = [row for row in table("systems").rows if EDITIONS.index(added_in(row)) <= place]
    return MappingProxyType({f"{_group(row)}. {row['system']}": row for row in sorted(printed, key=_group)})


def row(system: str, edition: str) -> Row:
    """Return the row of a system: by its name, or by its code in the edition that it was read in."""
    choice("edition", edition, EDITIONS)
    by_code = {found["code"]: name for name, found in rows(edition).items() if found["edition"] == edition}
    name = by_code.get(system, system) if isinstance(system, str) else system
    return rows(edition)[choice("system", name, rows(edition), TITLE)]


def added_in(found: Row) -> str:
    """Return the edition that a row was read in, or was added by."""
    return found["edition"].split()[0]


def sureness(found: Row, edition: str, column: str) -> str:
    """Return how sure a part of a row is; one of an earlier edition is at best remembered as unchanged."""
    seen = found[column]
    return "M" if seen == "H" and added_in(found) != edition else seen


def _group(found: Row) -> str:
    return found["code"][0]
