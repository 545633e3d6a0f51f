"""``storyledger new``: make a story workbook, blank or from a BUILDING.toml."""

from __future__ import annotations

from pathlib import Path
from typing import Any

import click

from engine.building import from_mapping, to_mapping
from engine.editions import EDITIONS
from engine.levels import MAX_LEVELS
from engine.units import SYSTEMS
from workbook_templates.build import DEFAULT_LEVELS, write_native, write_workbook
from workbook_templates.parts import CORE, PARTS, together
from xlbridge.cli import macro_kit
from xlbridge.cli.failure import Refusal
from xlbridge.cli.files import read_building, refuse_existing, refuse_input

EXTRA = tuple(key for key in PARTS if key != CORE)
DEFAULT_EDITION, DEFAULT_UNITS = EDITIONS[-1], SYSTEMS[0]


@click.command("new")
@click.argument("book", type=click.Path(path_type=Path))
@click.option("--levels", type=click.IntRange(1, MAX_LEVELS), help=f"Levels at the start [{DEFAULT_LEVELS}].")
@click.option("--edition", type=click.Choice(EDITIONS), help=f"Edition of ASCE/SEI 7 [{DEFAULT_EDITION}].")
@click.option("--units", type=click.Choice(SYSTEMS), help=f"kip, ft, in or kN, m, mm [{DEFAULT_UNITS}].")
@click.option("--parts", help=f"Parts beside the story forces, by comma, or all: {', '.join(EXTRA)} [drift].")
@click.option("--from", "building", type=click.Path(path_type=Path), help="A BUILDING.toml to fill it from.")
@click.option("--native", is_flag=True, help="An issue copy: built-in functions only, no add-in needed.")
@click.option("--macro", is_flag=True, help="BOOK.xlsm with the macros that call Python from Excel.")
@click.option("--force", is_flag=True, help="Replace an existing BOOK.")
def command(
    book: Path,
    levels: int | None,
    edition: str | None,
    units: str | None,
    parts: str | None,
    building: Path | None,
    native: bool,
    macro: bool,
    force: bool,
) -> None:
    """Make the story workbook BOOK: criteria, story table, checks, figures, and the parts asked for.

    Without --from it holds starter values, marked as such until each is replaced. With --from the entries
    of the levels bring their parts along.
    """
    if macro and native:
        raise Refusal("--native needs no macros: leave --native or --macro out")
    if macro:
        macro_kit.refuse_unfit(book, force)
    elif book.suffix.lower() != ".xlsx":
        raise Refusal(f"{book}: the name of a workbook ends in .xlsx")
    refuse_existing(book, force)
    if building is not None:
        refuse_input(book, building)
        if levels or edition or units:
            raise Refusal("--from brings its own levels, edition and units: leave those options out")
        given = _given(building)
    else:
        given = {"edition": edition or DEFAULT_EDITION, "units": units or DEFAULT_UNITS}
    if parts is not None:
        words = [word.strip() for word in parts.split(",") if word.strip()]
        given["parts"] = sorted(together(given["edition"])) if words == ["all"] else words
    levels = levels or DEFAULT_LEVELS
    if native:
        write_native(given, book, levels, force)
    else:
        write_workbook(given, book, levels, force, macro_kit.fit_out if macro else None)
    click.echo(f"{book}: made for ASCE/SEI {given['edition']}, units {given['units']}")
    if macro:
        click.echo(f"import {macro_kit.write_module(book, force)} into it once, see README")


def _given(building: Path) -> dict[str, Any]:
    """Return the tables of the file, after the engine has accepted them."""
    try:
        return to_mapping(from_mapping(read_building(building)))
    except ValueError as error:
        raise Refusal(f"{building}: {error}") from error
