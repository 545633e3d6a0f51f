"""The ``storyledger`` command.

Exit codes: 0 clean, 1 findings, 2 incomplete (something could not be evaluated), 3 bad input or tool error.
Each sub-command is a module of its own and is imported only when it is called, so that the command starts
fast.
"""

from __future__ import annotations

import io
import sys
from importlib import import_module
from importlib.util import find_spec
from pathlib import Path
from runpy import run_path
from typing import Final

import click

from xlbridge.cli.failure import BAD_INPUT, sentence

COMMANDS: Final = (
    *("demo", "new", "calc", "solve", "inputs", "audit", "entries", "eval", "functions"),
    *("compare", "print", "bridge-check", "calc-addin", "names"),
)
CAUTION: Final = (
    "Results are an aid to a licensed engineer's judgement. Confirm every value against the standard adopted "
    "by the authority having jurisdiction, its supplements and local amendments."
)


class _Lazy(click.Group):
    """A group that imports a command when it is asked for."""

    def list_commands(self, ctx: click.Context) -> list[str]:
        return list(COMMANDS)

    def get_command(self, ctx: click.Context, name: str) -> click.Command | None:
        if name not in COMMANDS:
            return None
        command: click.Command = import_module(f"xlbridge.cli.{name.replace('-', '_')}_command").command
        return command


def _print_version(context: click.Context, _: click.Parameter, wanted: bool) -> None:
    """Print the version without importing the engine's package, which would bring all of numpy with it."""
    if not wanted or context.resilient_parsing:
        return
    engine = find_spec("engine")
    folder = engine.submodule_search_locations[0] if engine and engine.submodule_search_locations else "."
    click.echo(f"storyledger {run_path(str(Path(folder, 'version.py')))['__version__']}")
    context.exit()


@click.group(
    cls=_Lazy,
    epilog=CAUTION,
    no_args_is_help=False,
    context_settings={"help_option_names": ["-h", "--help"]},
)
@click.option(
    "--version",
    is_flag=True,
    expose_value=False,
    is_eager=True,
    callback=_print_version,
    help="Show the version and exit.",
)
def group() -> None:
    """Seismic story forces of ASCE/SEI 7-16 and 7-22 for worksheets, headless and in plain text."""


def main(arguments: list[str] | None = None) -> None:
    """Run the command; every refusal is one sentence on the error stream and exit code 3."""
    _speak_utf8()
    try:
        code = group.main(arguments, prog_name="storyledger", standalone_mode=False)
    except click.exceptions.Exit as stop:
        code = stop.exit_code
    except click.Abort:
        print("storyledger: interrupted", file=sys.stderr)
        code = BAD_INPUT
    except Exception as error:
        print(f"storyledger: {sentence(error)}", file=sys.stderr)
        code = BAD_INPUT
    sys.exit(code or 0)


def _speak_utf8() -> None:
    """Write UTF-8 also into a pipe or a file whose system default is an older code page."""
    for stream in (sys.stdout, sys.stderr):
        if isinstance(stream, io.TextIOWrapper):
            stream.reconfigure(encoding="utf-8")
