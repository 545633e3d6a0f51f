"""Whatever is wrong with what the command is given: one sentence with the remedy, exit code 3, no file."""

from __future__ import annotations

from pathlib import Path

import pytest

from tests.support.command import assert_refused, run, unchanged
from workbook_templates.demo import building_text
from xlbridge.cli import COMMANDS


@pytest.fixture(scope="module")
def folder(tmp_path_factory: pytest.TempPathFactory) -> Path:
    """A folder of things that a user may point at by mistake, and one good workbook and building."""
    place = tmp_path_factory.mktemp("given")
    (place / "good.toml").write_text(building_text(), encoding="utf-8")
    assert run("new", place / "good.xlsx", "--from", place / "good.toml").code == 0
    (place / "words.xlsx").write_text("not a workbook")
    (place / "empty.xlsx").write_bytes(b"")
    (place / "cut.xlsx").write_bytes((place / "good.xlsx").read_bytes()[:900])
    (place / "folder.xlsx").mkdir()
    (place / "latin.toml").write_bytes(b'title = "\xe9"')
    (place / "torn.toml").write_text("title = ")
    (place / "poor.toml").write_text('title = "A"\nedition = "7-22"\nunits = "us"\n')
    (place / "old.toml").write_text(building_text().replace('"7-22"', '"7-10"'), encoding="utf-8")
    (place / "typo.toml").write_text(building_text().replace("S_DS = 1.05", "S_ds = 1.05"), encoding="utf-8")
    return place


CALLS = {
    "no command": ([], ["Missing command", "--help"]),
    "an unknown command": (["solved"], ["No such command", "--help"]),
    "no argument": (["calc"], ["BOOK", "storyledger calc --help"]),
    "an unknown option": (["calc", "{}/good.xlsx", "--fast"], ["--fast", "--help"]),
    "calc: no such file": (["calc", "{}/none.xlsx"], ["none.xlsx", "no such file"]),
    "calc: a folder": (["calc", "{}/folder.xlsx"], ["folder.xlsx", "name the workbook"]),
    "calc: words": (["calc", "{}/words.xlsx"], ["words.xlsx", "not a workbook"]),
    "calc: empty": (["calc", "{}/empty.xlsx"], ["the file is empty"]),
    "calc: cut off": (["calc", "{}/cut.xlsx"], ["cut.xlsx", "not a workbook"]),
    "calc: TOML": (["calc", "{}/good.toml"], ["not a workbook"]),
    "calc: into no folder": (["calc", "{}/good.xlsx", "-o", "{}/no/out.xlsx"], ["the folder", "not exist"]),
    "calc: over a folder": (
        ["calc", "{}/good.xlsx", "-o", "{}/folder.xlsx", "--force"],
        ["folder.xlsx", "choose another"],
    ),
    "calc: over its input": (
        ["calc", "{}/good.xlsx", "-o", "{}/good.xlsx", "--force"],
        ["the input itself", "choose another name"],
    ),
    "print: words": (["print", "{}/words.xlsx"], ["not a workbook"]),
    "print: another ending": (["print", "{}/good.xlsx", "-o", "{}/a.ps"], ["ends in .pdf"]),
    "names: words": (["names", "{}/words.xlsx", "--for", "calc"], ["not a workbook"]),
    "names: over its input": (
        ["names", "{}/good.xlsx", "--for", "calc", "-o", "{}/good.xlsx", "--force"],
        ["the input itself", "choose another name"],
    ),
    "names: for nobody": (["names", "{}/good.xlsx"], ["--for", "--help"]),
    "names: another ending": (["names", "{}/good.xlsx", "--for", "calc", "-o", "{}/a.ods"], ["its ending"]),
    "calc-addin: another ending": (["calc-addin", "{}/a.zip"], [".oxt"]),
    "inputs: over its input": (
        ["inputs", "{}/good.xlsx", "-o", "{}/good.xlsx", "--force"],
        ["the input itself", "choose another name"],
    ),
    "inputs: over a folder": (["inputs", "{}/good.xlsx", "-o", "{}/folder.xlsx", "--force"], ["folder"]),
    "inputs: into no folder": (["inputs", "{}/good.xlsx", "-o", "{}/no/b.toml"], ["the folder", "not exist"]),
    "audit: words": (["audit", "{}/words.xlsx"], ["not a workbook"]),
    "audit: a report of another kind": (
        ["audit", "{}/good.xlsx", "--report", "{}/a.doc"],
        ["a.doc", ".html"],
    ),
    "audit: no record": (
        ["audit", "{}/good.xlsx", "--record", "{}/good.toml"],
        ["the record", "'title' is unknown"],
    ),
    "compare: words": (["compare", "{}/good.xlsx", "{}/words.xlsx"], ["words.xlsx", "not a workbook"]),
    "audit: no such file": (["audit", "{}/none.xlsx"], ["no such file"]),
    "inputs: words": (["inputs", "{}/words.xlsx"], ["not a workbook"]),
    "inputs: no such file": (["inputs", "{}/none.xlsx"], ["no such file"]),
    "new: into no folder": (["new", "{}/no/a.xlsx"], ["the folder", "not exist"]),
    "new: over a folder": (["new", "{}/folder.xlsx", "--force"], ["folder.xlsx", "choose another"]),
    "new: another ending": (["new", "{}/a.ods"], [".xlsx"]),
    "new: no levels": (["new", "{}/a.xlsx", "--levels", "0"], ["--levels", "1<=x<=1000"]),
    "new: 1001 levels": (["new", "{}/a.xlsx", "--levels", "1001"], ["--levels", "1<=x<=1000"]),
    "new: half a level": (["new", "{}/a.xlsx", "--levels", "2.5"], ["--levels", "2.5"]),
    "new: edition": (["new", "{}/a.xlsx", "--edition", "7-10"], ["7-10", "'7-16', '7-22'"]),
    "new: units": (["new", "{}/a.xlsx", "--units", "metric"], ["metric", "'us', 'si'"]),
    "new: two sources": (
        ["new", "{}/a.xlsx", "--from", "{}/good.toml", "--units", "si"],
        ["--from", "leave those options out"],
    ),
    "new: no such building": (["new", "{}/a.xlsx", "--from", "{}/none.toml"], ["none.toml", "No such file"]),
    "new: a building that the engine refuses": (
        ["new", "{}/a.xlsx", "--from", "{}/old.toml"],
        ["old.toml", "edition", "7-16, 7-22"],
    ),
    "solve: no such file": (["solve", "{}/none.toml"], ["none.toml", "No such file"]),
    "solve: a folder": (["solve", "{}/folder.xlsx"], ["folder.xlsx", "Is a directory"]),
    "solve: a workbook": (["solve", "{}/good.xlsx"], ["good.xlsx", "not a TOML file"]),
    "solve: not UTF-8": (["solve", "{}/latin.toml"], ["latin.toml", "UTF-8"]),
    "solve: torn": (["solve", "{}/torn.toml"], ["torn.toml", "not a TOML file"]),
    "solve: no site": (["solve", "{}/poor.toml"], ["poor.toml", "site"]),
    "solve: a misspelt key": (["solve", "{}/typo.toml"], ["site.S_ds", "did you mean S_DS?"]),
    "functions: unknown": (["functions", "ELF_CVZ"], ["ELF_CVZ", "did you mean ELF_CVX?"]),
    "functions: far off": (["functions", "SUM"], ["SUM", "storyledger functions"]),
    "demo: into a file": (["demo", "{}/good.toml"], ["good.toml", "is a file"]),
}


@pytest.mark.parametrize("case", CALLS)
def test_one_sentence_and_no_file(folder: Path, case: str) -> None:
    arguments, words = CALLS[case]
    with unchanged(folder):
        outcome = run(*(a.replace("{}", str(folder)) for a in arguments))
    assert_refused(outcome, *words)
    assert outcome.err.count(str(folder)) <= 2


OUTPUTS = {
    "calc": (["calc", "{}/good.xlsx", "-o", "{}/taken.xlsx"], "taken.xlsx"),
    "calc by its own name": (["calc", "{}/good.xlsx"], "good-computed.xlsx"),
    "new": (["new", "{}/taken.xlsx"], "taken.xlsx"),
    "new from a building": (["new", "{}/taken.xlsx", "--from", "{}/good.toml"], "taken.xlsx"),
    "inputs": (["inputs", "{}/good.xlsx", "-o", "{}/taken.toml"], "taken.toml"),
    "new with macros": (["new", "{}/taken.xlsm", "--macro"], "taken.xlsm"),
    "bridge-check": (["bridge-check", "{}/check.xlsx"], "check.xlsx"),
    "calc-addin": (["calc-addin", "{}/taken.oxt"], "taken.oxt"),
    "names": (["names", "{}/good.xlsx", "--for", "calc"], "good-calc.xlsx"),
    "print": (["print", "{}/good.xlsx"], "good.pdf"),
    "audit": (["audit", "{}/good.xlsx", "--report", "{}/audit.html"], "audit.html"),
    "demo": (["demo", "{}"], "story.xlsx"),
}


#: what a command writes besides
BESIDE = {"demo": ("building.toml", "results.json", "audit.html"), "new with macros": ("storyledger.bas",)}


@pytest.mark.parametrize("case", OUTPUTS)
def test_an_existing_file_is_replaced_only_by_force(folder: Path, case: str) -> None:
    arguments, name = OUTPUTS[case]
    arguments = [a.replace("{}", str(folder)) for a in arguments]
    taken = folder / name
    taken.write_text("somebody's work")
    try:
        with unchanged(folder):
            assert_refused(run(*arguments), name, "exists already", "--force")
        new = BESIDE.get(case, ())
        with unchanged(folder, but=(name, *new)):
            assert run(*arguments, "--force").code == 0
        assert b"somebody's work" not in taken.read_bytes()
    finally:
        for made in (name, *BESIDE.get(case, ())):
            (folder / made).unlink(missing_ok=True)


def test_a_failed_write_leaves_the_old_file_and_no_draft(
    folder: Path, monkeypatch: pytest.MonkeyPatch
) -> None:
    def full(*_: object) -> None:
        raise OSError(28, "No space left on device")

    taken = folder / "taken.toml"
    taken.write_text("somebody's work")
    monkeypatch.setattr("os.replace", full)
    with unchanged(folder):
        outcome = run("inputs", folder / "good.xlsx", "-o", taken, "--force")
        stored = run("calc", folder / "good.xlsx", "-o", folder / "out.xlsx")
    taken.unlink()
    assert_refused(outcome, "No space left")
    assert_refused(stored, "out.xlsx")


def test_an_unforeseen_fault_is_named_as_one(monkeypatch: pytest.MonkeyPatch) -> None:
    def broken(*_: object) -> None:
        raise KeyError("k")

    monkeypatch.setattr("xlbridge.cli.solve_command.read_building", broken)
    outcome = run("solve", "any.toml")
    assert (outcome.code, outcome.out) == (3, "")
    assert outcome.err == "storyledger: fault of the tool, please report it: KeyError: 'k'\n"


def test_an_interrupt_ends_with_one_line(monkeypatch: pytest.MonkeyPatch) -> None:
    def interrupted(*_: object) -> None:
        raise KeyboardInterrupt

    monkeypatch.setattr("xlbridge.cli.solve_command.read_building", interrupted)
    outcome = run("solve", "any.toml")
    assert (outcome.code, outcome.out, outcome.err.strip()) == (3, "", "storyledger: interrupted")


@pytest.mark.parametrize("command", ["", *COMMANDS])
def test_help_of_every_command(command: str) -> None:
    outcome = run(*command.split(), "--help")
    assert (outcome.code, outcome.err) == (0, "")
    assert outcome.out.startswith("Usage: storyledger")
    if not command:
        assert "engineer's judgement" in " ".join(outcome.out.split())
        listed = outcome.out.split("Commands:\n")[1].splitlines()
        assert [line.split()[0] for line in listed[: len(COMMANDS)]] == list(COMMANDS)
