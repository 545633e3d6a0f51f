"""From what the methods saw to numbered findings: one cause, one finding, all its cells."""

from __future__ import annotations

from collections.abc import Iterable

from xlbridge.audit.finding import Finding, Observation
from xlbridge.audit.kinds import KINDS, Severity


def findings(observations: Iterable[Observation]) -> tuple[Finding, ...]:
    """Group observations of one cause, the worst first, and number them."""
    groups: dict[tuple[str, str], list[Observation]] = {}
    for place, observation in enumerate(observations):
        groups.setdefault((observation.kind, observation.cause or f"\0{place}"), []).append(observation)
    order = list(Severity)
    ranked = sorted(groups.items(), key=lambda group: order.index(KINDS[group[0][0]].severity))
    return tuple(Finding(n, KINDS[kind], tuple(seen)) for n, ((kind, _), seen) in enumerate(ranked, 1))
