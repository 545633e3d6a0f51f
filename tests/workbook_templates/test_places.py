"""Where entries and results stand: each path leads to the cell that holds its value."""

from __future__ import annotations

from collections.abc import Iterator
from pathlib import Path
from typing import Any

import pytest

from engine.editions import EDITIONS
from tests.support.story_books import story_book
from workbook_templates import places
from workbook_templates.parts import together
from workbook_templates.read import Reader
from xlbridge.headless.compute import open_workbook


def leaves(value: Any, path: str = "") -> Iterator[tuple[str, Any]]:
    """Every value of nested tables by its path; lists count from 1."""
    if isinstance(value, dict):
        for key, inner in value.items():
            yield from leaves(inner, f"{path}.{key}" if path else key)
    elif isinstance(value, list):
        for place, inner in enumerate(value, 1):
            yield from leaves(inner, f"{path}[{place}]")
    else:
        yield path, value


@pytest.mark.parametrize("edition", EDITIONS)
def test_each_result_and_each_entry_stands_where_its_path_leads(tmp_path: Path, edition: str) -> None:
    given = {"edition": edition, "units": "si", "parts": list(together(edition))}
    evaluator = open_workbook(story_book(tmp_path, given, 4))
    reader = Reader(evaluator.evaluate_text)
    results, cells = dict(leaves(reader.results())), places.results(reader, evaluator.book)
    assert set(results) == set(cells)
    assert {path: evaluator.value(*place.cell) for path, place in cells.items()} == results
    assert len(results) > 1000
    inputs, cells = dict(leaves(reader.inputs())), places.entries(reader, evaluator.book)
    fixed = {"title", "edition", "units"}
    home = ("job.", "sources.", "parts[")
    entries = {p: v for p, v in inputs.items() if p not in fixed and not p.startswith(home)}
    assert set(entries) <= set(cells)
    words = {True: "yes", False: "no"}
    assert {p: evaluator.value(*cells[p].cell) for p in entries} == {
        p: words[v] if isinstance(v, bool) else v for p, v in entries.items()
    }
    blank = {evaluator.value(*cells[path].cell) for path in set(cells) - set(entries)}
    assert blank <= {None, ""}
