"""The parts of the workbook as data, one module each, in the order in which they stand in it."""

from __future__ import annotations

from types import MappingProxyType
from typing import Final

from workbook_templates.declare import Part
from workbook_templates.parts import diaphragm, drift, story

#: the part that every workbook has
CORE: Final = story.PART.key
PARTS: Final = MappingProxyType({part.key: part for part in (story.PART, drift.PART, diaphragm.PART)})


def chosen(keys: frozenset[str]) -> tuple[Part, ...]:
    """Return the parts of these keys in the order of the workbook."""
    return tuple(part for key, part in PARTS.items() if key in keys)
