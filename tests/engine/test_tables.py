"""The printed tables: checksums taken on the data files themselves, and what the loader refuses."""

from __future__ import annotations

import csv
from pathlib import Path

import pytest

import engine.tables
from engine.errors import NotApplicable
from engine.tables import parse, table

FOLDER = Path(engine.tables.__file__).parent


def cells(name):
    lines = (FOLDER / f"{name}.csv").read_text(encoding="utf-8").splitlines()
    return list(csv.DictReader(line for line in lines if not line.startswith("#")))


@pytest.mark.parametrize(
    ("name", "rows", "columns", "total"),
    [
        ("importance_factor", 4, ["I_e"], 4.75),
        ("period_coefficients", 5, ["C_t_us"], 0.124),
        ("period_coefficients", 5, ["C_t_si"], 0.314),
        ("period_coefficients", 5, ["x"], 3.95),
        ("upper_limit_coefficient", 5, ["S_D1"], 1.15),
        ("upper_limit_coefficient", 5, ["C_u"], 7.6),
        ("allowable_drift", 4, ["I", "II", "III", "IV"], 0.218),
        ("mode_shape_factor", 4, ["z_s"], 2.85),
        ("diaphragm_reduction", 6, ["R_s"], 9.6),
        ("load_combinations", 10, ["D", "E_h", "L"], 20.75),
        ("load_combinations", 10, ["E_v"], 1.05),
        ("load_combinations", 10, ["S"], 1.2),
        ("systems", 92, ["R"], 435.5),
        ("systems", 92, ["Omega0"], 230.25),
        ("systems", 92, ["Cd"], 355.75),
    ],
)
def test_checksum_of_the_file(name, rows, columns, total):
    printed = cells(name)
    assert len(printed) == rows
    assert sum(float(row[column]) for row in printed for column in columns) == pytest.approx(total, abs=1e-9)


@pytest.mark.parametrize(
    "name",
    [
        *("importance_factor", "period_coefficients", "upper_limit_coefficient", "allowable_drift"),
        *("mode_shape_factor", "diaphragm_reduction", "load_combinations"),
        *("irregularity_types", "irregularity_consequences"),
    ],
)
def test_file_says_where_it_is_from(name):
    about = table(name).about
    assert set(about) == {"title", "source", "confidence", "lookup"}
    assert about["confidence"] in ("H", "M", "U")


def test_every_system_row_says_how_sure_it_is():
    assert {row["confidence_coefficients"] for row in cells("systems")} <= {"H", "M", "U"}
    assert {row["edition"] for row in cells("systems")} == {"7-16", "7-22 (added)"}


def test_a_blank_cell_is_refused():
    with pytest.raises(ValueError, match="row 2 has no I_e"):
        parse("t", "risk_category,I_e\nI,1.0\nII,\n")


def test_a_short_row_is_refused():
    with pytest.raises(ValueError, match="row 1 has 1 cells, 2 are due"):
        parse("t", "risk_category,I_e\nI\n")


def test_a_table_without_rows_is_refused():
    with pytest.raises(ValueError, match="no rows"):
        parse("t", "# title: t\nrisk_category,I_e\n")


def test_a_remark_may_be_blank():
    assert parse("t", "code,note\nA1,\n").rows[0]["note"] == ""


def test_an_unknown_row_is_refused():
    with pytest.raises(NotApplicable, match="one of I, II, III, IV"):
        table("importance_factor").entry("risk_category", "V", "I_e")


def test_an_unknown_column_is_refused():
    with pytest.raises(NotApplicable, match="not in the table"):
        table("importance_factor").entry("risk_category", "I", "I_p")


def test_si_and_us_coefficients_describe_one_curve():
    """C_t in metres is C_t in feet times 3.28084^x, as far as three printed digits go."""
    for row in cells("period_coefficients"):
        converted = float(row["C_t_us"]) * (1 / 0.3048) ** float(row["x"])
        assert float(row["C_t_si"]) == pytest.approx(converted, rel=3e-3)
