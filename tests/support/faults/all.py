"""Every operator of the catalogue: its modules fill it as they are imported."""

from __future__ import annotations

from typing import Final

from tests.support.faults import (
    appearance,
    arithmetic,
    checks,
    criteria_inputs,
    formulas,
    inputs,
    names_and_words,
    pages_and_settings,
    stale,
)
from tests.support.faults.catalogue import CATALOGUE, Fault

MODULES: Final = (
    formulas,
    arithmetic,
    checks,
    inputs,
    criteria_inputs,
    names_and_words,
    appearance,
    pages_and_settings,
    stale,
)
FAULTS: Final[tuple[Fault, ...]] = tuple(CATALOGUE.values())
