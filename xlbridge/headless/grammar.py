"""From a formula's text to its nodes: one token of look-ahead, operators by how tightly they bind."""

from __future__ import annotations

import math
import re
from functools import lru_cache
from typing import Final

from xlbridge.headless.nodes import (
    BINDING,
    JOINING,
    PERCENT,
    PREFIX,
    ArrayConstant,
    Binary,
    Call,
    Constant,
    Join,
    Missing,
    Name,
    Node,
    Reference,
    Unary,
)
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.references import MAX_COLUMNS, MAX_ROWS, Bounds, column_number
from xlbridge.headless.structured import parse_table_reference
from xlbridge.headless.tokens import Token, tokens, unreadable
from xlbridge.values import CellError, Scalar

_FILE_PREFIXES: Final = re.compile(r"(?:_XLFN\.|_XLWS\.|_XLL\.)+")
_CORNER: Final = re.compile(r"\$?([A-Za-z]*)\$?([0-9]*)\Z")
_STARTS: Final = frozenset({"string", "error", "reference", "number", "call", "name", "table"})


@lru_cache(maxsize=100_000)
def parse(text: str) -> Node:
    """The formula's nodes; the leading equals sign may be missing, as in a defined name.

    Raises :class:`NotEvaluated`, with the position, for what cannot be read.
    """
    try:
        return _Parser(text).formula()
    except RecursionError:
        raise NotEvaluated("the formula is nested too deeply") from None


class _Parser:
    def __init__(self, text: str) -> None:
        self._tokens = tokens(text, 1 if text.startswith("=") else 0)
        self._token = next(self._tokens)

    def formula(self) -> Node:
        node = self._expression(0)
        if self._token.kind != "end":
            raise unreadable(self._token.start, f"nothing can follow here, yet {self._token.text} does")
        return node

    def _take(self) -> Token:
        token, self._token = self._token, next(self._tokens, self._token)
        return token

    def _at(self, *texts: str) -> bool:
        return self._token.kind == "op" and self._token.text in texts

    def _expect(self, text: str, what: str) -> None:
        if not self._at(text):
            raise unreadable(self._token.start, f"{text} is missing {what}")
        self._take()

    def _expression(self, least: int) -> Node:
        """What binds more tightly than ``least``."""
        left = self._prefixed()
        while True:
            op, binding = self._operator()
            if binding <= least:
                return left
            if op != " ":
                self._take()
            if op == "%":
                left = Unary("%", left)
            else:
                kind = Join if op in JOINING else Binary
                left = kind(op, left, self._expression(binding))

    def _operator(self) -> tuple[str, int]:
        token = self._token
        if token.kind == "op":
            if token.text in BINDING:
                return token.text, BINDING[token.text]
            if token.text == "%":
                return "%", PERCENT
            if token.text == ":":
                return ":", JOINING[":"]
        if token.spaced and (token.kind in _STARTS or self._at("(")):
            return " ", JOINING[" "]
        return "", 0

    def _prefixed(self) -> Node:
        if self._at("-", "+"):
            return Unary(self._take().text, self._expression(PREFIX))
        return self._primary()

    def _primary(self) -> Node:
        token = self._take()
        if token.kind == "call":
            return self._call(token)
        if token.kind in _STARTS:
            return _atom(token)
        if token.text == "(" and token.kind == "op":
            return self._parenthesis()
        if token.text == "{" and token.kind == "op":
            return self._array()
        what = f"{token.text} stands" if token.text else "the formula ends"
        raise unreadable(token.start, f"{what} where a value is expected")

    def _parenthesis(self) -> Node:
        node = self._expression(0)
        while self._at(","):
            self._take()
            node = Join(",", node, self._expression(0))
        self._expect(")", "to close the parenthesis")
        return node

    def _call(self, token: Token) -> Node:
        name = _FILE_PREFIXES.sub("", token.text[:-1].upper(), count=1)
        arguments: list[Node] = []
        while not self._at(")") or arguments:
            arguments.append(Missing() if self._at(",", ")") else self._expression(0))
            if not self._at(","):
                break
            self._take()
        self._expect(")", f"to close {name}(")
        return Call(name, tuple(arguments))

    def _array(self) -> Node:
        rows: list[tuple[Scalar, ...]] = []
        start = self._token.start - 1
        while True:
            rows.append(self._array_row())
            if not self._at(";"):
                break
            self._take()
        self._expect("}", "to close the array")
        if len({len(row) for row in rows}) > 1:
            raise unreadable(start, "the rows of this array have different lengths")
        return ArrayConstant(tuple(rows))

    def _array_row(self) -> tuple[Scalar, ...]:
        row = [self._array_item()]
        while self._at(","):
            self._take()
            row.append(self._array_item())
        return tuple(row)

    def _array_item(self) -> Scalar:
        sign = self._take().text if self._at("-", "+") else ""
        start = self._token.start
        node = self._primary()
        if isinstance(node, Constant) and not sign:
            return node.value
        if isinstance(node, Constant) and isinstance(node.value, float):
            return -node.value if sign == "-" else node.value
        raise unreadable(start, "an array holds constants only")


def _atom(token: Token) -> Node:
    if token.kind == "number":
        return Constant(_number(token))
    if token.kind == "string":
        return Constant(token.text[1:-1].replace('""', '"'))
    if token.kind == "error":
        return Constant(CellError("#REF!" if "#REF!" in token.text else token.text))
    if token.kind == "table":
        return parse_table_reference(token.text, token.start)
    sheet, text = _split_sheet(token.text)
    return _reference(token, sheet, text) if token.kind == "reference" else _name(sheet, text)


def _number(token: Token) -> float:
    number = float(token.text)
    if math.isinf(number):
        raise unreadable(token.start, "this number is too large")
    return number


def _name(sheet: str | None, text: str) -> Node:
    if sheet is None and text.upper() in ("TRUE", "FALSE"):
        return Constant(text.upper() == "TRUE")
    return Name(sheet, text)


def _split_sheet(text: str) -> tuple[str | None, str]:
    """The sheet a reference names, if any, and what follows it."""
    prefix, mark, rest = text.rpartition("!")
    if not mark:
        return None, text
    quoted = prefix.startswith("'")
    sheet = prefix[1:-1].replace("''", "'") if quoted else prefix
    if "[" in sheet:
        raise NotEvaluated(f"{text} refers to another workbook")
    if ":" in sheet:
        raise NotEvaluated(f"{text} refers to several sheets at once")
    return sheet, rest


def _reference(token: Token, sheet: str | None, text: str) -> Node:
    first, mark, last = text.partition(":")
    left, top = _corner(first)
    right, bottom = _corner(last) if mark else (left, top)
    whole_lines = not (left and top)
    if max(left, right) > MAX_COLUMNS or max(top, bottom) > MAX_ROWS or _is_zero_row(text):
        if mark:
            raise unreadable(token.start, f"{text} lies outside the sheet")
        return _name(sheet, text)
    bounds = Bounds(
        min(top, bottom) or 1,
        min(left, right) or 1,
        max(top, bottom) or MAX_ROWS,
        max(left, right) or MAX_COLUMNS,
    )
    return Reference(token.text, sheet, bounds, whole_lines)


def _corner(text: str) -> tuple[int, int]:
    """Column and row of a corner; 0 stands for the one that whole columns or rows leave out."""
    found = _CORNER.match(text)
    letters, digits = found.groups() if found else ("", "")
    return column_number(letters), int(digits or 0)


def _is_zero_row(text: str) -> bool:
    return any(re.search(r"\A\$?[A-Za-z]*\$?0+\Z", corner) for corner in text.split(":"))
