"""``storyledger calc-addin``: the extension for LibreOffice Calc."""

from __future__ import annotations

from pathlib import Path

import click

from xlbridge.calc.extension import package
from xlbridge.cli.failure import Refusal
from xlbridge.cli.files import write_new


@click.command("calc-addin")
@click.argument("extension", metavar="OUT.oxt", type=click.Path(path_type=Path))
@click.option("--force", is_flag=True, help="Replace an existing output.")
def command(extension: Path, force: bool) -> None:
    """Write the extension that gives LibreOffice Calc the worksheet functions.

    It carries the engine along, and needs numpy for the Python that the office uses.
    """
    if extension.suffix.lower() != ".oxt":
        raise Refusal(f"{extension}: an extension of the office ends in .oxt")
    write_new(extension, package(), force)
    click.echo(f"{extension}: install it with the office's Extension Manager, or `unopkg add {extension}`")
