"""Fields of records that carry their own check, and the checks that more than one field has."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import MISSING, Field, field, fields
from functools import partial
from typing import Any, Final

from engine.errors import MissingValue, WrongType
from engine.require import above, at_least, choice, finite, whole, within

Check = Callable[[str, Any], object]

ANY: Final = finite
POSITIVE: Final = partial(above, 0)
NOT_NEGATIVE: Final = partial(at_least, 0)
SHARE: Final = partial(within, 0, 1)
AT_LEAST_1: Final = partial(at_least, 1)


def checked(check: Check, default: Any = MISSING) -> Any:
    """Declare a field with its check; a field with a default may be left out."""
    return field(default=default, metadata={"check": check})


def is_text(name: str, value: object) -> object:
    """Refuse anything but a text that says something."""
    if not isinstance(value, str):
        raise WrongType(name, value, "must be text")
    if not value.strip():
        raise MissingValue(name, None, "must be a text that is not blank")
    return value


def is_list_of_texts(name: str, value: object) -> object:
    """Refuse anything but a list of texts."""
    if not isinstance(value, list | tuple):
        raise WrongType(name, value, "must be a list of texts")
    return [is_text(name, word) for word in value]


def is_flag(name: str, value: object) -> object:
    """Refuse anything but true or false."""
    if not isinstance(value, bool):
        raise WrongType(name, value, "must be true or false")
    return value


def is_count(name: str, value: Any) -> object:
    """Refuse anything but a whole number from 1 on."""
    return whole(name, value)


def is_word(words: tuple[str, ...], name: str, value: object) -> object:
    """Refuse anything but one of the words."""
    return choice(name, value, words)


def one_number(check: Check, name: str, value: object) -> object:
    """Refuse anything but a single number that the check accepts."""
    if isinstance(value, list | tuple):
        raise WrongType(name, value, "must be a single number")
    return check(name, value)


def number(check: Check, default: Any = MISSING) -> Any:
    """Declare a field that holds one number."""
    return checked(partial(one_number, check), default)


def word(words: tuple[str, ...], default: Any = MISSING) -> Any:
    """Declare a field that holds one of the words."""
    return checked(partial(is_word, words), default)


def check_fields(prefix: str, record: Any) -> None:
    """Apply the check of each field that has one; a blank is allowed where blank is the default."""
    for entry in fields(record):
        value = getattr(record, entry.name)
        if "check" in entry.metadata and not (value is None and may_be_left_out(entry)):
            entry.metadata["check"](f"{prefix}{entry.name}", value)


def may_be_left_out(entry: Field[Any]) -> bool:
    """Tell whether a field has a default."""
    return entry.default is not MISSING or entry.default_factory is not MISSING
