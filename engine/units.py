"""The closed list of units: what the catalogue may declare and how a unit system writes it."""

from __future__ import annotations

from types import MappingProxyType
from typing import Final

US: Final = "us"
SI: Final = "si"
SYSTEMS: Final = (US, SI)

#: quantity -> the unit's symbol in each system. "none" has no unit; "text" is not a number.
UNITS: Final = MappingProxyType(
    {
        "none": {US: "-", SI: "-"},
        "text": {US: "text", SI: "text"},
        "time": {US: "s", SI: "s"},
        "acceleration": {US: "g", SI: "g"},
        "length": {US: "ft", SI: "m"},
        "displacement": {US: "in", SI: "mm"},
        "force": {US: "kip", SI: "kN"},
        "moment": {US: "kip-ft", SI: "kN-m"},
    }
)

#: displacement units in one length unit (in/ft, mm/m): exact by definition.
DISPLACEMENT_PER_LENGTH: Final = MappingProxyType({US: 12.0, SI: 1000.0})


def symbol(quantity: str, system: str) -> str:
    """Return the unit symbol of a quantity: ``symbol("moment", "us")`` is ``kip-ft``."""
    return UNITS[quantity][system]
