"""Show the work of a worksheet function: its equation in symbols, and with the numbers put in."""

from __future__ import annotations

import inspect
from collections.abc import Iterable, Sequence
from typing import Any

import numpy as np

from engine.errors import EngineError
from xlbridge.catalogue.entry import Argument as Declared
from xlbridge.catalogue.entry import SheetFunction, Term
from xlbridge.values import OMITTED, Argument, Value

SHOWN = 6  # significant digits of a number in an equation


def equation(entry: SheetFunction) -> str:
    """Return the equation in symbols.

    >>> from xlbridge.catalogue import CATALOGUE
    >>> equation(CATALOGUE["ELF_FX"])
    'F_x = C_vx·V'
    """
    symbols = {part.name: part.symbol for part in _parts(entry)}
    return f"{entry.result.symbol} = {entry.expression.format_map(symbols)}"


def _parts(entry: SheetFunction) -> Iterable[Declared | Term]:
    yield from entry.arguments
    yield from entry.terms


def numbers(entry: SheetFunction, arguments: Sequence[Argument]) -> str:
    """Return the right side of the equation with the numbers put in.

    >>> from xlbridge.catalogue import CATALOGUE
    >>> numbers(CATALOGUE["ELF_FX"], [286.0, 0.28])
    '0.28·286'
    """
    given = {a.name: v for a, v in zip(entry.arguments, arguments, strict=False) if v is not OMITTED}
    values = {**entry.defaults, **given}
    terms = {term.name: _term(term, values) for term in entry.terms}
    return entry.expression.format_map({name: shown(v) for name, v in (values | terms).items()})


def numbers_line(entry: SheetFunction, arguments: Sequence[Argument], result: Value) -> str:
    """Return the whole equation with the numbers put in, and its result.

    >>> from xlbridge.catalogue import CATALOGUE
    >>> numbers_line(CATALOGUE["ELF_FX"], [286.0, 0.28], 80.08)
    'F_x = 0.28·286 = 80.08'
    """
    return f"{entry.result.symbol} = {numbers(entry, arguments)} = {shown(result)}"


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
        return "…"


def _plain(value: Any) -> Any:
    """A range as a plain list."""
    if isinstance(value, tuple):
        return [cell for row in value for cell in row if cell is not None]
    return value
