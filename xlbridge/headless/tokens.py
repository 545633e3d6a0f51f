"""A formula's text cut into tokens."""

from __future__ import annotations

import re
from collections.abc import Iterator
from typing import Final, NamedTuple

from xlbridge.headless.operands import NotEvaluated

_IDENTIFIER: Final = r"(?:[^\W\d]|\\)[\w.\\?]*+"
_QUOTED: Final = r"'(?:[^']|'')+'"
_PREFIX: Final = rf"(?:(?:{_QUOTED}|(?:\[[^\[\]]+\])?[\w.]+(?::[\w.]+)?|\[[^\[\]]+\])!)"
_CELL: Final = r"\$?[A-Za-z]{1,3}\$?[0-9]{1,7}(?![\w.(\[!?\\])"
_COLUMN: Final = r"\$?[A-Za-z]{1,3}(?![\w.(\[!?\\])"
_ROW: Final = r"\$?[0-9]{1,7}(?![\w.(\[!?\\])"
_LOST: Final = rf"\#REF!(?:{_CELL}(?::{_CELL})?)?"

_REFERENCE: Final = rf"{_PREFIX}?(?:{_CELL}(?::{_CELL})?|{_COLUMN}:{_COLUMN}|{_ROW}:{_ROW})"

REFERENCE: Final = re.compile(rf"(?<![\w.\\$!'\]])({_REFERENCE})")
"""What looks like a reference anywhere in a formula, in a quoted text too."""
_TOKEN: Final = re.compile(
    rf"""
      (?P<string>"(?:[^"]|"")*")
    | (?P<error>{_PREFIX}?{_LOST}|\#(?:NULL!|DIV/0!|VALUE!|NAME\?|NUM!|N/A))
    | (?P<reference>{_REFERENCE})
    | (?P<number>(?:[0-9]+(?:\.[0-9]*)?|\.[0-9]+)(?:[eE][+-]?[0-9]+)?)
    | (?P<call>{_IDENTIFIER}\()
    | (?P<name>{_PREFIX}?{_IDENTIFIER}(?!\[))
    | (?P<table>(?:{_IDENTIFIER})?\[)
    | (?P<op><>|<=|>=|[-+*/^&=<>%(),;{{}}:])
    """,
    re.VERBOSE,
)
_SPACE: Final = re.compile(r"[ \t\r\n]*")


class Token(NamedTuple):
    """One token: its kind, its text, where it starts, and whether white space stands before it."""

    kind: str
    text: str
    start: int
    spaced: bool


def unreadable(position: int, reason: str) -> NotEvaluated:
    """The refusal of a formula that cannot be read, with the place counted from 1."""
    return NotEvaluated(f"the formula cannot be read at character {position + 1}: {reason}")


def tokens(text: str, start: int = 0) -> Iterator[Token]:
    """The tokens of a formula from ``start`` on, closed by one of the kind ``end``."""
    while True:
        position = _skip_space(text, start)
        spaced = position > start
        if position == len(text):
            yield Token("end", "", position, spaced)
            return
        found = _TOKEN.match(text, position)
        if found is None or found.lastgroup is None:
            raise unreadable(position, _why(text[position]))
        start = _closing(text, found.end()) if found.lastgroup == "table" else found.end()
        yield Token(found.lastgroup, text[position:start], position, spaced)


def _skip_space(text: str, position: int) -> int:
    found = _SPACE.match(text, position)
    return found.end() if found else position


def _closing(text: str, position: int) -> int:
    """Where the bracket opened just before ``position`` has been closed; an apostrophe escapes."""
    opened = position
    depth = 1
    while depth:
        if position >= len(text):
            raise unreadable(opened - 1, "this bracket is never closed")
        letter = text[position]
        position += 2 if letter == "'" else 1
        depth += (letter == "[") - (letter == "]")
    return position


def _why(letter: str) -> str:
    reasons = {
        '"': "this text is never closed",
        "'": "this apostrophe does not enclose the name of a sheet",
        "@": "the operator @ (implicit intersection) is not evaluated",
        "#": "this is neither an error value nor a reference (a spilled range, A1#, is not evaluated)",
    }
    return reasons.get(letter, f"{letter!r} means nothing here")
