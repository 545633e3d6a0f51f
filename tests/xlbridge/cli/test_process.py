"""The command as a process: fast to start, quiet in a pipe, the same words under any code page."""

from __future__ import annotations

import json
import subprocess
import sys
from pathlib import Path

import pytest

from tests.support.command import ROOT, assert_refused, python, run, run_apart
from xlbridge.cli import COMMANDS

HEAVY = ("numpy", "openpyxl", "lxml", "xlwings", "rich", "jinja2", "engine")


def imported(tmp_path: Path, *arguments: str) -> set[str]:
    """The heavy packages that a call has imported when it ends, by the import system's own account."""
    done = python("-X", "importtime", "-m", "xlbridge.cli", *arguments, cwd=tmp_path)
    assert done.returncode == 0, done.stderr
    names = {line.rpartition("|")[2].strip() for line in done.stderr.splitlines() if "import time:" in line}
    assert "click" in names
    return {name for name in names if name in HEAVY}


def test_the_version_needs_no_heavy_package(tmp_path: Path) -> None:
    assert imported(tmp_path, "--version") == set()


def test_the_probe_sees_a_heavy_package(tmp_path: Path) -> None:
    assert "numpy" in imported(tmp_path, "functions")


def test_the_version_is_the_engines(tmp_path: Path) -> None:
    from engine import __version__

    assert run("--version").out == f"storyledger {__version__}\n"
    assert run_apart("--version", cwd=tmp_path).out == f"storyledger {__version__}\n"


def test_a_pipe_gets_the_text_alone(tmp_path: Path) -> None:
    calls = [
        ["demo", "d"],
        ["calc", "d/story.xlsx"],
        ["inputs", "d/story.xlsx"],
        ["audit", "d/story.xlsx"],
        ["compare", "d/story.xlsx", "d/story.xlsx"],
        ["bridge-check", "check.xlsm"],
        ["calc-addin", "storyledger.oxt"],
        ["names", "d/story.xlsx", "--for", "calc"],
        ["solve", "d/building.toml"],
    ]
    calls += [["new", "n.xlsx", "--levels", "60"], ["eval", "=1+1", "--work"], ["functions"], ["entries"]]
    assert {call[0] for call in calls} == set(COMMANDS) - {"print"}  # needs an office: test_in_calc.py
    for call in calls:
        outcome = run_apart(*call, cwd=tmp_path)
        assert (outcome.code, outcome.err) == (0, ""), call
        assert outcome.out
        assert "\x1b" not in outcome.out
        assert "\r" not in outcome.out


@pytest.mark.parametrize("code_page", ["ascii", "cp1252"])
def test_symbols_survive_an_old_code_page(tmp_path: Path, code_page: str) -> None:
    outcome = run_apart("functions", "ELF_CVX", "--json", cwd=tmp_path, PYTHONIOENCODING=code_page)
    assert (outcome.code, outcome.err) == (0, "")
    assert "Σ" in json.loads(outcome.out)[0]["equation"]


def test_a_refusal_is_one_sentence_in_a_process_too(tmp_path: Path) -> None:
    assert_refused(run_apart("calc", "none.xlsx", cwd=tmp_path), "none.xlsx")


def test_a_reader_that_stops_early_sees_no_traceback(tmp_path: Path) -> None:
    command = [sys.executable, "-m", "xlbridge.cli", "functions", "--json"]
    with subprocess.Popen(
        command, cwd=ROOT, stdout=subprocess.PIPE, stderr=subprocess.PIPE, encoding="utf-8"
    ) as process:
        assert process.stdout
        assert process.stderr
        assert process.stdout.readline() == "[\n"
        process.stdout.close()
        assert "Traceback" not in process.stderr.read()
