"""The text of the generated Python module: one xlwings function for each entry of the catalogue."""

from __future__ import annotations

import json
from collections.abc import Iterable
from typing import Final

from xlbridge.catalogue.entry import Argument, SheetFunction
from xlbridge.catalogue.validate import describe

WIDTH: Final = 110
_HEAD: Final = '''"""Worksheet functions for xlwings.

Generated from the catalogue by ``python -m xlbridge.excel.generate``: not to be edited.
"""

# ruff: noqa: E501
from __future__ import annotations

from typing import Any

import xlwings as xw

from xlbridge.excel.cells import OMITTED, call
'''


def python_module(entries: Iterable[SheetFunction]) -> str:
    """Return the module's source, laid out as the project's formatter does."""
    return _HEAD + "".join(f"\n\n{_function(entry)}" for entry in entries)


def description(entry: SheetFunction) -> str:
    """Return the help text of a function: its summary and its clause in each edition."""
    found = entry.clauses
    places = "; ".join(f"{edition}: {where}" for edition, where in found.items())
    sure = all(where.confidence == "H" for where in found.values())
    doubt = "" if sure else " Partly from memory: confirm."
    return f"{entry.summary} ASCE/SEI {places}.{doubt}"


def category(entry: SheetFunction) -> str:
    """Return the heading under which Excel lists the function."""
    return f"Storyledger: {entry.category}"


def _function(entry: SheetFunction) -> str:
    names = [argument.name for argument in entry.arguments]
    lines = [
        _fitted("@xw.func(", [f"category={_quoted(category(entry))}"], ")"),
        *(_decorator(argument) for argument in entry.arguments),
        '@xw.ret("raw")',
        _fitted(f"def {entry.name}(", [_parameter(argument) for argument in entry.arguments], ") -> Any:"),
        f'    """{description(entry)}"""',
        _fitted("    return call(", [f'"{entry.name}"', *names], ")"),
    ]
    return "\n".join(lines) + "\n"


def _decorator(argument: Argument) -> str:
    return _fitted("@xw.arg(", [f'"{argument.name}"', '"raw"', f"doc={_quoted(describe(argument))}"], ")")


def _parameter(argument: Argument) -> str:
    return f"{argument.name}: Any = OMITTED" if argument.optional else f"{argument.name}: Any"


def _quoted(text: str) -> str:
    return json.dumps(text, ensure_ascii=False)


def _fitted(head: str, items: list[str], tail: str) -> str:
    """One line if it fits, else the items on a line of their own, else an item a line."""
    indent = " " * (len(head) - len(head.lstrip()))
    whole = f"{head}{', '.join(items)}{tail}"
    if len(whole) <= WIDTH:
        return whole
    together = f"{indent}    {', '.join(items)}"
    lines = [together] if len(together) <= WIDTH else [f"{indent}    {item}," for item in items]
    if len(items) == 1:
        lines = [f"{indent}    {items[0]}"] if len(lines[0]) <= WIDTH else lines
    return "\n".join([head, *lines, f"{indent}{tail}"])
