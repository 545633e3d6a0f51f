"""``storyledger entries``: what a BUILDING.toml can hold, as the parts of the workbook declare it."""

from __future__ import annotations

import json
from collections.abc import Iterable, Iterator, Mapping
from dataclasses import fields
from types import MappingProxyType
from typing import Any, Final

import click

from engine.building.records import ROW_TABLES, Direction, Level, Site, may_be_left_out
from workbook_templates.declare import Block, Part, Quantity
from workbook_templates.parts import PARTS
from xlbridge.cli.failure import Refusal

RECORDS: Final[Mapping[str, type[Any]]] = MappingProxyType(
    {"site": Site, "direction": Direction, "level": Level, **ROW_TABLES}
)


@click.command("entries")
@click.argument("part", required=False)
@click.option("--json", "as_json", is_flag=True, help="Print as JSON.")
def command(part: str | None, as_json: bool) -> None:
    """List the entries of a BUILDING.toml, or those of one PART of the workbook."""
    if part is not None and part not in PARTS:
        raise Refusal(f"{part}: no such part; the parts are {', '.join(PARTS)}")
    found = entries() if part is None else entries([PARTS[part]])
    if as_json:
        click.echo(json.dumps(found, indent=1, ensure_ascii=False))
        return
    keys = [f"{entry['table']}.{entry['key']}" for entry in found]
    width = max(map(len, keys), default=0)
    for key, entry in zip(keys, found, strict=True):
        unit = "" if entry["unit"] in ("none", "text") else f" [{entry['unit']}]"
        click.echo(f"{key:<{width}}  {entry['text']}{unit}; {entry['allowed']}; {entry['left_out']}")


def entries(parts: Iterable[Part] = tuple(PARTS.values())) -> list[dict[str, Any]]:
    """Return every entry of these parts once, in the order of the workbook."""
    found = [
        _entry(part, table, q, block.per_direction)
        for part in parts
        for table, block in _blocks(part)
        for q in block.quantities
        if q.is_input
    ]
    return list({(entry["table"], entry["key"]): entry for entry in reversed(found)}.values())[::-1]


def _blocks(part: Part) -> Iterator[tuple[str, Block]]:
    for block in part.criteria:
        yield ("direction" if block.per_direction else "site"), block
    for band in part.bands:
        yield "level", band
    for table in part.tables:
        for band in table.bands:
            yield table.stored, band


def _entry(part: Part, table: str, q: Quantity, per_direction: bool) -> dict[str, Any]:
    key = q.key if table in ("site", "direction") else q.stored_key("X" if per_direction else None)
    declared = {field.name: field for field in fields(RECORDS[table])}[key]
    return {
        "part": part.key,
        "table": table,
        "key": f"{key}, {key[:-1]}Y"
        if key != q.key and per_direction and table not in ("site", "direction")
        else key,
        "text": q.text,
        "unit": q.unit,
        "allowed": _allowed(q),
        "left_out": _left_out(declared.default) if may_be_left_out(declared) else "needed",
    }


def _allowed(q: Quantity) -> str:
    if q.is_flag:
        return "true or false"
    if q.choices:
        return " or ".join(f'"{word}"' for word in q.choices)
    return "text" if q.span is None else f"a number, {q.span}"


def _left_out(default: Any) -> str:
    if default is None:
        return "may be left out"
    if isinstance(default, float):
        return f"left out: {default:g}"
    return f"left out: {json.dumps(default)}"
