"""The register of fault operators."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass
from typing import Final

from tests.support.faults.scene import Scene
from xlbridge.audit.kinds import KINDS

GROUPS: Final = ("formula", "checks", "input", "structure", "stale")

Operator = Callable[[Scene], None]


@dataclass(frozen=True)
class Fault:
    """One operator: ``kinds`` are those by which it may rightly be found.

    ``missed`` says why the audit does not find it, or not by such a kind at such a place: a known miss.
    """

    name: str
    group: str
    words: str
    plant: Operator
    kinds: frozenset[str]
    missed: str

    @property
    def needs_earlier_issue(self) -> bool:
        """Whether it can be told only by comparing with the checked issue."""
        return any(KINDS[kind].method == "against" for kind in self.kinds)

    def __post_init__(self) -> None:
        assert self.group in GROUPS, self.name
        assert self.words, self.name
        assert self.kinds or self.missed, self.name


CATALOGUE: Final[dict[str, Fault]] = {}


def fault(group: str, *kinds: str, missed: str = "") -> Callable[[Operator], Operator]:
    """Register an operator."""

    def register(plant: Operator) -> Operator:
        name = plant.__name__.replace("_", " ")
        assert name not in CATALOGUE, name
        words = " ".join((plant.__doc__ or "").split())
        CATALOGUE[name] = Fault(name, group, words, plant, frozenset(kinds), missed)
        return plant

    return register
