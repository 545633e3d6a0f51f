"""Many workbooks audited by several processes; a file that breaks one of them does not stop the rest."""

from __future__ import annotations

import hashlib
import multiprocessing
import sys
from collections import deque
from collections.abc import Generator, Iterable
from dataclasses import asdict, dataclass
from multiprocessing.connection import Connection, wait
from pathlib import Path
from time import monotonic
from typing import Any, Final

from xlbridge.audit.audit import audit
from xlbridge.audit.kinds import Severity
from xlbridge.audit.subject import Knows, Subject
from xlbridge.headless.opening import BookError

#: what the audit of one file may take, beyond what the guard of files bounds already
MEMORY: Final = 2 * 2**30
SECONDS: Final = 300.0
#: a process starts afresh after so many files, so that no memory is kept for long
FILES: Final = 50


@dataclass(frozen=True, slots=True)
class Outcome:
    """What became of one file; ``failure`` says why there is no audit of it."""

    path: str
    sha256: str = ""
    checked: int = 0
    formula_cells: int = 0
    errors: int = 0
    warnings: int = 0
    notes: int = 0
    not_checked: int = 0
    failure: str = ""

    @property
    def verdict(self) -> str:
        """The outcome in a word, with its sign."""
        if self.failure:
            return "✗ not audited"
        if self.errors or self.warnings:
            return "✗ findings"
        return "– incomplete" if self.not_checked else "✓ clean"

    def record(self) -> dict[str, Any]:
        """Return the outcome as plain data."""
        return {**asdict(self), "verdict": self.verdict}


def one(path: Path, knows: Knows) -> Outcome:
    """Audit one file in this process."""
    try:
        outcome = audit(Subject.open(path, knows))
    except BookError as error:
        return Outcome(str(path), failure=str(error).removeprefix(f"{path}: "))
    return Outcome(
        str(path),
        outcome.subject.sha256,
        outcome.checked_cells,
        outcome.formula_cells,
        outcome.count(Severity.ERROR),
        outcome.count(Severity.WARNING),
        outcome.count(Severity.NOTE),
        len(outcome.not_checked),
    )


def many(paths: Iterable[Path], knows: Knows, jobs: int) -> Generator[Outcome, None, None]:
    """Audit files in ``jobs`` processes; outcomes come as they are ready."""
    waiting = deque(paths)
    workers = [_Worker(knows) for _ in range(min(jobs, len(waiting)))]
    try:
        for worker in workers:
            worker.take(waiting.popleft())
        while busy := [worker for worker in workers if worker.path]:
            for worker in _ready(busy):
                yield worker.finish()
                if waiting:
                    worker.take(waiting.popleft())
    finally:
        for worker in workers:
            worker.stop()


def sha256(path: Path) -> str:
    """Return the hash of a file; empty where it cannot be read."""
    try:
        if not path.is_file():  # a pipe would be waited for
            return ""
        with path.open("rb") as file:
            return hashlib.file_digest(file, "sha256").hexdigest()
    except OSError:
        return ""


class _Worker:
    """A process that audits one file after another."""

    def __init__(self, knows: Knows) -> None:
        self.knows = knows
        self.path: Path | None = None
        self.due = 0.0
        self.taken = 0
        self._start()

    def take(self, path: Path) -> None:
        """Give it a file."""
        if self.taken >= FILES or not self.process.is_alive():
            self.stop()
            self._start()
        self.path, self.due, self.taken = path, monotonic() + SECONDS, self.taken + 1
        self.pipe.send(path)

    def finish(self) -> Outcome:
        """Return the outcome of its file; a process that died or takes too long is replaced."""
        path, self.path = self.path, None
        try:
            if self.pipe.poll():
                found: Outcome = self.pipe.recv()
                return found
            failure = f"the audit took longer than {SECONDS:.0f} s and was stopped"
        except (EOFError, OSError):
            failure = "the process that audited it ended: out of memory, or the file is damaged"
        self.stop()
        self._start()
        return Outcome(str(path), failure=failure)

    def stop(self) -> None:
        """End the process."""
        self.pipe.close()
        self.process.terminate()
        self.process.join()

    def _start(self) -> None:
        context = multiprocessing.get_context("spawn")
        self.pipe, other = context.Pipe()
        self.process = context.Process(target=_serve, args=(other, self.knows), daemon=True)
        self.process.start()
        other.close()
        self.taken = 0


def _ready(busy: list[_Worker]) -> list[_Worker]:
    """Wait until some are done, or their time is over."""
    pipes = {worker.pipe: worker for worker in busy}
    left = max(0.0, min(worker.due for worker in busy) - monotonic())
    done = [pipes[pipe] for pipe in wait(list(pipes), left) if isinstance(pipe, Connection)]
    return done or [worker for worker in busy if worker.due <= monotonic()]


def _serve(pipe: Connection, knows: Knows) -> None:
    """The life of a process: audit what comes, within its bounds, until the pipe is closed."""
    _bound()
    while True:
        try:
            path: Path = pipe.recv()
        except (EOFError, KeyboardInterrupt):
            return
        try:
            found = one(path, knows)
        except KeyboardInterrupt:
            return
        except MemoryError:
            found = Outcome(str(path), failure=f"the audit needs more memory than {MEMORY // 2**30} GB")
        except Exception as error:  # whatever a hostile file provokes is said of that file
            found = Outcome(str(path), failure=f"the audit failed ({type(error).__name__}: {error})")
        pipe.send(found)


def _bound() -> None:
    """Bound the memory of this process, where the system can."""
    if sys.platform != "win32":
        import resource

        resource.setrlimit(resource.RLIMIT_AS, (MEMORY, MEMORY))
