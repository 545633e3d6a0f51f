"""README.md: every command runs as printed, every formula gives what the page says, every link leads on."""

from __future__ import annotations

import doctest
import os
import re
import shutil
import subprocess
import tomllib
from pathlib import Path

import pytest
from openpyxl import Workbook

from engine.building import from_mapping, solve
from engine.building.results import RULES
from tests.support import conformance, readme
from tests.support.command import ROOT
from tests.support.office import missing
from workbook_templates.parts import CORE, PARTS
from xlbridge.catalogue import CATALOGUE
from xlbridge.cli import CAUTION, COMMANDS
from xlbridge.cli.entries_command import entries
from xlbridge.headless.compute import open_workbook
from xlbridge.values import CellError

SETUP = "STORYLEDGER_README_SETUP"
PROJECT = tomllib.loads((ROOT / "pyproject.toml").read_text(encoding="utf-8"))["project"]


class TestCommands:
    def test_every_command_prints_what_the_page_shows(self, tmp_path: Path) -> None:
        shell = readme.Shell(tmp_path)
        calls = [call for session in readme.sessions() for call in session]
        if missing():
            calls = [call for call in calls if not call[0].startswith("storyledger print")]
        assert len(calls) >= 15
        different = {
            command: (printed, real) for command, printed in calls if (real := shell.run(command)) != printed
        }
        assert not different

    def test_every_command_is_shown(self) -> None:
        shown = {
            command.split()[1] for s in readme.sessions() for command, _ in s if "storyledger" in command
        }
        assert shown == set(COMMANDS)

    def test_python_sample(self) -> None:
        (sample,) = readme.blocks("python")
        test = doctest.DocTestParser().get_doctest(sample, {}, "README.md", "README.md", 0)
        assert len(test.examples) == 3
        assert doctest.DocTestRunner().run(test).failed == 0


class TestSetUp:
    def test_both_commands_fit_the_project(self) -> None:
        show, check = (block.strip() for block in readme.blocks("sh"))
        preamble, _, install = show.partition("; python3 -m venv")
        assert preamble.startswith("python3 -c 'import ensurepip'")
        assert check.startswith(f"{preamble}; python3 -m venv")
        assert install == " .venv && .venv/bin/pip install --quiet . && .venv/bin/storyledger demo demo"
        assert set(PROJECT["scripts"]) == {"storyledger"}
        assert check.endswith("pip install --quiet --editable '.[test]' && .venv/bin/python -m pytest")
        assert "test" in PROJECT["optional-dependencies"]
        assert "\n" not in show + check

    def test_versions_are_those_of_the_project(self) -> None:
        assert f"Python {PROJECT['requires-python'].removeprefix('>=')} or newer" in readme.text()
        pinned = next(d for d in PROJECT["dependencies"] if d.startswith("xlwings=="))
        assert pinned.replace("==", " ") in readme.text()

    if os.environ.get(SETUP):

        @pytest.mark.parametrize("which", [0, 1])
        def test_the_command_works_in_a_fresh_copy(self, tmp_path: Path, which: int) -> None:
            """Installs from the package index, so only on request."""
            ignored = shutil.ignore_patterns(".*", "*.egg-info", "build")
            copy = shutil.copytree(ROOT, tmp_path / "copy", ignore=ignored)
            command = readme.blocks("sh")[which].strip()
            outside = {k: v for k, v in os.environ.items() if k not in ("PYTHONPATH", SETUP)}
            done = subprocess.run(
                ["sh", "-c", command],
                cwd=copy,
                env=outside,
                capture_output=True,
                encoding="utf-8",
                check=False,
            )
            assert done.returncode == 0, done.stdout[-3000:] + done.stderr[-3000:]
            assert ("0 differ" if which == 0 else " passed") in done.stdout
            assert which or (copy / "demo" / "story.xlsx").is_file()


@pytest.fixture(scope="module")
def table(tmp_path_factory: pytest.TempPathFactory) -> Path:
    """The page's small table as a workbook, with the formula that it names filled down."""
    book = Workbook()
    formula = re.search(r"where D2 is `(=.*?)`, filled down to D6", readme.text())
    assert formula
    for number, *cells in readme.rows("row", "A", "B", "C", "D"):
        for column, content in zip("ABC", cells, strict=False):
            book.active[f"{column}{number}"] = float(content) if content.isdigit() else content
        if number != "1":
            filled = re.sub(r"(?<=[BC])2(?=,)", number, formula[1])
            book.active[f"D{number}"] = filled
    path = tmp_path_factory.mktemp("readme") / "table.xlsx"
    book.save(path)
    return path


class TestCells:
    def test_the_column_of_forces(self, table: Path) -> None:
        evaluator = open_workbook(table)
        rows = readme.rows("row", "A", "B", "C", "D")[1:]
        assert [row[0] for row in rows] == ["2", "3", "4", "5", "6"]
        for number, *_, force in rows:
            assert f"{evaluator.evaluate_text(f'=Sheet!D{number}'):.1f}" == force

    def test_every_formula_gives_what_the_page_says(self, table: Path) -> None:
        evaluator = open_workbook(table)
        rows = readme.rows("in a cell", "gives", "which is")
        assert len(rows) >= 20
        different = {}
        for formula, printed, _ in rows:
            standing = re.sub(r"(?<![\w\"])([B-D]\$?\d(?::[B-D]\d)?)", r"Sheet!\1", formula.strip("`"))
            found = evaluator.evaluate_text(standing)
            if shown(found, printed) != printed:
                different[formula] = (printed, found)
        assert not different

    def test_every_function_named_exists(self) -> None:
        named = set(re.findall(r"\bELF_[A-Z_]+\b", readme.text()))
        assert len(named) >= 12
        assert named <= set(CATALOGUE)


def shown(found: object, printed: str) -> str:
    """A value with as many decimals as the page prints."""
    if isinstance(found, float):
        return f"{found:.{len(printed.partition('.')[2])}f}"
    return found.code if isinstance(found, CellError) else str(found)


class TestBuildingFile:
    def test_the_sample_solves(self) -> None:
        (sample,) = readme.blocks("toml")
        package = solve(from_mapping(tomllib.loads(sample)))
        assert package.h_n == 28
        assert package.direction["Y"].theta is not None
        assert package.direction["X"].drift_over_limit.max() < 1  # type: ignore[union-attr]


class TestParts:
    def test_every_part_is_in_the_table_with_entries_that_exist(self) -> None:
        rows = readme.rows("part", "what it brings", "comes with")
        assert [part.strip("`") for part, *_ in rows] == [key for key in PARTS if key != CORE]
        known = {key for entry in entries() for key in (*entry["key"].split(", "), entry["table"])}
        named = {word for *_, entered in rows for word in re.findall(r"`(\w+)`", entered)}
        assert [word for word in named if not {word, f"{word}_X"} & known] == []


class TestWords:
    def test_the_caution_stands_on_the_page(self) -> None:
        assert CAUTION in readme.text()

    def test_every_link_leads_to_a_file(self) -> None:
        links = re.findall(r"\]\((?!http)([^)#]+)\)", readme.text())
        assert len(links) >= 2
        assert [link for link in links if not (ROOT / link).is_file()] == []

    @pytest.mark.parametrize("page", ["README.md", "DEVELOPERS.md"])
    def test_every_path_and_module_named_exists(self, page: str) -> None:
        text = (ROOT / page).read_text(encoding="utf-8")
        paths = re.findall(r"`((?:engine|xlbridge|workbook_templates|tests|\.ci)/[\w./*]*)`", text)
        modules = set(re.findall(r"python -m ((?:tests|xlbridge|workbook_templates)[\w.]+)", text))
        assert paths
        assert [path for path in paths if not list(ROOT.glob(path.rstrip("/")))] == []
        places = {module: ROOT / module.replace(".", "/") for module in modules}
        runs = {
            m for m, p in places.items() if p.with_suffix(".py").is_file() or (p / "__main__.py").is_file()
        }
        assert modules - runs == set()

    def test_json_keys_named_are_real(self) -> None:
        paragraph = next(line for line in readme.text().splitlines() if line.startswith("`solve --json`"))
        (sample,) = readme.blocks("toml")
        package = solve(from_mapping(tomllib.loads(sample))).to_json()
        named = re.findall(r"`(\w+)`", paragraph)
        assert len(named) >= 10
        assert [n for n in named if n not in package and n not in package["direction"]["X"]] == []
        assert set(RULES) < set(package["clauses"])


def test_the_conformance_matrix_is_the_one_that_the_tests_run() -> None:
    assert conformance.summary() in readme.text()
    for (front, kind), departure in conformance.DEPARTURES.items():
        assert f"- {front}, {kind}: {departure.why}." in readme.text()
