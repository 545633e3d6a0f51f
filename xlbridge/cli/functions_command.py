"""``storyledger functions``: the catalogue, and the built-in functions that are evaluated headless."""

from __future__ import annotations

import json
from typing import Any

import click

from xlbridge import work
from xlbridge.catalogue import CATALOGUE, SheetFunction
from xlbridge.catalogue.checked import outside_checks
from xlbridge.catalogue.validate import describe
from xlbridge.cli.failure import CLEAN, FINDINGS, Refusal


@click.command("functions")
@click.argument("name", required=False)
@click.option("--json", "as_json", is_flag=True, help="Print as JSON.")
@click.option("--builtins", is_flag=True, help="List the built-in functions that are evaluated headless.")
@click.option("--coverage", is_flag=True, help="List capabilities, their functions, places and checks.")
def command(name: str | None, as_json: bool, builtins: bool, coverage: bool) -> int:
    """List the worksheet functions, or describe one of them."""
    if name is not None and (builtins or coverage):
        raise Refusal(f"{name}: the lists of --builtins and --coverage take no name")
    if coverage:
        return _print_coverage()
    if builtins:
        from xlbridge.headless.builtins import BUILTINS

        click.echo(json.dumps(sorted(BUILTINS)) if as_json else "\n".join(sorted(BUILTINS)))
        return CLEAN
    entries = list(CATALOGUE.values()) if name is None else [_named(name)]
    if as_json:
        click.echo(json.dumps([record(entry) for entry in entries], indent=1, ensure_ascii=False))
    elif name is None:
        width = max(len(entry.name) for entry in entries)
        click.echo("\n".join(f"{entry.name:<{width}}  {entry.summary}" for entry in entries))
    else:
        click.echo(_page(entries[0]))
    return CLEAN


def _print_coverage() -> int:
    """Print the coverage list and what it lacks; gaps are findings."""
    from xlbridge.cli.coverage import coverage

    lines, gaps = coverage()
    click.echo("\n".join([*lines, "", *(f"! {gap}" for gap in gaps)]).rstrip())
    return FINDINGS if gaps else CLEAN


def _named(name: str) -> SheetFunction:
    entry = CATALOGUE.get(name.upper())
    if entry is None:
        from difflib import get_close_matches

        close = get_close_matches(name.upper(), CATALOGUE, 1)
        hint = f"did you mean {close[0]}?" if close else "see 'storyledger functions'"
        raise Refusal(f"{name}: no such worksheet function, {hint}")
    return entry


def record(entry: SheetFunction) -> dict[str, Any]:
    """Return everything declared of a function, in plain data."""
    return {
        "name": entry.name,
        "usage": entry.usage,
        "summary": entry.summary,
        "category": entry.category,
        "equation": work.equation(entry),
        "native": entry.native,
        "arguments": [
            {
                "name": a.name,
                "symbol": a.symbol,
                "unit": a.unit,
                "text": a.text,
                "kind": a.kind.value,
                "choices": list(a.choices),
                "optional": a.optional,
                "allowed": str(a.span),
            }
            for a in entry.arguments
        ],
        "result": {"symbol": entry.result.symbol, "unit": entry.result.unit, "text": entry.result.text},
        "clauses": {
            edition: {"clause": str(c), "confidence": c.confidence, "note": c.note}
            for edition, c in entry.clauses.items()
        },
        "checks": [
            {"source": check.source, "kind": check.kind, "values": check.values}
            for check in outside_checks().get(entry.name, ())
        ],
        "example": {"arguments": dict(entry.example.arguments), "result": entry.example.result},
        "since": entry.since,
    }


def _page(entry: SheetFunction) -> str:
    lines = [entry.usage, entry.summary, "", work.equation(entry), ""]
    lines += [f"  {a.name}: {describe(a)}" for a in entry.arguments]
    lines += ["", f"returns {entry.result.text} [{entry.result.unit}]"]
    for found in entry.clauses.values():
        lines.append(f"{found.standard} {found}{f' ({found.note})' if found.note else ''}")
    lines += [f"checked against {check}" for check in outside_checks().get(entry.name, ())]
    given = ", ".join(f"{key} = {value}" for key, value in entry.example.arguments.items())
    return "\n".join([*lines, "", f"example: {given}: {entry.example.result}"])
