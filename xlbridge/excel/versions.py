"""What answers behind the cells, asked by the check of the bridge: a worksheet function of its own."""

from __future__ import annotations

import platform
from importlib.metadata import version
from typing import Any, Final

import xlwings as xw

from engine.version import __version__

#: the macros and the package must be of one version: the macros name xlwings' library by it
XLWINGS: Final = version("xlwings")
VERSIONS: Final = {
    "storyledger": __version__,
    "xlwings": XLWINGS,
    "python": platform.python_version(),
}


@xw.func(category="Storyledger: bridge")
@xw.arg("part", "raw", doc="storyledger, xlwings or python.")
@xw.ret("raw")
def STORYLEDGER_VERSION(part: Any) -> Any:
    """Version of what answers: Storyledger, xlwings or Python."""
    return [[VERSIONS.get(str(part).lower(), f"#N/A {part}: storyledger, xlwings or python")]]
