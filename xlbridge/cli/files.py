"""Files in and out: inputs never change, an output appears whole or not at all."""

from __future__ import annotations

import os
import tempfile
import tomllib
from pathlib import Path
from typing import Any

import tomli_w

from xlbridge.cli.failure import Refusal


def read_building(path: Path) -> dict[str, Any]:
    """Return the tables of a BUILDING.toml."""
    try:
        return tomllib.loads(path.read_text(encoding="utf-8"))
    except (tomllib.TOMLDecodeError, UnicodeDecodeError) as error:
        raise Refusal(f"not a TOML file in UTF-8: {error}") from error


def building_text(tables: dict[str, Any]) -> str:
    """Return the text of a BUILDING.toml."""
    return tomli_w.dumps(tables)


def refuse_existing(path: Path, force: bool) -> None:
    """Refuse to replace a file unless it is asked for."""
    if not path.parent.is_dir():
        raise Refusal(f"{path}: the folder {path.parent} does not exist, make it first")
    if path.exists() and not force:
        raise Refusal(f"{path} exists already: choose another name, or give --force to replace it")


def refuse_input(path: Path, source: Path) -> None:
    """Refuse to write over the file that is read."""
    if path.exists() and source.exists() and path.samefile(source):
        raise Refusal(f"{path}: this is the input itself, which is never changed; choose another name")


def write_new(path: Path, data: bytes, force: bool) -> None:
    """Write a file beside its final place, then move it there."""
    refuse_existing(path, force)
    if path.is_dir():
        raise Refusal(f"{path}: this is a folder; name a file in it")
    handle, draft = tempfile.mkstemp(dir=path.parent, prefix=f".{path.name}.")
    try:
        with os.fdopen(handle, "wb") as file:
            file.write(data)
        os.chmod(draft, 0o666 & ~_mask())
        os.replace(draft, path)
    except BaseException:
        Path(draft).unlink(missing_ok=True)
        raise


def _mask() -> int:
    mask = os.umask(0)
    os.umask(mask)
    return mask
