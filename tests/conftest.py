"""Fixtures of all tests."""

from __future__ import annotations

import os
from collections.abc import Iterator

import pytest

from tests.support import office as offices

#: imports what only LibreOffice's Python has.
collect_ignore = ["support/office_driver.py"]


def require_office() -> None:
    """Skip a test that needs LibreOffice where there is none, or fail it where one is demanded."""
    reason = offices.missing()
    if reason and os.environ.get(offices.REQUIRED) == "1":
        pytest.fail(f"{reason}, and {offices.REQUIRED}=1 demands it")
    if reason:
        pytest.skip(reason)


@pytest.fixture(scope="session")
def office() -> Iterator[offices.Office]:
    """One headless LibreOffice for the session."""
    require_office()
    with offices.Office() as running:
        yield running
