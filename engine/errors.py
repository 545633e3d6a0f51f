"""Errors by cause. Each class names the cell error that a spreadsheet shows for it.

A message always says which argument, which value, what is allowed, and by which clause.
"""

from __future__ import annotations

from collections.abc import Sequence
from typing import ClassVar, Final

#: characters of a list of words that a message or a help line prints in full
LIST_LIMIT: Final = 200


class EngineError(ValueError):
    """Base of every refusal of the engine.

    Parameters: the argument's symbol, the value found, what is allowed in words, the clause if any.
    """

    cell_code: ClassVar[str] = "#VALUE!"

    def __init__(self, argument: str, value: object, allowed: str, clause: str = "") -> None:
        self.argument, self.value, self.allowed, self.clause = argument, value, allowed, clause
        super().__init__(f"{argument} = {_shown(value)}: {allowed}{f' ({clause})' if clause else ''}")


class ImpossibleValue(EngineError):
    """A number outside its physical or printed range."""

    cell_code = "#NUM!"


class WrongType(EngineError):
    """Text where a number is due, a number where text is due, shapes that do not fit."""


class MissingValue(EngineError):
    """A blank where a value is due."""


class NotApplicable(EngineError):
    """The clause does not apply, or the table has no such row."""

    cell_code = "#N/A"


def listed(words: Sequence[str]) -> str:
    """Return the allowed words in one text; of a long list how many there are, and its ends.

    >>> listed(("us", "si"))
    'us, si'
    """
    text = ", ".join(words)
    return text if len(text) <= LIST_LIMIT else f"{len(words)} texts from {words[0]!r} to {words[-1]!r}"


def _shown(value: object) -> str:
    if value is None:
        return "blank"
    return f"{value:.6g}" if isinstance(value, float) else repr(value)
