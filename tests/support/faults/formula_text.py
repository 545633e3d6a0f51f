"""Formulas taken apart by openpyxl's tokenizer, not by the product's own parser, one token replaced."""

from __future__ import annotations

import re
from collections.abc import Callable
from random import Random

from openpyxl.formula import Tokenizer
from openpyxl.formula.tokenizer import Token
from openpyxl.utils import column_index_from_string, get_column_letter

Replacement = Callable[[str], str | None]


def replaced(text: str, random: Random, kinds: tuple[str, ...], change: Replacement) -> str | None:
    """The formula with one token of these kinds changed, drawn from those that the change has a hold on."""
    items = Tokenizer(text).items
    choices = [(n, change(t.value)) for n, t in enumerate(items) if t.type in kinds or t.subtype in kinds]
    open_ones = [(n, new) for n, new in choices if new is not None and new != items[n].value]
    if not open_ones:
        return None
    place, new = random.choice(open_ones)
    values = [new if n == place else token.value for n, token in enumerate(items)]
    return "=" + "".join(str(value) for value in values)


def operators(text: str, random: Random, table: dict[str, str]) -> str | None:
    """Another operator for one of the formula's."""
    return replaced(text, random, (Token.OP_IN,), table.get)


def numbers(text: str, random: Random, change: Replacement) -> str | None:
    """Another number for one of the formula's."""
    return replaced(text, random, (Token.NUMBER,), change)


def references(text: str, random: Random, change: Replacement) -> str | None:
    """Another reference or name for one of the formula's."""
    return replaced(text, random, (Token.RANGE,), change)


def functions(text: str, random: Random, table: dict[str, str]) -> str | None:
    """Another function for one of the formula's."""
    return replaced(text, random, (Token.FUNC,), lambda t: f"{new}(" if (new := table.get(t[:-1])) else None)


def arguments(text: str) -> tuple[str, list[str]] | None:
    """Name and arguments of a formula that is one call; none for any other."""
    items = Tokenizer(text).items
    if not items or (items[0].type, items[-1].type) != (Token.FUNC, Token.FUNC):
        return None
    parts, depth = [""], 1
    for item in items[1:-1]:
        depth += {Token.OPEN: 1, Token.CLOSE: -1}.get(item.subtype, 0)
        if depth == 0:
            return None
        if item.type == Token.SEP and depth == 1:
            parts.append("")
        else:
            parts[-1] += item.value
    return items[0].value[:-1], parts


def shifted(reference: str, rows: int = 0, columns: int = 0) -> str | None:
    """A reference to one cell, moved; none for a range or a name."""
    found = re.fullmatch(r"(.*!)?(\$?)([A-Z]{1,3})(\$?)(\d+)", reference)
    if not found:
        return None
    column, row = column_index_from_string(found[3]) + columns, int(found[5]) + rows
    if min(column, row) < 1:
        return None
    return f"{found[1] or ''}{found[2]}{get_column_letter(column)}{found[4]}{row}"


def resized(reference: str, top: int = 0, bottom: int = 0) -> str | None:
    """A range over rows with its ends moved; none for anything else, or where nothing is left."""
    found = re.fullmatch(r"(.*?)(\d+)(:\$?[A-Z]{1,3}\$?)(\d+)", reference)
    if not found or int(found[2]) >= int(found[4]):
        return None
    first, last = int(found[2]) + top, int(found[4]) + bottom
    return f"{found[1]}{first}{found[3]}{last}" if 0 < first <= last else None
