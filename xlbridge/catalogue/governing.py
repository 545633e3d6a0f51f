"""Which bound governs, in built-in functions: the words of the engine, the equation of the edition."""

from __future__ import annotations

from engine.base_shear import which
from engine.editions import EDITIONS, rules

#: a bound in words with its rule, its expression, and where it has this name
Bound = tuple[which.Named, str, str]


def words(coefficient: str, *bounds: Bound) -> str:
    """Return the expression for the first bound that equals the coefficient but for round-off."""
    text = "NA()"
    for named, expression, where in reversed(bounds):
        holds = f"ABS({expression}-{coefficient})<=1E-12*{coefficient}"
        text = f"IF({f'AND({where},{holds})' if where else holds},{_printed(named)},{text})"
    return text


def _printed(named: which.Named) -> str:
    """Return the words with the equation number, by edition where it differs."""
    found = (rules(edition).get(named[1]) for edition in EDITIONS)
    texts = [f'"{named[0]}, Eq. {clause.equation}"' for clause in found if clause is not None]
    same = len(set(texts)) == 1
    return texts[0] if same else f'IF({{edition}}="{EDITIONS[0]}",{texts[0]},{texts[1]})'
