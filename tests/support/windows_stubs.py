"""xlwings' own Windows code path without Windows: stand-ins for pywin32, and nothing else.

``install()``, in a process that has not imported xlwings yet, makes ``xlwings.func`` the real decorator and
``XLPython().CallUDF`` the real call that the macro module makes. Everything from there to the function and
back is xlwings' code as shipped; only the COM layer below it is replaced.
"""

from __future__ import annotations

import ctypes
import datetime as dt
import importlib
import sys
import types
from typing import Any

EXCEL_RANGE = "{00020846-0000-0000-C000-000000000046}"
#: What pywin32 makes of an argument that was left out (DISP_E_PARAMNOTFOUND).
MISSING = -2147352572
#: Error values as COM hands them over: 0x800A0000 plus the number of CVErr (Microsoft, "CVErr function").
ERRORS = {
    code: 0x800A0000 - 2**32 + number
    for code, number in {
        "#NULL!": 2000,
        "#DIV/0!": 2007,
        "#VALUE!": 2015,
        "#REF!": 2023,
        "#NAME?": 2029,
        "#NUM!": 2036,
        "#N/A": 2042,
        "#SPILL!": 2045,
        "#FIELD!": 2049,
        "#CALC!": 2050,
    }.items()
}
#: These look at the platform's name when they are imported: first under its true name.
_BEFORE = ("asyncio", "concurrent.futures", "subprocess", "numpy")


class ComError(Exception):
    """pywintypes.com_error."""

    def __init__(self, hresult: int = 0, *details: object) -> None:
        super().__init__(hresult, *details)
        self.hresult = hresult


class ComTime(dt.datetime):
    """pywintypes.TimeType, which derives from datetime as here."""


class NotAnObject:
    """A class of which nothing is an instance."""


class Anything:
    """A library of the system: every attribute is callable."""

    def __getattr__(self, name: str) -> Anything:
        return Anything()

    def __call__(self, *args: object, **options: object) -> int:
        return 0


class ComRange:
    """Excel's Range as far as an argument of a worksheet function needs it."""

    CLSID = EXCEL_RANGE

    def __init__(self, value: Any) -> None:
        rows = value if isinstance(value, tuple) else ((value,),)
        self.Value = value
        self.Row = self.Column = 1
        self.Count = len(rows) * len(rows[0])
        self.Rows = types.SimpleNamespace(Count=len(rows))
        self.Columns = types.SimpleNamespace(Count=len(rows[0]))
        book = types.SimpleNamespace(Name="Book1.xlsm", Application=types.SimpleNamespace(Hwnd=1))
        self.Worksheet = types.SimpleNamespace(Name="Sheet1", Parent=book)
        attributes = types.SimpleNamespace(iid=EXCEL_RANGE)
        information = types.SimpleNamespace(GetTypeAttr=lambda: attributes)
        self._oleobj_ = types.SimpleNamespace(GetTypeInfo=lambda: information)


def column(*cells: Any) -> ComRange:
    """A range of one column; one cell alone comes as a single value."""
    return ComRange(tuple((cell,) for cell in cells) if len(cells) > 1 else cells[0])


def row(*cells: Any) -> ComRange:
    """A range of one row."""
    return ComRange((tuple(cells),) if len(cells) > 1 else cells[0])


def excel_call(module: str, function: str, *arguments: Any) -> Any:
    """What ``XLPy.CallUDF(...)`` of the macro module does, and what it hands back."""
    from xlwings.com_server import XLPython

    return XLPython().CallUDF(module, function, arguments, None, ComRange(None))


def install() -> None:
    """Put the stand-ins in place and import xlwings as on Windows."""
    if "xlwings" in sys.modules:
        raise RuntimeError("xlwings was imported already: the stand-ins need a process of their own")
    for name in _BEFORE:
        importlib.import_module(name)
    for name, members in _modules().items():
        _add(name, members)
    library, platform = ctypes.PyDLL, sys.platform
    ctypes.oledll = ctypes.windll = Anything()
    ctypes.PyDLL = lambda *_, **__: Anything()
    sys.platform = "win32"  # only while xlwings chooses its branch
    try:
        importlib.import_module("xlwings")
    finally:
        sys.platform, ctypes.PyDLL = platform, library
        del ctypes.oledll, ctypes.windll


def _add(name: str, members: dict[str, Any]) -> None:
    module = types.ModuleType(name)
    module.__dict__.update(members)
    sys.modules[name] = module
    parent, _, child = name.rpartition(".")
    if parent:
        setattr(sys.modules[parent], child, module)


def _modules() -> dict[str, dict[str, Any]]:
    same = lambda value, *_, **__: value  # noqa: E731
    return {
        "pywintypes": {"com_error": ComError, "error": OSError, "TimeType": ComTime, "IID": same},
        "win32api": {},
        "win32con": {},
        "win32gui": {},
        "win32event": {},
        "win32process": {"GetWindowThreadProcessId": lambda window: (0, window)},
        "win32timezone": {"TimeZoneInfo": types.SimpleNamespace(utc=lambda: dt.UTC)},
        "pythoncom": {
            "CoInitialize": lambda: None,
            "com_error": ComError,
            "ole_error": ComError,
            "__file__": "pythoncom.dll",
            "IID_IDispatch": "IID_IDispatch",
            "IID_IEnumVARIANT": "IID_IEnumVARIANT",
            "TypeIIDs": {"IID_IDispatch": NotAnObject},
            "CoMarshalInterThreadInterfaceInStream": lambda _, value: value,
        },
        "win32com": {},
        "win32com.client": {
            "Dispatch": same,
            "DispatchEx": same,
            "CDispatch": NotAnObject,
            "CoClassBaseClass": NotAnObject,
            "DispatchBaseClass": NotAnObject,
        },
        "win32com.server": {},
        "win32com.server.dispatcher": {},
        "win32com.server.policy": {},
        "win32com.server.util": {"wrap": same, "unwrap": _no_python_object},
    }


def _no_python_object(value: object) -> object:
    raise ValueError(f"{value!r} wraps no Python object")
