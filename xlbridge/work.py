"""Show the work of a worksheet function: its equation in symbols, and with the numbers put in."""

from __future__ import annotations

import inspect
import re
from collections.abc import Iterable, Sequence
from typing import Any

import numpy as np

from engine.errors import EngineError
from xlbridge.catalogue.entry import Argument as Declared
from xlbridge.catalogue.entry import Case, SheetFunction, Term
from xlbridge.values import OMITTED, Argument, Value

_TWICE = re.compile(r"(?<!\w)(\w+)(?: =|:)? \(?\1(?!\w)\)?")
LEFT_OPEN = "…"  # stands for what can not be worked out
SHOWN = 6  # significant digits of a number in an equation


def equation(entry: SheetFunction) -> str:
    """Return the equation in symbols.

    >>> from xlbridge.catalogue import CATALOGUE
    >>> equation(CATALOGUE["ELF_FX"])
    'F_x = C_vx·V'
    """
    symbols = {part.name: part.symbol for part in _parts(entry)}
    return f"{entry.result.symbol} = {_once(entry.expression.format_map(symbols))}"


def _once(text: str) -> str:
    """Return a text in symbols without the repetitions of places that name what they hold.

    >>> _once("table at S_D1 = S_D1, rule rule")
    'table at S_D1, rule'
    """
    return _TWICE.sub(r"\1", text)


def _parts(entry: SheetFunction) -> Iterable[Declared | Term]:
    yield from entry.arguments
    yield from entry.terms


def numbers(entry: SheetFunction, arguments: Sequence[Argument]) -> str:
    """Return the right side of the equation with the numbers put in.

    >>> from xlbridge.catalogue import CATALOGUE
    >>> numbers(CATALOGUE["ELF_FX"], [286.0, 0.28])
    '0.28·286'
    """
    values = _values(entry, arguments)
    case = _case(entry, values)
    return _put_in(entry.expression if case is None else case.expression, values)


def _values(entry: SheetFunction, arguments: Sequence[Argument]) -> dict[str, Any]:
    """Return the values of the arguments, those left out included, and of the terms."""
    given = {a.name: v for a, v in zip(entry.arguments, arguments, strict=False) if v is not OMITTED}
    values = {**entry.defaults, **given}
    return values | {term.name: _term(term, values) for term in entry.terms}


def case_of(entry: SheetFunction, arguments: Sequence[Argument]) -> Case | None:
    """Return the case that holds; none without cases, or where a value is no single number or word."""
    return _case(entry, _values(entry, arguments))


def _case(entry: SheetFunction, values: dict[str, Any]) -> Case | None:
    for case in entry.cases:
        own = [values[name] for name in inspect.signature(case.holds).parameters]
        if not all(isinstance(value, int | float | str) and value != LEFT_OPEN for value in own):
            return None
        if case.holds(*own):
            return case
    return None


def _put_in(template: str, values: dict[str, Any]) -> str:
    return template.format_map({name: shown(value) for name, value in values.items()})


def numbers_line(entry: SheetFunction, arguments: Sequence[Argument], result: Value) -> str:
    """Return the whole equation with the numbers put in, and its result.

    >>> from xlbridge.catalogue import CATALOGUE
    >>> numbers_line(CATALOGUE["ELF_FX"], [286.0, 0.28], 80.08)
    'F_x = 0.28·286 = 80.08'
    """
    values = _values(entry, arguments)
    case = _case(entry, values)
    where = f", where {_put_in(case.where, values)}" if case else ""
    return f"{entry.result.symbol} = {numbers(entry, arguments)} = {shown(result)}{where}"


def shown(value: Any) -> str:
    """Return a value as it stands in an equation: a range is cut to its ends."""
    if isinstance(value, np.ndarray):
        return shown(tuple((number,) for number in value.ravel()) if value.ndim else float(value))
    if isinstance(value, tuple):
        cells = [cell for row in value for cell in row if cell is not None]
        inner = cells if len(cells) <= 4 else [*cells[:2], "…", cells[-1]]
        return f"[{', '.join(map(shown, inner))}]"
    return f"{value:.{SHOWN}g}" if isinstance(value, float | int) else str(value)


def _term(term: Term, values: dict[str, Any]) -> Any:
    """Return the value of a term, or an ellipsis where a range holds cells that the formula refuses."""
    names = inspect.signature(term.compute).parameters
    try:
        return term.compute(**{name: _plain(values[name]) for name in names})
    except EngineError:
        return LEFT_OPEN


def _plain(value: Any) -> Any:
    """A range as a plain list."""
    if isinstance(value, tuple):
        return [cell for row in value for cell in row if cell is not None]
    return value
