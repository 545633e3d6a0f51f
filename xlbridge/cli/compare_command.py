"""``storyledger compare``: what changed between two issues of a workbook, and what it did to the results."""

from __future__ import annotations

import json
from collections.abc import Iterator
from math import isclose
from pathlib import Path
from typing import Any, Final

import click

from xlbridge.audit.compare.changes import TOLERANCE, Change, Issues, Of, Result
from xlbridge.audit.compare.influence import Influences, influences
from xlbridge.audit.report.as_json import plain
from xlbridge.audit.subject import Subject
from xlbridge.cli.failure import CLEAN, FINDINGS
from xlbridge.cli.own_template import own_template
from xlbridge.values import CellError

SHOWN: Final = 20
TITLES: Final = {
    Of.INPUT: "changed inputs",
    Of.ROW: "rows added, removed or moved",
    Of.FORMULA: "changed formulas",
    Of.CONTENT: "changed texts and numbers outside the inputs",
    Of.NAME: "changed names",
    Of.SHEET: "sheets",
}


@click.command("compare")
@click.argument("old", type=click.Path(path_type=Path))
@click.argument("new", type=click.Path(path_type=Path))
@click.option("--json", "json_wanted", is_flag=True, help="Print the comparison as JSON.")
def command(old: Path, new: Path, json_wanted: bool) -> int:
    """Say what changed from the issue OLD of a workbook to the issue NEW, and what each change did.

    Levels are known by their names, wherever they stand. Each changed input is made alone in OLD and solved
    again, so that it shows which result it moved. Exit code 1 says that something differs.
    """
    issues = Issues.of(Subject.open(old, own_template), Subject.open(new, own_template))
    changes = [*issues.inputs(), *issues.cells()]
    results = list(issues.results())
    found = influences(issues, changes)
    if json_wanted:
        click.echo(json.dumps(_record(changes, results, found), indent=1, ensure_ascii=False))
    else:
        click.echo("\n".join(_lines(old, new, changes, results, found)))
    return FINDINGS if changes else CLEAN


def _lines(
    old: Path, new: Path, changes: list[Change], results: list[Result], found: Influences | None
) -> Iterator[str]:
    yield f"{old.name} against {new.name}"
    for of, title in TITLES.items():
        mine = [change for change in changes if change.of is of]
        if mine:
            yield f"{title}: {len(mine)}"
            yield from (f"  {_where(change)}{change.words}" for change in mine[:SHOWN])
        if len(mine) > SHOWN:
            yield f"  and {len(mine) - SHOWN} more, see --json"
    if not changes:
        yield "nothing changed"
    moved = [r for r in results if not isclose(r.old, r.new, rel_tol=TOLERANCE)]
    yield f"results: {len(results)} in both, {len(moved)} differ"
    if found is None:
        yield "what each change did is not known: one of the two is not laid out as ours or cannot be solved"
    elif changes:
        yield from _influence_lines(found)


def _where(change: Change) -> str:
    return f"{change.cell}: " if change.cell else ""


def _influence_lines(found: Influences) -> Iterator[str]:
    """For each headline result the changes that moved it, the largest first."""
    for key in (key for key in found.old if key in found.new):
        total = found.new[key] - found.old[key]
        parts = sorted(
            ((one.moved.get(key, 0.0), one.words) for one in found.single), key=lambda p: -abs(p[0])
        )
        parts = [(by, words) for by, words in parts if by]
        if total or parts:
            yield f"{key}: {found.old[key]:.6g}, now {found.new[key]:.6g} ({_change(total, found.old[key])})"
            yield from (f"  {_change(by, found.old[key])} by {words}" for by, words in parts[:SHOWN])
            if abs(found.interplay[key]) > TOLERANCE * max(1.0, abs(found.new[key])):
                yield f"  {_change(found.interplay[key], found.old[key])} by the changes together"
    for one in (one for one in found.single if one.reason):
        yield f"not known what this did: {one.words}, because {one.reason}"


def _change(by: float, of: float) -> str:
    return f"{by:+.4g}, {100 * by / of:+.2f} %" if of else f"{by:+.4g}"


def _record(changes: list[Change], results: list[Result], found: Influences | None) -> dict[str, Any]:
    return {
        "changes": [
            {
                "of": change.of.value,
                "path": change.path,
                "cell": str(change.cell) if change.cell else None,
                "old": _plain(change.old),
                "new": _plain(change.new),
                "words": change.words,
            }
            for change in changes
        ],
        "results": [{"path": r.path, "old": r.old, "new": r.new} for r in results],
        "influence": None
        if found is None
        else {
            "old": dict(found.old),
            "new": dict(found.new),
            "alone": [
                {"words": one.words, "moved": dict(one.moved), "because": one.reason or None}
                for one in found.single
            ],
            "together": found.interplay,
        },
    }


def _plain(value: Any) -> Any:
    return plain(value) if isinstance(value, CellError) else value
