"""What formulas and names do that no reader expects of them."""

from __future__ import annotations

import re
from collections.abc import Iterator
from typing import Final

from xlbridge.audit.finding import Observation, Place
from xlbridge.audit.subject import Subject
from xlbridge.headless.book import Formula
from xlbridge.headless.nodes import ArrayConstant, Call, Constant, Missing, Node, walk
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.shapes import parse
from xlbridge.values import CellError

VOLATILE: Final = frozenset(
    {"NOW", "TODAY", "RAND", "RANDBETWEEN", "RANDARRAY", "OFFSET", "INDIRECT", "INFO", "CELL"}
)
_CALL: Final = re.compile(r"\b([A-Z][A-Z0-9.]*)\s*\(", re.IGNORECASE)
_STRINGS: Final = re.compile(r'"[^"]*"')
#: another workbook in brackets before a sheet, or behind a path
_OTHER_FILE: Final = re.compile(r"\[[^\[\]]+\][^\[\]!']*'?!|\|'?[^!|]+'?!")
_TESTS: Final = frozenset({"ISERROR", "ISERR", "ISNA"})
_CATCHES: Final = frozenset({"IFERROR", "IFNA"})


def check(subject: Subject) -> Iterator[Observation]:
    """Yield what the formulas and the names of the workbook do."""
    seen: set[int] = set()
    for formulas in subject.book.formulas.values():
        for formula in formulas.values():
            if id(formula) not in seen:
                seen.add(id(formula))
                yield from _formula(subject, formula)
    for (scope, name), text in subject.book.names.items():
        yield from _name(scope or "", name, text)


def _formula(subject: Subject, formula: Formula) -> Iterator[Observation]:
    place, text = Place.of(formula.cell), formula.text
    plain = _STRINGS.sub('""', text)
    if _OTHER_FILE.search(plain):
        yield Observation("external_link", place, f"the formula reads another file: {text}", found=text)
    called = sorted({found.upper() for found in _CALL.findall(plain)} & VOLATILE)
    if called:
        words = f"the formula calls {', '.join(called)}: {text}"
        yield Observation("volatile_function", place, words, found=text, cause=", ".join(called))
    if _may_hide(plain) and not _is_templates(subject, formula) and _hides(text):
        words = f"the formula shows something else where it fails: {text}"
        yield Observation("error_hidden", place, words, found=text)


def _name(scope: str, name: str, text: str) -> Iterator[Observation]:
    place = Place(scope)
    if "#REF!" in text:
        yield Observation("name_broken", place, f"name {name} is {text}", found=text, cause=name)
    elif _OTHER_FILE.search(_STRINGS.sub('""', text)):
        yield Observation("external_link", place, f"name {name} reads another file: {text}", found=text)


def _may_hide(text: str) -> bool:
    upper = text.upper()
    return any(name in upper for name in (*_CATCHES, *_TESTS))


def _is_templates(subject: Subject, formula: Formula) -> bool:
    """Whether the template has a formula there: whatever differs from it is found by that."""
    twin = subject.own.twin if subject.own else None
    cell = subject.alignment.to_twin(formula.cell) if twin else None
    return bool(twin and cell and twin.formula(cell))


def _hides(text: str) -> bool:
    """Whether a failure turns into a constant: what IFERROR or a test for an error gives in its place."""
    try:
        calls = [part for part in walk(parse(text)) if isinstance(part, Call)]
    except NotEvaluated:
        return False
    for call in calls:
        if call.name in _CATCHES and len(call.arguments) > 1 and _is_value(call.arguments[1]):
            return True
        tests = call.name == "IF" and any(
            isinstance(part, Call) and part.name in _TESTS for part in walk(call.arguments[0])
        )
        if tests and any(map(_is_value, call.arguments[1:])):
            return True
    return False


def _is_value(node: Node) -> bool:
    """Whether a branch is a constant that is no error; a text that says so is none either."""
    if isinstance(node, Constant):
        return not isinstance(node.value, CellError) and not (isinstance(node.value, str) and node.value)
    return isinstance(node, ArrayConstant | Missing)
