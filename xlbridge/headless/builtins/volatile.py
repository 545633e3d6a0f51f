"""Functions that are refused on purpose, each with its reason."""

from __future__ import annotations

from collections.abc import Mapping
from types import MappingProxyType
from typing import Final, NoReturn

from xlbridge.headless.builtins.builtin import Builtin
from xlbridge.headless.operands import NotEvaluated

_CLOCK: Final = "its result depends on the moment of calculation"
_CHANCE: Final = "its result is drawn at random"
_ADDRESS: Final = "it builds an address while calculating, so no checker can follow it"

#: name -> why the function is not evaluated.
VOLATILE: Final[Mapping[str, str]] = MappingProxyType(
    {
        "NOW": _CLOCK,
        "TODAY": _CLOCK,
        "RAND": _CHANCE,
        "RANDBETWEEN": _CHANCE,
        "RANDARRAY": _CHANCE,
        "OFFSET": _ADDRESS,
        "INDIRECT": _ADDRESS,
    }
)


def _refusal(name: str, reason: str) -> Builtin:
    def refuse(*_: object) -> NoReturn:
        raise NotEvaluated(f"{name} is not evaluated: {reason}")

    return Builtin(name, "l*", refuse, 0)


FUNCTIONS: Final = tuple(_refusal(name, reason) for name, reason in VOLATILE.items())
