"""Every operator of the catalogue."""

from __future__ import annotations

from typing import Final

from tests.support.faults import appearance, arithmetic, checks, formulas, inputs, names_and_words, stale
from tests.support.faults.catalogue import CATALOGUE, Fault

MODULES: Final = (formulas, arithmetic, checks, inputs, names_and_words, appearance, stale)
FAULTS: Final[tuple[Fault, ...]] = tuple(CATALOGUE.values())
