"""The editions as data: every rule's clause, how sure we are of it, and what differs in more than a number.

One file per edition, one key per rule. A rule that an edition does not have is a refusal, never a blank.
Confidence: "H" seen in a public source, "M" from memory, "U" uncertain (the note says the doubt in words).
"""

from __future__ import annotations

import tomllib
from collections.abc import Mapping, Sequence
from dataclasses import dataclass
from functools import cache
from importlib.resources import files
from types import MappingProxyType
from typing import Any, Final

from engine.errors import NotApplicable
from engine.require import choice

EDITIONS: Final = ("7-16", "7-22")
CONFIDENCE: Final = ("H", "M", "U")
FROM_MEMORY: Final = "from memory"


@dataclass(frozen=True, slots=True)
class Clause:
    """Where a rule stands: standard, section, equation or table, confidence, and a note for the user."""

    standard: str
    section: str
    equation: str = ""
    confidence: str = "H"
    note: str = ""

    def __post_init__(self) -> None:
        """Refuse a confidence outside the closed list, and a doubt that is not put in words."""
        if self.confidence not in CONFIDENCE:
            raise ValueError(f"{self.standard} {self.section}: confidence {self.confidence!r}")
        if self.confidence == "M" and FROM_MEMORY not in self.note:
            raise ValueError(f"{self.standard} {self.section}: the note must say {FROM_MEMORY!r}")
        if self.confidence == "U" and not self.note:
            raise ValueError(f"{self.standard} {self.section}: the doubt must be put in words")

    def __str__(self) -> str:
        prefix = "" if self.equation.startswith("Table") else "Eq. "
        return f"{self.section}, {prefix}{self.equation}" if self.equation else self.section


def clause(edition: str, key: str) -> Clause:
    """Return the clause of a rule.

    >>> str(clause("7-22", "C_vx")), str(clause("7-16", "C_vx"))
    ('12.8.3, Eq. 12.8-13', '12.8.3, Eq. 12.8-12')
    """
    found = rules(edition).get(key)
    if found is None:
        raise NotApplicable("rule", key, f"not a rule of edition {edition}")
    return found


@cache
def rules(edition: str) -> Mapping[str, Clause]:
    """Return every rule of an edition by its key, in the order of the data file."""
    standard, entries, *_ = _edition(choice("edition", edition, EDITIONS))
    return MappingProxyType({key: Clause(standard, **entry) for key, entry in entries.items()})


def value(edition: str, key: str) -> float:
    """Return a number that differs between the editions.

    >>> value("7-16", "beta_floor_factor"), value("7-22", "beta_floor_factor")
    (0.0, 1.25)
    """
    _, _, values, _ = _edition(choice("edition", edition, EDITIONS))
    if key not in values:
        raise NotApplicable("value", key, f"not a value of edition {edition}")
    return float(values[key])


def text(edition: str, key: str) -> str:
    """Return a text that differs between the editions.

    >>> text("7-16", "rho_extreme_categories")
    'D'
    """
    *_, texts = _edition(choice("edition", edition, EDITIONS))
    if key not in texts:
        raise NotApplicable("text", key, f"not a text of edition {edition}")
    return texts[key]


def clauses(key: str, *further: str) -> Mapping[str, Clause]:
    """Return the clause of a rule in each edition that has it; refuse a rule that none has.

    ``further`` rules that apply together with it are taken into the clause.

    >>> list(clauses("C_s_method1"))
    ['7-22']
    >>> str(clauses("C_s_cap", "C_s_cap_long")["7-22"])
    '12.8.1.1, Eq. 12.8-4, 12.8-5'
    """
    found = {}
    for edition in EDITIONS:
        known = rules(edition)
        if key in known:
            found[edition] = together([known[k] for k in (key, *further) if k in known])
    if not found:
        raise NotApplicable("rule", key, "not a rule of any edition")
    return MappingProxyType(found)


def together(parts: Sequence[Clause]) -> Clause:
    """Return several clauses of one edition as one: all their numbers and notes, the least confidence."""
    sections = tuple(dict.fromkeys(part.section for part in parts))
    if len(sections) == 1:
        section, equation = sections[0], ", ".join(dict.fromkeys(p.equation for p in parts if p.equation))
    else:
        section, equation = "; ".join(dict.fromkeys(map(str, parts))), ""
    return Clause(
        parts[0].standard,
        section,
        equation,
        max((part.confidence for part in parts), key=CONFIDENCE.index),
        "; ".join(dict.fromkeys(part.note for part in parts if part.note)),
    )


def differences(key: str) -> tuple[str, ...]:
    """Return the notes of a rule in each edition that has it, without repeats."""
    return tuple(dict.fromkeys(clause.note for clause in clauses(key).values() if clause.note))


@cache
def _edition(edition: str) -> tuple[str, dict[str, dict[str, str]], dict[str, Any], dict[str, str]]:
    name = f"edition_{edition.replace('-', '_')}.toml"
    data = tomllib.loads((files(__name__) / name).read_text(encoding="utf-8"))
    return data["standard"], data["rules"], data["values"], data["texts"]
