"""Run the tests of xlwings' Windows branch in a process of their own."""

from __future__ import annotations

import os
import re
import subprocess
import sys
from pathlib import Path

ROOT = Path(__file__).parents[3]
FOLDER = Path(__file__).parent / "genuine"


def run(*arguments: str, branch: str = "1") -> subprocess.CompletedProcess[str]:
    return subprocess.run(
        [sys.executable, "-m", "pytest", str(FOLDER), "-p", "no:cacheprovider", *arguments],
        cwd=ROOT,
        env={**os.environ, "STORYLEDGER_WINDOWS_BRANCH": branch},
        capture_output=True,
        text=True,
        check=False,
    )


def test_every_function_through_the_windows_branch() -> None:
    result = run()
    passed = re.search(r"(\d+) passed", result.stdout)
    assert result.returncode == 0, result.stdout + result.stderr
    assert passed
    assert "failed" not in result.stdout


def test_they_do_not_run_without_the_branch() -> None:
    assert run("--collect-only", branch="").returncode == 5  # pytest: no tests collected
