"""The built-in functions of the formula language, by kind.

``BUILTINS`` holds every function by its upper-case name, the refused ones of ``VOLATILE`` included.
"""

from __future__ import annotations

from collections.abc import Mapping
from types import MappingProxyType
from typing import Final

from xlbridge.headless.builtins import (
    aggregate,
    conditional,
    dates,
    information,
    logic,
    lookup,
    mathematics,
    matrix,
    rounding,
    statistics,
    subtotal,
    text,
    volatile,
)
from xlbridge.headless.builtins.builtin import Builtin, invoke
from xlbridge.headless.builtins.volatile import VOLATILE

_KINDS: Final = (
    logic,
    aggregate,
    subtotal,
    conditional,
    statistics,
    mathematics,
    rounding,
    matrix,
    lookup,
    text,
    information,
    dates,
    volatile,
)

BUILTINS: Final[Mapping[str, Builtin]] = MappingProxyType(
    {builtin.name: builtin for kind in _KINDS for builtin in kind.FUNCTIONS}
)

__all__ = ["BUILTINS", "VOLATILE", "Builtin", "invoke"]
