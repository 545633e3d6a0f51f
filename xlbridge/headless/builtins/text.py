"""Functions of text."""

from __future__ import annotations

import re
from typing import Final

from xlbridge.headless.builtins.builtin import Builtin
from xlbridge.headless.builtins.collect import cells
from xlbridge.headless.builtins.criteria import wildcard
from xlbridge.headless.builtins.formats import formatted
from xlbridge.headless.coercion import LONGEST, Fault, fitting, number, text
from xlbridge.headless.operands import Operand
from xlbridge.values import Scalar


def _size(count: float) -> int:
    if count < 0.0:
        raise Fault("#VALUE!", "a number of characters cannot be negative")
    return int(count)


def _place(start: float) -> int:
    if start < 1.0:
        raise Fault("#VALUE!", "characters are counted from 1")
    return int(start) - 1


def _right(words: str, count: float = 1.0) -> str:
    return words[max(0, len(words) - _size(count)) :]


def _mid(words: str, start: float, count: float) -> str:
    first = _place(start)
    return words[first : first + _size(count)]


def _replace(words: str, start: float, count: float, new: str) -> str:
    first = _place(start)
    return fitting(words[:first] + new + words[first + _size(count) :])


def _substitute(words: str, old: str, new: str, instance: float | None = None) -> str:
    if instance is None or not old:
        return fitting(words.replace(old, new) if old else words)
    pieces, which = words.split(old), _place(instance) + 1
    if which >= len(pieces):
        return words
    return fitting(old.join(pieces[:which]) + new + old.join(pieces[which:]))


def _find(wanted: str, words: str, start: float = 1.0) -> float:
    return _found(words.find(wanted, _place(start)), wanted, words, start)


def _search(wanted: str, words: str, start: float = 1.0) -> float:
    match = wildcard(wanted).search(words, _place(start))
    return _found(match.start() if match else -1, wanted, words, start)


def _found(place: int, wanted: str, words: str, start: float) -> float:
    if place < 0 or start > len(words) + 1:
        raise Fault("#VALUE!", f"{wanted!r} does not occur")
    return place + 1.0


def _upper(words: str) -> str:
    """Upper case, letter by letter; a letter that would become two stays."""
    return "".join(sign.upper() if len(sign.upper()) == 1 else sign for sign in words)


def _proper(words: str) -> str:
    return re.sub(r"[^\W\d_]+", lambda word: word[0].capitalize(), words)


def _joined(operands: tuple[Operand, ...]) -> list[str]:
    return [text(cell) for operand in operands for cell in cells(operand)]


def _textjoin(separator: str, skip_empty: bool, *operands: Operand) -> str:
    return fitting(separator.join(words for words in _joined(operands) if words or not skip_empty))


def _value(value: Scalar) -> float:
    if isinstance(value, bool) or value == "":
        raise Fault("#VALUE!", "VALUE needs a text that spells a number")
    return number(value)


def _t(value: Scalar) -> str:
    return value if isinstance(value, str) else ""


def _n(value: Scalar) -> float:
    return 0.0 if isinstance(value, str) else number(value)


def _char(code: float) -> str:
    if not 1.0 <= code < 256.0:
        raise Fault("#VALUE!", f"CHAR: there is no character {code:g}")
    return bytes([int(code)]).decode("cp1252", errors="replace")


def _code(words: str) -> float:
    if not words:
        raise Fault("#VALUE!", "CODE of an empty text")
    return float(words[0].encode("cp1252", errors="replace")[0])


FUNCTIONS: Final = (
    Builtin("LEN", "t", lambda words: float(len(words))),
    Builtin("LEFT", "tn", lambda words, count=1.0: words[: _size(count)], 1),
    Builtin("RIGHT", "tn", _right, 1),
    Builtin("MID", "tnn", _mid),
    Builtin("TRIM", "t", lambda words: re.sub(" +", " ", words).strip(" ")),
    Builtin("UPPER", "t", _upper),
    Builtin("LOWER", "t", str.lower),
    Builtin("PROPER", "t", _proper),
    Builtin("CONCATENATE", "t*", lambda *words: fitting("".join(words))),
    Builtin("CONCAT", "g*", lambda *operands: fitting("".join(_joined(operands)))),
    Builtin("TEXTJOIN", "tbg*", _textjoin),
    Builtin("FIND", "ttn", _find, 2),
    Builtin("SEARCH", "ttn", _search, 2),
    Builtin("SUBSTITUTE", "tttn", _substitute, 3),
    Builtin("REPLACE", "tnnt", _replace),
    Builtin("REPT", "tn", lambda words, count: fitting(words * min(_size(count), LONGEST + 1))),
    Builtin("EXACT", "tt", lambda left, right: left == right),
    Builtin("VALUE", "s", _value),
    Builtin("T", "s", _t),
    Builtin("N", "s", _n),
    Builtin("TEXT", "st", formatted),
    Builtin("CHAR", "n", _char),
    Builtin("CODE", "t", _code),
)
