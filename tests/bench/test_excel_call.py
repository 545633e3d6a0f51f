"""Python's part of one ELF_CVX call from Excel, 60 levels, beside a function that does nothing.

Figures: STORYLEDGER_WINDOWS_BRANCH=1 python -m pytest tests/bench/test_excel_call.py --benchmark-enable
(a process of its own, since xlwings decides at import whether it runs on Windows). Without that variable
the same tests run once each, untimed.
"""

from __future__ import annotations

import os
import subprocess
import sys
from pathlib import Path

import pytest

BRANCH = "STORYLEDGER_WINDOWS_BRANCH"
LEVELS = 60
WEIGHTS = tuple((1000.0 - level,) for level in range(LEVELS))
HEIGHTS = tuple((13.0 * (LEVELS - level),) for level in range(LEVELS))
CALLS = {"bare": ("tests.support.idle_functions", "IDLE"), "ELF_CVX": ("xlbridge.excel.functions", "ELF_CVX")}

if os.environ.get(BRANCH):
    from tests.support import windows_stubs

    windows_stubs.install()

    @pytest.mark.parametrize("handed", ["values", "ranges"])
    @pytest.mark.parametrize("which", CALLS)
    def test_call(benchmark: object, which: str, handed: str) -> None:
        """``values`` is what our macro module hands over, ``ranges`` what xlwings' own import does."""
        benchmark.group = handed
        arguments = (1000.0, 780.0, WEIGHTS, HEIGHTS, 2.0)
        if handed == "ranges":
            arguments = tuple(map(windows_stubs.ComRange, arguments))
        found = benchmark(windows_stubs.excel_call, *CALLS[which], *arguments)
        total = sum(w * h**2 for (w,), (h,) in zip(WEIGHTS, HEIGHTS, strict=True))
        assert found == (0.0 if which == "bare" else pytest.approx(1000.0 * 780.0**2 / total, rel=1e-12))

else:

    def test_the_benchmark_runs() -> None:
        result = subprocess.run(
            [sys.executable, "-m", "pytest", __file__, "--benchmark-disable", "-p", "no:cacheprovider"],
            cwd=Path(__file__).parents[2],
            env={**os.environ, BRANCH: "1"},
            capture_output=True,
            text=True,
            check=False,
        )
        assert result.returncode == 0, result.stdout + result.stderr
        assert f"{2 * len(CALLS)} passed" in result.stdout
