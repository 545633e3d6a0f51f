"""What the worksheet functions of a workbook of another make are given: its inputs, told by the arguments."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import dataclass

from xlbridge.audit.finding import Place
from xlbridge.audit.subject import Subject
from xlbridge.catalogue import CATALOGUE
from xlbridge.headless.trace import TracedCall, trace
from xlbridge.values import Argument

HEIGHTS = "heights"
CALLS = "ELF_"


@dataclass(frozen=True, slots=True)
class Given:
    """An argument of a call: its name, how it is written, its value, and the heights of the same call."""

    argument: str
    written: str
    value: Argument
    heights: Argument
    place: Place


def given(subject: Subject) -> Iterator[Given]:
    """Yield each argument that is handed to a worksheet function, once as it is written on a sheet."""
    seen: set[tuple[str, str, str]] = set()
    for sheet, formulas in subject.book.formulas.items():
        for formula in formulas.values():
            if CALLS not in formula.text.upper():
                continue
            found = trace(subject.evaluator, sheet, formula.cell.address)
            for one in (one for call in found.calls for one in _arguments(call, Place.of(formula.cell))):
                key = sheet, one.argument, one.written
                if key not in seen:
                    seen.add(key)
                    yield one


def _arguments(call: TracedCall, place: Place) -> Iterator[Given]:
    names = [argument.name for argument in CATALOGUE[call.name].arguments]
    heights = dict(zip(names, call.arguments, strict=False)).get(HEIGHTS)
    for name, written, value in zip(names, call.labels, call.arguments, strict=False):
        yield Given(name, written, value, heights, place)
