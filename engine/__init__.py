"""Seismic story forces of ASCE/SEI 7: one tested function for each rule, vectorised.

Units are consistent (kip and ft, or kN and m); where a coefficient carries units the system is an argument.
Arguments are checked at the door: a refusal is an :class:`EngineError` that names the argument, the value
and what is allowed. Results are an aid to a licensed engineer's judgement: confirm every value against the
standard adopted by the authority having jurisdiction.
"""

from engine import (
    base_shear,
    diaphragm,
    drift,
    dynamics,
    hazard,
    irregularity,
    load_effects,
    occupancy,
    period,
    redundancy,
    separation,
    stability,
    systems,
    torsion,
    two_stage,
    vertical,
    weight,
)
from engine.building import Building, Package, from_mapping, solve, to_mapping
from engine.editions import EDITIONS, clause
from engine.errors import EngineError, ImpossibleValue, MissingValue, NotApplicable, WrongType
from engine.version import __version__

__all__ = [
    "EDITIONS",
    "Building",
    "EngineError",
    "ImpossibleValue",
    "MissingValue",
    "NotApplicable",
    "Package",
    "WrongType",
    "__version__",
    "base_shear",
    "clause",
    "diaphragm",
    "drift",
    "dynamics",
    "from_mapping",
    "hazard",
    "irregularity",
    "load_effects",
    "occupancy",
    "period",
    "redundancy",
    "separation",
    "solve",
    "stability",
    "systems",
    "to_mapping",
    "torsion",
    "two_stage",
    "vertical",
    "weight",
]
