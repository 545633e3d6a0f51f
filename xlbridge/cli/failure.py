"""Exit codes, and errors as one sentence with the remedy."""

from __future__ import annotations

import tomllib
from typing import Final

import click

CLEAN: Final = 0
FINDINGS: Final = 1
INCOMPLETE: Final = 2
BAD_INPUT: Final = 3


class Refusal(ValueError):
    """The command cannot do what was asked; the message says why and what to do instead."""


def sentence(error: Exception) -> str:
    """Return what a user should read of an error; unexpected ones are named as faults of the tool."""
    if isinstance(error, click.UsageError):
        command = error.ctx.command_path if error.ctx else "storyledger"
        return f"{' '.join(error.format_message().split())} Try '{command} --help'."
    if isinstance(error, OSError):
        return f"{error.filename}: {error.strerror}" if error.filename else str(error)
    if isinstance(error, tomllib.TOMLDecodeError | UnicodeDecodeError):
        return f"not a TOML file in UTF-8: {error}"
    if isinstance(error, ValueError):
        return str(error)
    return f"fault of the tool, please report it: {type(error).__name__}: {error}"
