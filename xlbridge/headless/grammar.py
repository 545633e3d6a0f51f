"""From a formula's text to its nodes: one token of look-ahead, operators by how tightly they bind."""

from __future__ import annotations

import math
import re
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
    Unary,
)
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.reference_text import read_reference, split_sheet
from xlbridge.headless.structured import parse_table_reference
from xlbridge.headless.tokens import Token, tokens, unreadable
from xlbridge.values import CellError, Scalar

_FILE_PREFIXES: Final = re.compile(r"(?:_XLFN\.|_XLWS\.|_XLL\.)+")
_STARTS: Final = frozenset({"string", "error", "reference", "number", "call", "name", "table"})


def read_formula(text: str) -> Node:
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
    if token.kind == "reference":
        return read_reference(token.text)
    return _name(*split_sheet(token.text))


def _number(token: Token) -> float:
    number = float(token.text)
    if math.isinf(number):
        raise unreadable(token.start, "this number is too large")
    return number


def _name(sheet: str | None, text: str) -> Node:
    if sheet is None and text.upper() in ("TRUE", "FALSE"):
        return Constant(text.upper() == "TRUE")
    return Name(sheet, text)
