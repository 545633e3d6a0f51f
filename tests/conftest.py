"""Fixtures of all tests."""

from __future__ import annotations

import os
from collections.abc import Iterator

import pytest

from tests.support import office as offices

#: imports what only LibreOffice's Python has.
collect_ignore = ["support/office_driver.py"]


@pytest.fixture(scope="session")
def office() -> Iterator[offices.Office]:
    """One headless LibreOffice for the session."""
    if reason := offices.missing():
        if os.environ.get(offices.REQUIRED) == "1":
            pytest.fail(f"{reason}, and {offices.REQUIRED}=1 demands it")
        pytest.skip(reason)
    with offices.Office() as running:
        yield running
