"""README.md as data: its commands with their output, its formulas, tables and samples.

``python -m tests.support.readme`` runs the commands again and writes their output into the page.
"""

from __future__ import annotations

import os
import re
import subprocess
import sys
from collections.abc import Iterator
from pathlib import Path
from tempfile import TemporaryDirectory

from tests.support.command import ROOT
from tests.support.conformance import summary

PAGE = ROOT / "README.md"
_MATRIX = re.compile(r"^\| kind of call \|.*?\n(?=\n)", re.DOTALL | re.MULTILINE)
_CONSOLE = re.compile(r"(?<=```console\n).*?(?=```)", re.DOTALL)


def text() -> str:
    """The page."""
    return PAGE.read_text(encoding="utf-8")


def blocks(language: str) -> list[str]:
    """The contents of the fenced blocks in a language."""
    return re.findall(rf"```{language}\n(.*?)```", text(), re.DOTALL)


def rows(*heading: str) -> list[list[str]]:
    """The cells of the table with this heading."""
    lines = iter(text().splitlines())
    head = f"| {' | '.join(heading)} |"
    assert any(line == head for line in lines), f"no table headed {head}"
    next(lines)
    table = []
    for line in lines:
        if not line.startswith("|"):
            break
        table.append([cell.strip() for cell in line.strip("|").split(" | ")])
    return table


def sessions() -> list[list[tuple[str, str]]]:
    """The console blocks: each a list of commands with the output printed below them."""
    return [list(_calls(block)) for block in _CONSOLE.findall(text())]


def _calls(block: str) -> Iterator[tuple[str, str]]:
    for part in re.split(r"^\$ ", block, flags=re.MULTILINE)[1:]:
        command, _, output = part.partition("\n")
        yield command, output


class Shell:
    """Runs the page's commands in a folder, one after the other; ``storyledger`` is this project's."""

    def __init__(self, folder: Path) -> None:
        self.folder = folder
        self.code = 0
        (folder / "bin").mkdir()
        script = folder / "bin" / "storyledger"
        script.write_text(f'#!/bin/sh\nexec "{sys.executable}" -m xlbridge.cli "$@"\n')
        script.chmod(0o755)
        (folder / "work").mkdir()

    def run(self, command: str) -> str:
        """Both output streams of a command, as a terminal shows them."""
        path = os.pathsep.join((str(self.folder / "bin"), os.environ["PATH"]))
        done = subprocess.run(
            ["sh", "-c", f"(exit {self.code}); {command}"],
            cwd=self.folder / "work",
            env={**os.environ, "PYTHONPATH": str(ROOT), "PATH": path},
            stdout=subprocess.PIPE,
            stderr=subprocess.STDOUT,
            encoding="utf-8",
            check=False,
        )
        self.code = done.returncode
        return done.stdout


def main() -> None:
    """Write the real output below every command of the page."""
    with TemporaryDirectory() as name:
        shell = Shell(Path(name))

        def again(block: re.Match[str]) -> str:
            return "".join(f"$ {command}\n{shell.run(command)}" for command, _ in _calls(block[0]))

        with_table = _MATRIX.sub(lambda match: summary(), text())
        PAGE.write_text(_CONSOLE.sub(again, with_table), encoding="utf-8")


if __name__ == "__main__":
    main()
