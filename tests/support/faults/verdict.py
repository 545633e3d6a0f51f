"""What the audit says of a planted fault: found, at the right place, by the right kind, as one finding."""

from __future__ import annotations

from collections import Counter
from dataclasses import dataclass
from typing import Final

from openpyxl.utils import range_boundaries

from tests.support.faults.catalogue import Fault
from tests.support.faults.planting import Planted
from xlbridge.audit.audit import Audit
from xlbridge.audit.finding import Finding, Place

MOST: Final = 2**21
#: what follows from a fault elsewhere: results that the inputs do not give, errors passed on
CONSEQUENCES: Final = frozenset(
    {"differs_from_model", "error_value", "inputs_unreadable"}
    | {"implausible_value", "implausible_step", "implausible_order"}
)


@dataclass(frozen=True)
class Verdict:
    """How one planted fault fared."""

    planted: Planted
    findings: tuple[Finding, ...]
    right: tuple[Finding, ...]

    @property
    def fault(self) -> Fault:
        return self.planted.fault

    @property
    def found(self) -> bool:
        """Whether anything was found at all: the workbook was clean before."""
        return bool(self.findings)

    @property
    def described(self) -> bool:
        """Whether a finding is of a kind that fits."""
        return bool(self.right)

    @property
    def located(self) -> bool:
        """Whether fitting findings name every place of the fault, and no other."""
        places = [place for finding in self.right for place in finding.places]
        groups = [[_place(text) for text in group] for group in self.planted.places]
        return (
            bool(places)
            and all(any(_names(place, fault) for place in places for fault in group) for group in groups)
            and all(any(_names(place, fault) for group in groups for fault in group) for place in places)
        )

    @property
    def single(self) -> bool:
        """Whether each cause is one finding of a kind, and what else is found follows from it."""
        others = {f.kind.key for f in self.findings if f not in self.right}
        kinds = Counter(finding.kind.key for finding in self.right)
        return 0 < max(kinds.values(), default=0) <= self.planted.causes and others <= CONSEQUENCES

    @property
    def good(self) -> bool:
        """All of it."""
        return self.described and self.located and self.single

    @property
    def methods(self) -> frozenset[str]:
        """The methods that found something."""
        return frozenset(finding.kind.method for finding in self.findings)

    def __str__(self) -> str:
        shown = "; ".join(
            f"{f.kind.key} at {', '.join(map(str, f.places[:6]))}: {f.words[:90]}" for f in self.findings
        )
        return f"{self.planted} -> {shown or 'nothing'}"


def verdict(planted: Planted, outcome: Audit) -> Verdict:
    """Judge the audit of a spoilt workbook."""
    fitting = (f for f in outcome.findings if f.kind.key in planted.fault.kinds)
    right = tuple(f for f in fitting if f.kind.key not in CONSEQUENCES or _is_there(f, planted))
    return Verdict(planted, outcome.findings, right)


def _is_there(finding: Finding, planted: Planted) -> bool:
    """Whether a finding names a place of the fault: elsewhere the same kind may follow from it."""
    touched = [_place(text) for group in planted.places for text in group]
    return any(_names(place, fault) for place in finding.places for fault in touched)


def _place(text: str) -> Place:
    """``Levels!C14``, ``'Take-off'!4:4``, ``Levels`` or ``workbook``."""
    if text == "workbook":
        return Place()
    sheet, mark, address = text.rpartition("!")
    return Place(sheet.strip("'"), address) if mark else Place(text.strip("'"))


def _names(place: Place, fault: Place) -> bool:
    """Whether a place named by a finding is the fault's, or lies within it."""
    if place.sheet != fault.sheet or bool(place.address) < bool(fault.address):
        return False
    if not fault.address or not place.address:
        return True
    return _within(place.address, fault.address)


def _within(inner: str, outer: str) -> bool:
    """Whether an area lies in another; ``4:4`` and ``C:C`` are rows and columns."""
    left, top, right, bottom = range_boundaries(inner)
    x, y, x_end, y_end = range_boundaries(outer)
    return (x or 1) <= (left or 1) <= (right or MOST) <= (x_end or MOST) and (
        (y or 1) <= (top or 1) <= (bottom or MOST) <= (y_end or MOST)
    )
