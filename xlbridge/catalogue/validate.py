"""Refuse a wrong declaration when it is imported, not when a cell shows a wrong number."""

from __future__ import annotations

import inspect
import re
from string import Formatter
from typing import Any

from engine.editions import clauses
from engine.errors import listed
from engine.units import UNITS
from xlbridge.catalogue.entry import Argument, Kind, SheetFunction

TEXT_LIMIT = 255  # characters of a function or argument description in Excel
_NAME = re.compile(r"ELF_[A-Z][A-Z0-9_]*")
_ARGUMENT = re.compile(r"[A-Za-z][A-Za-z0-9_]*")
_ADDRESS = re.compile(r"[A-Za-z]{1,3}[0-9]+|[Rr][0-9]*[Cc][0-9]*")


class DeclarationError(TypeError):
    """A worksheet function is declared wrongly; the message names the function and the fault."""


def validate(entry: SheetFunction) -> SheetFunction:
    """Return ``entry`` unchanged, or raise :class:`DeclarationError` with the first fault found."""
    faults = (*_name_faults(entry), *_argument_faults(entry), *_text_faults(entry), *_template_faults(entry))
    for fault in faults or (*_clause_faults(entry), *_example_faults(entry)):
        raise DeclarationError(f"{entry.name}: {fault}")
    return entry


def _name_faults(entry: SheetFunction) -> list[str]:
    if not _NAME.fullmatch(entry.name):
        return ["a worksheet name is ELF_ and capitals, digits or underscores"]
    return []


def _argument_faults(entry: SheetFunction) -> list[str]:
    faults = []
    parameters = inspect.signature(entry.function).parameters
    declared = [a.name for a in entry.arguments]
    if declared != list(parameters):
        return [f"arguments {declared}, but the engine function takes {list(parameters)}"]
    if len({name.lower() for name in declared}) < len(declared):
        faults.append("two argument names differ by case only")
    for a in entry.arguments:
        faults += [f"argument {a.name}: {fault}" for fault in _faults_of(a)]
        if a.optional != (parameters[a.name].default is not inspect.Parameter.empty):
            faults.append(f"argument {a.name}: optional flag and default of the engine function disagree")
    optional = [a.optional for a in entry.arguments]
    if optional != sorted(optional):
        faults.append("optional arguments come last")
    return faults


def _faults_of(a: Argument) -> list[str]:
    faults = []
    if not _ARGUMENT.fullmatch(a.name) or _ADDRESS.fullmatch(a.name):
        faults.append("not a legal name, or it reads as a cell address")
    if a.unit not in UNITS:
        faults.append(f"unknown unit {a.unit!r}")
    if (a.kind is Kind.CHOICE) != bool(a.choices):
        faults.append("a choice lists its words, nothing else does")
    if (a.kind is Kind.CHOICE) != (a.unit == "text"):
        faults.append("a choice is text, nothing else is")
    if a.span.low is not None and a.span.high is not None and a.span.low >= a.span.high:
        faults.append("the allowed range is empty")
    return faults


def _text_faults(entry: SheetFunction) -> list[str]:
    faults = [
        f"{what} is empty or longer than {TEXT_LIMIT} characters"
        for what, text in (("summary", entry.summary), *((a.name, describe(a)) for a in entry.arguments))
        if not text or len(text) > TEXT_LIMIT
    ]
    if entry.result.unit not in UNITS:
        faults.append(f"result: unknown unit {entry.result.unit!r}")
    return faults


def _template_faults(entry: SheetFunction) -> list[str]:
    names = {a.name for a in entry.arguments}
    terms = {t.name for t in entry.terms}
    faults = [f"term {t!r} has the name of an argument" for t in terms & names]
    if not entry.expression:
        faults.append("no expression")
    for what, template, known in (
        ("expression", entry.expression, names | terms),
        ("native", entry.native, names),
    ):
        faults += [f"{what}: unknown place {{{p}}}" for p in sorted(places(template) - known)]
    return faults


def _clause_faults(entry: SheetFunction) -> list[str]:
    try:
        for key in (entry.rule, *entry.also):
            clauses(key)
    except ValueError as error:
        return [f"rule {entry.rule!r}: {error}"]
    return []


def _example_faults(entry: SheetFunction) -> list[str]:
    try:
        found = entry.function(**entry.example.arguments)
    except (TypeError, ValueError) as error:
        return [f"the example fails: {error}"]
    if printed(found, entry.example.result) != entry.example.result:
        return [f"the example gives {found}, but {entry.example.result} is declared"]
    return []


def printed(value: Any, like: str) -> str:
    """Return ``value`` with as many decimals as the number ``like`` is printed with."""
    if isinstance(value, str):
        return value
    return f"{float(value):.{len(like.partition('.')[2])}f}"


def places(template: str) -> set[str]:
    """Return the names of the ``{places}`` in a template."""
    return {field for _, field, _, _ in Formatter().parse(template) if field is not None}


def describe(a: Argument) -> str:
    """Return the help line of an argument: text, unit, allowed values."""
    if a.kind is Kind.CHOICE:
        return f"{a.text}: {listed(a.choices)}."
    unit = {"none": "no unit", "any": "any one unit", "time": "s", "acceleration": "g"}.get(
        a.unit, f"{_a(a.unit)} unit"
    )
    each = f"one cell {_a(a.each)}, " if a.kind is Kind.LEVELS else ""
    return f"{a.text} [{unit}], {each}{a.span}."


def _a(word: str) -> str:
    return f"an {word}" if word[0] in "aeio" else f"a {word}"
