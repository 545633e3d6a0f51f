"""The command as a process of its own: peak memory of ``calc``, processor time of ``--version``."""

from __future__ import annotations

import json
from pathlib import Path
from typing import Any

import pytest

from tests.support.command import python
from workbook_templates.build import build

#: runs the command as its child and prints what the child took; a small process of its own, because a
#: child's peak memory starts from that of its parent
PROBE = """
import json, resource, subprocess, sys
done = subprocess.run([sys.executable, "-m", "xlbridge.cli", *sys.argv[1:]], stdout=subprocess.DEVNULL)
used = resource.getrusage(resource.RUSAGE_CHILDREN)
unit = 1 if sys.platform == "darwin" else 1024
print(json.dumps({"memory": used.ru_maxrss * unit / 1e6, "processor": used.ru_utime + used.ru_stime}))
sys.exit(done.returncode)
"""


def used(folder: Path, *arguments: str) -> dict[str, float]:
    pytest.importorskip("resource", reason="processes are measured only where the system counts for them")
    done = python("-c", PROBE, *arguments, cwd=folder)
    assert (done.returncode, done.stderr) == (0, "")
    found: dict[str, float] = json.loads(done.stdout)
    return found


def test_peak_memory_of_calc(full: bool, figure: Any, tmp_path: Path) -> None:
    levels = 100 if full else 2
    (tmp_path / "book.xlsx").write_bytes(build({"edition": "7-22", "units": "us"}, levels))
    memory = used(tmp_path, "calc", "book.xlsx")["memory"]
    assert (tmp_path / "book-computed.xlsx").exists()
    idle = used(tmp_path, "--version")["memory"]
    assert memory > idle
    figure(f"peak memory of calc, {levels} levels [MB]", memory, "target below 200")
    figure("  the same of --version [MB]", idle, "no target")


def test_processor_time_of_the_version(full: bool, figure: Any, tmp_path: Path) -> None:
    taken = min(used(tmp_path, "--version")["processor"] for _ in range(5 if full else 1))
    figure("processor time of --version [s]", taken, "target below 0.3")
