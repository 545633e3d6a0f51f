"""The names that Calc knows the extension by: fixed, since files in Calc's own format keep them."""

from __future__ import annotations

from collections.abc import Mapping
from types import MappingProxyType
from typing import Final

from xlbridge.catalogue import CATALOGUE

EXTENSION: Final = "org.storyledger.addin"
MODULES: Final = ("org", "storyledger", "addin")
SERVICE: Final = f"{EXTENSION}.Functions"
INTERFACE: Final = "XFunctions"
IMPLEMENTATION: Final = f"{EXTENSION}.PythonFunctions"


def method(name: str) -> str:
    """Return the name of the method of a worksheet function: ``elfCvx``.

    >>> method("ELF_CS_MIN_S1")
    'elfCsMinS1'
    """
    first, *rest = name.lower().split("_")
    return first + "".join(word.capitalize() for word in rest)


METHODS: Final[Mapping[str, str]] = MappingProxyType({name: method(name) for name in CATALOGUE})
#: how Calc before version 24 writes a function of an extension into an .xlsx
PROGRAMMATIC: Final[Mapping[str, str]] = MappingProxyType(
    {name: f"{SERVICE}.{word}".upper() for name, word in METHODS.items()}
)
