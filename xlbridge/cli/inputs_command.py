"""``storyledger inputs``: a workbook's inputs as BUILDING.toml."""

from __future__ import annotations

from pathlib import Path

import click

from workbook_templates.read import Reader, ReadError
from xlbridge.cli.failure import Refusal
from xlbridge.cli.files import building_text, refuse_existing, refuse_input, write_new
from xlbridge.headless.compute import open_workbook


@click.command("inputs")
@click.argument("book", type=click.Path(path_type=Path))
@click.option("-o", "--output", type=click.Path(path_type=Path), help="Write a file instead of printing.")
@click.option("--force", is_flag=True, help="Replace an existing output.")
def command(book: Path, output: Path | None, force: bool) -> None:
    """Print the inputs of BOOK as a BUILDING.toml, blanks left out."""
    if output is not None:
        refuse_input(output, book)
        refuse_existing(output, force)
    try:
        text = building_text(Reader(open_workbook(book).evaluate_text).inputs())
    except ReadError as error:
        raise Refusal(f"{book}: {error}") from error
    if output is None:
        click.echo(text, nl=False)
    else:
        write_new(output, text.encode(), force)
