"""Figures of the benchmarks: measured in full size on request, run once in small size otherwise.

``STORYLEDGER_BENCH=1 python -m pytest tests/bench`` prints the figures at the end. A figure is a ratio to a
peer in the same run wherever there is one; none is asserted, since a busy machine is no fault of the code.
"""

from __future__ import annotations

import os
from collections.abc import Callable
from time import perf_counter
from typing import Any

import pytest

FULL = os.environ.get("STORYLEDGER_BENCH") == "1"
FIGURES: list[str] = []


@pytest.fixture
def full() -> bool:
    """Whether figures are wanted: full size, several rounds."""
    return FULL


@pytest.fixture
def figure() -> Callable[[str, float, str], None]:
    """Note a figure with its target; small sizes are not noted."""

    def note(name: str, value: float, target: str) -> None:
        assert value > 0
        if FULL:
            FIGURES.append(f"{name}: {value:.3g} ({target})")

    return note


@pytest.fixture
def best() -> Callable[..., list[float]]:
    """The shortest time of each call, the calls taking turns so that a busy moment meets them all."""

    def measured(*calls: Callable[[], Any], rounds: int = 7) -> list[float]:
        times: list[list[float]] = [[] for _ in calls]
        for _ in range(rounds if FULL else 1):
            for taken, call in zip(times, calls, strict=True):
                start = perf_counter()
                call()
                taken.append(perf_counter() - start)
        return [min(taken) for taken in times]

    return measured


def pytest_terminal_summary(terminalreporter: pytest.TerminalReporter) -> None:
    """Print the figures below the results."""
    if FIGURES:
        terminalreporter.section("figures")
        for line in FIGURES:
            terminalreporter.line(line)
