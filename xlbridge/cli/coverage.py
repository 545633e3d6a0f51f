"""The coverage list: each capability with its functions, where the workbook calls them, and their checks."""

from __future__ import annotations

from collections import Counter
from collections.abc import Iterator

from workbook_templates.parts import PARTS
from xlbridge.catalogue import SheetFunction
from xlbridge.catalogue.capabilities import CAPABILITIES
from xlbridge.catalogue.checked import outside_checks


def coverage() -> tuple[list[str], list[str]]:
    """Return the lines of the list, and the gaps: capabilities and functions that lack something."""
    called = _called()
    lines: list[str] = []
    gaps: list[str] = []
    for capability in CAPABILITIES:
        functions = capability.functions
        lines.append(f"{capability.text} ({capability.clause}): {len(functions)} functions")
        lines += [f"  {entry.name:<26} {_checks(entry)}; {_places(entry, called)}" for entry in functions]
        gaps += _gaps(capability.text, functions, called)
    return lines, gaps


def _called() -> dict[str, list[str]]:
    """The parts of the workbook that call each function."""
    found: dict[str, list[str]] = {}
    for part in PARTS.values():
        for name in dict.fromkeys(part.calls):
            found.setdefault(name, []).append(part.key)
    return found


def _checks(entry: SheetFunction) -> str:
    kinds: Counter[str] = Counter()
    for check in outside_checks().get(entry.name, ()):
        kinds[check.kind] += check.values
    return ", ".join(f"{count} {kind}" for kind, count in kinds.items()) or "no check value"


def _places(entry: SheetFunction, called: dict[str, list[str]]) -> str:
    return f"in {', '.join(called[entry.name])}" if entry.name in called else "not in the workbook"


def _gaps(text: str, functions: tuple[SheetFunction, ...], called: dict[str, list[str]]) -> Iterator[str]:
    if not functions:
        yield f"{text}: no function"
    elif not any(entry.name in outside_checks() for entry in functions):
        yield f"{text}: no check value"
    elif not any(entry.name in called for entry in functions):
        yield f"{text}: no place in the workbook"
    for entry in functions:
        if entry.name not in outside_checks():
            yield f"{entry.name}: no check value"
