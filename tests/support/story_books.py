"""Story workbooks for tests: made of a building's tables, computed, both routes compared."""

from __future__ import annotations

from pathlib import Path
from typing import Any

from engine.building import from_mapping, solve
from workbook_templates.build import build
from workbook_templates.read import Reader
from xlbridge.audit.routes import Agreement, compare
from xlbridge.headless.compute import Computed, compute


def story_book(folder: Path, given: dict[str, Any], level_count: int = 6, name: str = "story.xlsx") -> Path:
    """Write a story workbook without stored values."""
    path = folder / name
    path.write_bytes(build(given, level_count))
    return path


def routes(computed: Computed) -> Agreement:
    """Compare a computed workbook with the model route from the inputs read out of it."""
    reader = Reader(computed.evaluator.evaluate_text)
    return compare(reader.results(), solve(from_mapping(reader.inputs())).to_json())


def assert_routes_agree(path: Path, least: int) -> Computed:
    """Compute a workbook and require both routes to agree on at least so many results."""
    computed = compute(path)
    assert not computed.errors
    assert not computed.not_evaluated
    agreement = routes(computed)
    assert agreement.differences == ()
    assert agreement.compared >= least
    return computed
