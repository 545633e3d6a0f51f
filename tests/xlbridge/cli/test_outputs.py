"""What each command prints and leaves: exit codes, files, and the shapes of its JSON."""

from __future__ import annotations

import json
import tomllib
from pathlib import Path

import pytest
from openpyxl import Workbook, load_workbook

from engine.building import from_mapping, solve
from engine.vertical import distribution_factor, exponent
from tests.support.command import keys, run, unchanged
from workbook_templates.demo import building_text
from xlbridge.catalogue import CATALOGUE
from xlbridge.cli import CAUTION
from xlbridge.headless.builtins import BUILTINS

TEXT, NUMBER = "str", "float"


@pytest.fixture(scope="module")
def demo(tmp_path_factory: pytest.TempPathFactory) -> Path:
    folder = tmp_path_factory.mktemp("here") / "demo"
    outcome = run("demo", folder)
    assert (outcome.code, outcome.err) == (0, "")
    (folder / "said.txt").write_text(outcome.out, encoding="utf-8")
    return folder


def workbook(path: Path, **cells: object) -> Path:
    book = Workbook()
    for address, content in cells.items():
        book.active[address] = content
    book.save(path)
    return path


class TestDemo:
    def test_leaves_inputs_workbook_and_results(self, demo: Path) -> None:
        left = {"building.toml", "story.xlsx", "results.json", "audit.html", "said.txt"}
        assert {p.name for p in demo.iterdir()} == left
        assert "✓ nothing found" in (demo / "audit.html").read_text(encoding="utf-8")
        assert (demo / "building.toml").read_text(encoding="utf-8") == building_text()
        package = solve(from_mapping(tomllib.loads(building_text())))
        assert json.loads((demo / "results.json").read_text(encoding="utf-8")) == json.loads(
            json.dumps(package.to_json())
        )

    def test_says_what_the_workbook_says(self, demo: Path) -> None:
        said = (demo / "said.txt").read_text(encoding="utf-8")
        stored = load_workbook(demo / "story.xlsx", data_only=True)
        name = stored.defined_names["workbook_status"]
        ((sheet, address),) = name.destinations
        assert f"status in the workbook: {stored[sheet][address.replace('$', '')].value}" in said
        package = solve(from_mapping(tomllib.loads(building_text())))
        for direction, result in package.direction.items():
            over = result.drift_over_limit
            assert f"{direction}: V = {result.V:.1f}, T = {result.T:.3f} s, k = {result.k:.3f}" in said
            assert f"drift over limit {over.max():.3f} at {package.levels[int(over.argmax())]}" in said
        assert "results, 0 differ" in said

    def test_one_drift_is_above_its_limit_on_purpose(self, demo: Path) -> None:
        results = json.loads((demo / "results.json").read_text(encoding="utf-8"))
        assert max(results["direction"]["X"]["drift_over_limit"]) > 1
        assert max(results["direction"]["Y"]["drift_over_limit"]) < 1


class TestCalc:
    def test_a_clean_workbook(self, tmp_path: Path) -> None:
        book = workbook(tmp_path / "a.xlsx", A1=2, A2="=A1*3", A3='="kip "&A2')
        with unchanged(tmp_path, but=("a-computed.xlsx",)):
            outcome = run("calc", book)
        stored = load_workbook(tmp_path / "a-computed.xlsx", data_only=True).active
        assert (outcome.code, outcome.err) == (0, "")
        assert outcome.out.startswith(
            "2 of 2 formula cells computed, 0 with an error value, 0 not evaluated\n"
        )
        assert (stored["A2"].value, stored["A3"].value) == (6, "kip 6")

    def test_an_error_value_is_a_finding(self, tmp_path: Path) -> None:
        outcome = run("calc", workbook(tmp_path / "a.xlsx", A1="=ELF_EXPONENT(0)", A2="=1+1"))
        assert outcome.code == 1
        assert "2 of 2 formula cells computed, 1 with an error value" in outcome.out
        assert "Sheet!A1  #NUM!  ELF_EXPONENT: T = 0: must be above 0" in outcome.out
        assert load_workbook(tmp_path / "a-computed.xlsx", data_only=True).active["A1"].value == "#NUM!"

    def test_what_is_not_evaluated_is_incomplete_and_stored_as_an_error(self, tmp_path: Path) -> None:
        outcome = run("calc", workbook(tmp_path / "a.xlsx", A1="=NOSUCH(1)", A2="=1/0", A3="=A1+1"))
        assert outcome.code == 2
        assert "1 of 3 formula cells computed, 1 with an error value, 2 not evaluated" in outcome.out
        assert "Sheet!A1  not evaluated, because " in outcome.out
        stored = load_workbook(tmp_path / "a-computed.xlsx", data_only=True).active
        assert [stored[a].value for a in ("A1", "A2", "A3")] == ["#N/A", "#DIV/0!", "#N/A"]

    def test_the_copy_keeps_the_ending_of_the_workbook(self, tmp_path: Path) -> None:
        path = workbook(tmp_path / "a.xlsx", A1="=1+1")
        outcome = run("calc", path, "-o", tmp_path / "out.txt")
        assert outcome.code == 3
        assert "out.txt: the copy of a workbook keeps its ending, .xlsx" in outcome.err
        assert not (tmp_path / "out.txt").exists()

    def test_a_long_list_is_cut_and_says_so(self, tmp_path: Path) -> None:
        cells = {f"A{n}": f"=NOSUCH_{n}(1)" for n in range(1, 31)}
        outcome = run("calc", workbook(tmp_path / "a.xlsx", **cells))
        assert outcome.out.count("not evaluated, because") == 20
        assert "and 10 more reasons: see --json" in outcome.out

    def test_one_reason_is_one_line_and_our_own_functions_come_first(self, tmp_path: Path) -> None:
        cells = {f"A{n}": "=1/0" for n in range(1, 6)}
        outcome = run("calc", workbook(tmp_path / "a.xlsx", **cells, B1="=ELF_EXPONENT(0)"))
        assert outcome.out.splitlines()[1:3] == [
            "  Sheet!B1  #NUM!  ELF_EXPONENT: T = 0: must be above 0",
            "  Sheet!A1, Sheet!A2, Sheet!A3 and 2 more  #DIV/0!  division by zero",
        ]

    def test_json(self, tmp_path: Path) -> None:
        cells = {"A1": "=1/0", "A2": "=NOSUCH(1)", "A3": "=2*2", "A4": "=TRUE", "A5": '="σ"'}
        outcome = run("calc", workbook(tmp_path / "a.xlsx", **cells), "--json")
        record = json.loads(outcome.out)
        assert outcome.code == 2
        assert keys(record) == {
            "output": TEXT,
            "formula_cells": "int",
            "computed": "int",
            "errors": [{"cell": TEXT, "error": TEXT, "reason": TEXT}],
            "not_evaluated": [{"cell": TEXT, "reason": TEXT}],
            "values": {
                "Sheet": {
                    "A1": {"error": TEXT, "reason": TEXT},
                    "A2": {"error": TEXT, "reason": TEXT},
                    "A3": NUMBER,
                    "A4": "bool",
                    "A5": TEXT,
                }
            },
        }
        assert (record["formula_cells"], record["computed"]) == (5, 4)
        assert record["values"]["Sheet"]["A3"] == 4.0
        assert record["values"]["Sheet"]["A5"] == "σ"
        assert Path(record["output"]) == tmp_path / "a-computed.xlsx"


class TestNew:
    @pytest.mark.parametrize("edition", ["7-16", "7-22"])
    @pytest.mark.parametrize("units", ["us", "si"])
    @pytest.mark.parametrize("levels", [1, 5])
    def test_starts_with_marked_values(self, tmp_path: Path, edition: str, units: str, levels: int) -> None:
        book = tmp_path / "a.xlsx"
        outcome = run("new", book, "--edition", edition, "--units", units, "--levels", levels)
        assert (outcome.code, outcome.err) == (0, "")
        assert outcome.out == f"{book}: made for ASCE/SEI {edition}, units {units}\n"
        record = json.loads(run("calc", book, "--json").out)
        assert record["errors"] == record["not_evaluated"] == []
        assert "STARTER VALUES" in record["values"]["Cover"]["A2"]

    def test_an_issue_copy_calls_no_function_of_ours(self, tmp_path: Path, demo: Path) -> None:
        made = run("new", tmp_path / "a.xlsx", "--native", "--from", demo / "building.toml")
        assert (made.code, made.err) == (0, "")
        book = load_workbook(tmp_path / "a.xlsx")
        formulas = [c.value for s in book for row in s.iter_rows() for c in row if c.data_type == "f"]
        assert len(formulas) > 300
        assert not [text for text in formulas if "ELF_" in text]
        stored = load_workbook(tmp_path / "a.xlsx", data_only=True)
        called = load_workbook(demo / "story.xlsx", data_only=True)
        assert stored["Cover"]["C13"].value == pytest.approx(called["Cover"]["C13"].value, rel=1e-12)

    def test_two_builds_are_the_same_file(self, tmp_path: Path) -> None:
        for name in ("a.xlsx", "b.xlsx"):
            run("new", tmp_path / name)
        assert (tmp_path / "a.xlsx").read_bytes() == (tmp_path / "b.xlsx").read_bytes()


ONCE = (
    *("T_a", "C_u", "T_max", "T", "C_s_plateau", "C_s_cap", "C_s_min", "C_s_min_S1", "C_s", "V", "k"),
    *("V_base", "M_base", "beta_used", "theta_max"),
)
BY_LEVEL = (
    *("C_vx", "F_x", "V_x", "M_x", "F_px_unlimited", "F_px_min", "F_px_max", "F_px", "Delta_a", "delta_x"),
    *("Delta", "drift_ratio", "theta", "theta_factor", "Delta_amplified", "drift_over_limit"),
)
WORDS = {"governing_bound": TEXT, "F_px_bound": [TEXT], "theta_verdict": [TEXT]}
DIRECTION = WORDS | dict.fromkeys(ONCE, NUMBER) | {key: [NUMBER] for key in BY_LEVEL}
RECORD = ("name", "usage", "summary", "category", "equation", "native", "arguments", "result", "clauses")
ARGUMENT = ("name", "symbol", "unit", "text", "kind", "choices", "optional", "allowed")


class TestSolve:
    def test_json(self, demo: Path) -> None:
        record = json.loads(run("solve", demo / "building.toml", "--json").out)
        shape = keys(record)
        clauses, notes = shape.pop("clauses"), shape.pop("notes")
        assert shape == {
            **dict.fromkeys(["title", "edition", "units"], TEXT),
            **dict.fromkeys(["I_e", "T_0", "T_S", "W", "h_n"], NUMBER),
            **{key: [NUMBER] for key in ("w_x", "h_x", "h_sx")},
            "levels": [TEXT],
            "direction": {"X": DIRECTION, "Y": DIRECTION},
            "warnings": [],
        }
        assert set(clauses) >= {"C_s", "C_vx", "F_x", "V_x", "F_px", "Delta", "theta", "T_max"}
        assert set(clauses.values()) == set(notes.values()) == {TEXT}
        assert notes.keys() <= clauses.keys()

    def test_text_has_every_level_and_the_caution(self, demo: Path) -> None:
        outcome = run("solve", demo / "building.toml")
        package = solve(from_mapping(tomllib.loads(building_text())))
        assert (outcome.code, outcome.err) == (0, "")
        assert outcome.out.endswith(CAUTION + "\n")
        for result in package.direction.values():
            for name, F, V in zip(package.levels, result.F_x, result.V_x, strict=True):
                row = next(
                    r
                    for r in outcome.out.splitlines()
                    if r.startswith(name) and f" {F:.1f} " in r and f" {V:.1f} " in r
                )
                assert row
            assert f"V = {result.V:.6g} kip" in outcome.out

    def test_without_displacements_there_are_no_drift_columns(self, tmp_path: Path) -> None:
        lines = [n for n in building_text().splitlines() if not n.startswith(("P_x", "delta_xe"))]
        path = tmp_path / "b.toml"
        path.write_text("\n".join(lines), encoding="utf-8")
        outcome = run("solve", path)
        assert outcome.code == 0
        assert "Delta_a" not in outcome.out.split("From memory")[0]
        assert "theta" not in outcome.out.split("From memory")[0]
        assert "F_x [kip]" in outcome.out

    def test_a_warning_is_printed(self, tmp_path: Path) -> None:
        path = tmp_path / "b.toml"
        path.write_text(building_text().replace("elevation = 207.0", "elevation = 222.0"), encoding="utf-8")
        outcome = run("solve", path)
        assert outcome.code == 0
        assert "\n! " in outcome.out


class TestEval:
    def test_a_number_to_the_last_digit(self) -> None:
        outcome = run("eval", "=ELF_CVX(400,36,{500;450;400},{12;24;36},1.3)")
        value = distribution_factor(400, 36, [500, 450, 400], [12, 24, 36], 1.3)
        assert (outcome.code, outcome.err) == (0, "")
        assert float(outcome.out) == pytest.approx(float(value), rel=1e-14)

    @pytest.mark.parametrize(
        ("formula", "shown"),
        [
            ("=1+1", "2\n"),
            ("1+1", "2\n"),
            ('="a"&"b"', "ab\n"),
            ("=2>1", "TRUE\n"),
            ("={1,2;3,4}*2", "2\t4\n6\t8\n"),
        ],
    )
    def test_values_of_every_kind(self, formula: str, shown: str) -> None:
        outcome = run("eval", formula)
        assert (outcome.code, outcome.out, outcome.err) == (0, shown, "")

    def test_a_refusal_says_why(self) -> None:
        outcome = run("eval", "=ELF_EXPONENT(-1)")
        assert (outcome.code, outcome.err) == (1, "")
        assert outcome.out == "#NUM!\nbecause ELF_EXPONENT: T = -1: must be above 0\n"

    def test_one_bad_cell_of_a_range_leaves_the_others(self) -> None:
        outcome = run("eval", "=ELF_EXPONENT({1;0;2})")
        assert outcome.code == 1
        assert outcome.out.splitlines()[:3] == ["1.25", "#NUM!", "1.75"]
        assert "T = 0" in outcome.out

    @pytest.mark.parametrize("formula", ["=NOSUCH(1)", "=ELF_CS(", "=A1", "", "=OFFSET(A1,1,1)"])
    def test_what_is_not_evaluated_is_incomplete(self, formula: str) -> None:
        outcome = run("eval", formula)
        assert (outcome.code, outcome.err) == (2, "")
        assert outcome.out.startswith("not evaluated, because ")

    def test_work_shows_equation_numbers_and_clause(self) -> None:
        outcome = run("eval", "=ELF_EXPONENT(1.2)", "--work")
        k = exponent(1.2, "interpolate")
        assert outcome.out.splitlines()[0] == f"{float(k):.15g}"
        assert "0.75 + 0.5·1.2" in outcome.out
        assert "ASCE/SEI 7-16 12.8.3" in outcome.out
        assert "ASCE/SEI 7-22 12.8.3" in outcome.out

    def test_work_of_nested_calls_names_each(self) -> None:
        outcome = run("eval", "=ELF_FX(100,ELF_CVX(2,3,{1;2},{1.5;3},ELF_EXPONENT(0.3)))", "--work")
        assert outcome.code == 0
        assert [name for name in ("ELF_EXPONENT:", "ELF_CVX:", "ELF_FX:") if name in outcome.out] == [
            "ELF_EXPONENT:",
            "ELF_CVX:",
            "ELF_FX:",
        ]


class TestFunctions:
    def test_lists_every_function_of_the_catalogue(self) -> None:
        lines = run("functions").out.splitlines()
        assert [line.split()[0] for line in lines] == list(CATALOGUE)
        assert all(CATALOGUE[line.split()[0]].summary in line for line in lines)

    def test_a_page_holds_usage_arguments_and_clauses(self) -> None:
        page = run("functions", "elf_cvx").out
        entry = CATALOGUE["ELF_CVX"]
        assert page.startswith(entry.usage)
        assert all(argument.text in page for argument in entry.arguments)
        assert "ASCE/SEI 7-22 12.8.3, Eq. 12.8-13" in page

    def test_a_doubt_stands_on_the_page(self) -> None:
        assert "from memory" in run("functions", "ELF_CVX").out

    def test_every_page_can_be_printed(self) -> None:
        for name in CATALOGUE:
            outcome = run("functions", name)
            assert (outcome.code, outcome.err) == (0, ""), name
            assert "example: " in outcome.out

    def test_json(self) -> None:
        records = json.loads(run("functions", "--json").out)
        assert [record["name"] for record in records] == list(CATALOGUE)
        clause = {"clause": TEXT, "confidence": TEXT, "note": TEXT}
        for record in records:
            shape = keys(record)
            assert set(shape["example"]) == {"arguments", "result"}
            assert all(argument.keys() == shape["arguments"][0].keys() for argument in record["arguments"])
            assert shape["clauses"] in ({"7-16": clause, "7-22": clause}, {"7-16": clause}, {"7-22": clause})
            assert shape["result"] == {"symbol": TEXT, "unit": TEXT, "text": TEXT}
            assert tuple(shape) == (*RECORD, "checks", "example", "since")
            assert tuple(shape["arguments"][0]) == ARGUMENT
        assert json.loads(run("functions", "ELF_V", "--json").out) == [
            record for record in records if record["name"] == "ELF_V"
        ]

    def test_lists_the_built_in_functions(self) -> None:
        assert run("functions", "--builtins").out.splitlines() == sorted(BUILTINS)
        assert json.loads(run("functions", "--builtins", "--json").out) == sorted(BUILTINS)
        assert len(BUILTINS) >= 80


class TestSolveInWords:
    def test_what_exceeds_its_limit_and_what_is_doubtful_is_said(self, tmp_path: Path) -> None:
        (tmp_path / "demo.toml").write_text(building_text(), encoding="utf-8")
        lines = run("solve", tmp_path / "demo.toml").out.splitlines()
        assert [line for line in lines if line.startswith("! Level")] == [
            "! Level 3: drift is 1.146 times its limit"
        ]
        (doubts,) = (line for line in lines if line.startswith("From memory or uncertain"))
        assert {"theta_max", "C_u", "exponent_two"} <= set(doubts.rstrip(".").replace(":", ",").split(", "))
        assert "C_vx" not in doubts
