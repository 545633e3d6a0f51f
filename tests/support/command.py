"""The ``storyledger`` command as tests call it: in this process, or in one of its own."""

from __future__ import annotations

import contextlib
import hashlib
import io
import os
import subprocess
import sys
from collections.abc import Iterator
from dataclasses import dataclass
from pathlib import Path
from typing import Any

from xlbridge.cli import main

ROOT = Path(__file__).parents[2]


@dataclass(frozen=True)
class Outcome:
    """What a call left: exit code, output stream, error stream."""

    code: int
    out: str
    err: str


def run(*arguments: object) -> Outcome:
    """Call the command in this process."""
    out, err = io.StringIO(), io.StringIO()
    with contextlib.redirect_stdout(out), contextlib.redirect_stderr(err):
        try:
            main([str(a) for a in arguments])
        except SystemExit as stop:
            return Outcome(int(stop.code or 0), out.getvalue(), err.getvalue())
    raise AssertionError("the command returned instead of exiting")


def run_apart(*arguments: object, cwd: Path, **environment: str) -> Outcome:
    """Call the command in a process of its own, its output in a pipe."""
    done = python("-m", "xlbridge.cli", *arguments, cwd=cwd, **environment)
    return Outcome(done.returncode, done.stdout, done.stderr)


def python(
    *arguments: object, cwd: Path, stdin: str | None = None, **environment: str
) -> subprocess.CompletedProcess[str]:
    """Run this Python, with the project importable from any folder."""
    return subprocess.run(
        [sys.executable, *map(str, arguments)],
        cwd=cwd,
        env={**os.environ, "PYTHONPATH": str(ROOT), **environment},
        capture_output=True,
        input=stdin,
        encoding="utf-8",
        check=False,
    )


def digests(folder: Path) -> dict[str, str]:
    """The content of every file below a folder, as a digest by relative path."""
    return {
        str(path.relative_to(folder)): hashlib.sha256(path.read_bytes()).hexdigest()
        for path in sorted(folder.rglob("*"))
        if path.is_file()
    }


@contextlib.contextmanager
def unchanged(folder: Path, *, but: tuple[str, ...] = ()) -> Iterator[None]:
    """Fail if a file below the folder is changed, added or removed, save for those named."""
    before = digests(folder)
    yield
    after = digests(folder)
    assert {k: v for k, v in after.items() if k not in but} == {
        k: v for k, v in before.items() if k not in but
    }


def assert_refused(outcome: Outcome, *words: str) -> None:
    """One sentence on the error stream that holds the words, exit code 3, nothing printed."""
    assert outcome.code == 3, outcome
    assert outcome.out == ""
    assert outcome.err.startswith("storyledger: ")
    assert outcome.err.endswith("\n")
    assert outcome.err.count("\n") == 1, outcome.err
    assert "Traceback" not in outcome.err
    assert "fault of the tool" not in outcome.err
    missing = [word for word in words if word not in outcome.err]
    assert not missing, outcome.err


def keys(record: Any) -> Any:
    """The shape of a JSON record: its keys, nested; one entry stands for a list."""
    if isinstance(record, dict):
        return {key: keys(value) for key, value in record.items()}
    if isinstance(record, list):
        return [keys(record[0])] if record else []
    return type(record).__name__
