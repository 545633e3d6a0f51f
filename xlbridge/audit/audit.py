"""The audit of one workbook: every method run, findings grouped, and what was not checked said."""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from dataclasses import dataclass
from enum import StrEnum
from functools import cached_property

from xlbridge.audit import group
from xlbridge.audit.acceptance import Acceptance, accepted, unused
from xlbridge.audit.effects import not_weighed, with_effects
from xlbridge.audit.finding import Checked, Finding, NotChecked
from xlbridge.audit.kinds import Severity
from xlbridge.audit.methods import METHODS
from xlbridge.audit.subject import Subject
from xlbridge.headless.references import Cell


class State(StrEnum):
    """What the audit says of one formula cell."""

    VERIFIED = "verified"
    FINDING = "finding"
    NOT_CHECKED = "not checked"


@dataclass(frozen=True)
class Audit:
    """The outcome: what each method reported, and the findings made of it."""

    subject: Subject
    checks: tuple[Checked, ...]
    findings: tuple[Finding, ...]
    not_weighed: tuple[NotChecked, ...] = ()
    """Findings whose effects are not known because there are too many of them."""

    @property
    def not_checked(self) -> tuple[NotChecked, ...]:
        """Everything that could not be checked, with the reason."""
        return (*(item for check in self.checks for item in check.not_checked), *self.not_weighed)

    @cached_property
    def states(self) -> Mapping[Cell, State]:
        """The state of every formula cell: verified only where its stored value was compared and held."""
        doubtful = {str(place) for finding in self.findings for place in finding.places}
        unchecked = set(self.subject.results.not_evaluated)
        return {
            cell: State.NOT_CHECKED
            if cell in unchecked or self.subject.book.stored(cell) is None
            else State.FINDING
            if str(cell) in doubtful
            else State.VERIFIED
            for cell in self.subject.book.formula_cells()
        }

    @property
    def formula_cells(self) -> int:
        """The number of formula cells: the N of "checked M of N"."""
        return len(self.states)

    @property
    def checked_cells(self) -> int:
        """The number of formula cells whose stored value was compared with the formula."""
        return sum(state is not State.NOT_CHECKED for state in self.states.values())

    def count(self, severity: Severity) -> int:
        """Return the number of findings of one severity that nobody has accepted."""
        return sum(f.kind.severity is severity and not f.accepted for f in self.findings)


def audit(subject: Subject, acceptances: Sequence[Acceptance] = ()) -> Audit:
    """Run every method on a workbook; what was accepted with a reason is marked so."""
    checks = tuple(method(subject) for method in METHODS)
    seen = [o for check in checks for o in check.observations]
    found = group.findings((*seen, *unused(group.findings(seen), acceptances)))
    weighed = with_effects(subject, found)
    return Audit(subject, checks, tuple(accepted(weighed, acceptances)), not_weighed(subject, found))
