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
        "any": {US: "any", SI: "any"},
        "text": {US: "text", SI: "text"},
        "time": {US: "s", SI: "s"},
        "acceleration": {US: "g", SI: "g"},
        "length": {US: "ft", SI: "m"},
        "area": {US: "ft2", SI: "m2"},
        "velocity": {US: "ft/s", SI: "m/s"},
        "displacement": {US: "in", SI: "mm"},
        "force": {US: "kip", SI: "kN"},
        "unit load": {US: "psf", SI: "kN/m2"},
        "moment": {US: "kip-ft", SI: "kN-m"},
        "stiffness": {US: "kip/in", SI: "kN/mm"},
    }
)

#: displacement units in one length unit (in/ft, mm/m): exact by definition.
DISPLACEMENT_PER_LENGTH: Final = MappingProxyType({US: 12.0, SI: 1000.0})

#: standard gravity in displacement units per second squared: exact by definition.
GRAVITY: Final = MappingProxyType({US: 9806.65 / 25.4, SI: 9806.65})

#: metres in a foot: exact by definition.
FOOT: Final = 0.3048

#: unit loads times areas in one force unit (lb/kip, kN/kN): exact by definition.
UNIT_LOAD_AREA_PER_FORCE: Final = MappingProxyType({US: 1000.0, SI: 1.0})


def symbol(quantity: str, system: str) -> str:
    """Return the unit symbol of a quantity: ``symbol("moment", "us")`` is ``kip-ft``."""
    return UNITS[quantity][system]
