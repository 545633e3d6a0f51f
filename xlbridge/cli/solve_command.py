"""``storyledger solve``: every result from the inputs alone, with no workbook."""

from __future__ import annotations

import json
from pathlib import Path

import click

from engine.building import from_mapping, solve
from xlbridge.cli.failure import Refusal
from xlbridge.cli.files import read_building
from xlbridge.cli.tables import package_text


@click.command("solve")
@click.argument("building", type=click.Path(path_type=Path))
@click.option("--json", "as_json", is_flag=True, help="Print every result, clause and note as JSON.")
def command(building: Path, as_json: bool) -> None:
    """Compute the equivalent lateral force package of BUILDING.toml from its inputs alone."""
    try:
        package = solve(from_mapping(read_building(building)))
    except ValueError as error:
        raise Refusal(f"{building}: {error}") from error
    click.echo(json.dumps(package.to_json(), indent=1) if as_json else package_text(package))
