"""Names that Excel or its macro language would misread: checked before anything is generated."""

from __future__ import annotations

import re
from collections.abc import Iterable
from typing import Final

from openpyxl.utils.cell import column_index_from_string

MAX_PARAMETERS: Final = 60
MAX_TEXT: Final = 255
MAX_ROW, MAX_COLUMN = 1_048_576, 16_384
#: An argument of this name is filled by xlwings and hidden from the worksheet.
_XLWINGS: Final = frozenset({"caller"})
_IDENTIFIER: Final = re.compile(r"[A-Za-z][A-Za-z0-9_]{0,254}")
_A1: Final = re.compile(r"([A-Za-z]{1,3})([0-9]{1,7})")
_R1C1: Final = re.compile(r"R[0-9]*(C[0-9]*)?|C[0-9]*", re.IGNORECASE)
_WORDS: Final = """
    addressof alias and any as attribute base boolean byref byte byval call case cbool cbyte ccur cdate
    cdbl cdec cint clng clnglng clngptr close compare const csng cstr currency cvar cverr date debug decimal
    declare defbool defbyte defcur defdate defdbl defint deflng defobj defsng defstr defvar dim do double each
    else elseif empty end endif enum eqv erase error event exit explicit false for friend function get global
    gosub goto if imp implements in input integer is lbound len let like line lock long longlong longptr loop
    lset me mid mod module name new next not nothing null object on open option optional or output paramarray
    preserve print private property ptrsafe public put raiseevent randomize redim rem reset resume return rset
    seek select set sgn shared single spc static step stop string strcomp sub tab text then time to true type
    typeof ubound unlock until variant vbnullstring wend while width with withevents write xor
"""
_KEYWORDS: Final = frozenset(_WORDS.split())


def faults(name: str, arguments: Iterable[str] = (), texts: Iterable[str] = ()) -> list[str]:
    """Return what is wrong with a function's name, its arguments' names and its help texts."""
    arguments = tuple(arguments)
    found = [f"{name}: {fault}" for fault in (*_misread(name), *_as_address(name))]
    seen = {name.lower()}
    for argument in arguments:
        found += [f"{name}({argument}): {fault}" for fault in _misread(argument)]
        if argument.lower() in seen:
            found.append(f"{name}({argument}): the macro language ignores case, so the name is used twice")
        seen.add(argument.lower())
    if len(arguments) > MAX_PARAMETERS:
        found.append(f"{name}: {len(arguments)} parameters, at most {MAX_PARAMETERS}")
    found += [
        f"{name}: a text of {len(text)} characters, cut at {MAX_TEXT}"
        for text in texts
        if len(text) > MAX_TEXT
    ]
    return found


def repeated(names: Iterable[str]) -> list[str]:
    """Return a fault for every name that stands twice, whatever its case."""
    seen: set[str] = set()
    found = []
    for name in names:
        if name.lower() in seen:
            found.append(f"{name}: two functions of this name, which is ambiguous to the macro language")
        seen.add(name.lower())
    return found


def _misread(name: str) -> list[str]:
    if not _IDENTIFIER.fullmatch(name):
        return ["not a name: ASCII letters, digits and underscores, a letter first"]
    if name.lower() in _KEYWORDS:
        return ["a word of the macro language"]
    return ["filled by xlwings, hidden from the worksheet"] if name.lower() in _XLWINGS else []


def _as_address(name: str) -> list[str]:
    if _R1C1.fullmatch(name):
        return ["reads as a row and column reference"]
    match = _A1.fullmatch(name)
    if match and column_index_from_string(match[1]) <= MAX_COLUMN and 1 <= int(match[2]) <= MAX_ROW:
        return ["reads as a cell address"]
    return []
