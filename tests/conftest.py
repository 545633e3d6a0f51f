"""Fixtures of all tests."""

from __future__ import annotations

import os
import sys
from collections.abc import Iterator
from pathlib import Path

import pytest

from tests.support import conformance
from tests.support import office as offices
from xlbridge.calc import extension

#: one imports what only LibreOffice's Python has; the others register operators, once
collect_ignore = ["support/office_jobs.py", "support/faults"]


def demand(reason: str, variable: str) -> None:
    """Skip a test for a reason, if there is one, or fail it where the variable demands it."""
    if reason and os.environ.get(variable) == "1":
        pytest.fail(f"{reason}, and {variable}=1 demands it")
    if reason:
        pytest.skip(reason)


def require_office() -> None:
    """Skip a test that needs LibreOffice where there is none, or fail it where one is demanded."""
    demand(offices.missing(), offices.REQUIRED)


@pytest.fixture(scope="session")
def office() -> Iterator[offices.Office]:
    """One headless LibreOffice for the session."""
    require_office()
    with offices.Office() as running:
        yield running


@pytest.fixture(scope="session")
def addins(tmp_path_factory: pytest.TempPathFactory) -> Path:
    """A folder with our extension for Calc, as an office keeps it once it is installed."""
    folder = tmp_path_factory.mktemp("addins")
    extension.unpack(folder / "storyledger")
    return folder


@pytest.fixture(scope="session")
def office_with_addin(addins: Path, tmp_path_factory: pytest.TempPathFactory) -> Iterator[offices.Office]:
    """One headless LibreOffice with our functions; its log of failures is a file of the session."""
    require_office()
    log = tmp_path_factory.mktemp("log") / "calc.log"
    with offices.Office(addins, STORYLEDGER_CALC_LOG=str(log)) as running:
        yield running


def pytest_terminal_summary(terminalreporter: pytest.TerminalReporter) -> None:
    """Print the conformance matrix, where its tests ran."""
    ran = sys.modules.get("tests.xlbridge.test_conformance")
    if ran and ran.RESULTS:
        terminalreporter.section("conformance matrix")
        for line in conformance.table(ran.RESULTS):
            terminalreporter.line(line)
