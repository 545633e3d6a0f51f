"""The ``storyledger`` command.

Exit codes: 0 clean, 1 findings, 2 incomplete (something could not be evaluated), 3 bad input or tool error.
Each sub-command is a module of its own and is imported only when it is called, so that the command starts
fast.
"""

from __future__ import annotations

import sys
from importlib import import_module
from typing import Final

import click

from engine.version import __version__
from xlbridge.cli.failure import BAD_INPUT, sentence

COMMANDS: Final = ("demo", "new", "calc", "solve", "inputs", "eval", "functions")
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
        command: click.Command = import_module(f"xlbridge.cli.{name}_command").command
        return command


@click.group(cls=_Lazy, epilog=CAUTION, context_settings={"help_option_names": ["-h", "--help"]})
@click.version_option(__version__, prog_name="storyledger", message="%(prog)s %(version)s")
def group() -> None:
    """Seismic story forces of ASCE/SEI 7-16 and 7-22 for worksheets, headless and in plain text."""


def main(arguments: list[str] | None = None) -> None:
    """Run the command; every refusal is one sentence on the error stream and exit code 3."""
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
