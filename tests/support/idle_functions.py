"""A worksheet function that does nothing, to measure what a call costs without it."""

from __future__ import annotations

from typing import Any

import xlwings as xw


@xw.func
@xw.arg("w_x", "raw")
@xw.arg("h_x", "raw")
@xw.arg("weights", "raw")
@xw.arg("heights", "raw")
@xw.arg("k", "raw")
@xw.ret("raw")
def IDLE(w_x: Any, h_x: Any, weights: Any, heights: Any, k: Any) -> Any:
    """Return one number."""
    return [[0.0]]
