"""The coverage list: no capability without function, check value and place; what lacks one is named."""

from __future__ import annotations

from collections import Counter

import pytest

from tests.support import checked
from tests.support.check_values import rows
from tests.support.command import run
from xlbridge.catalogue import CATALOGUE, capabilities
from xlbridge.catalogue.checked import FILE, outside_checks
from xlbridge.cli import coverage

#: quotes the sources of the table's own rows
UNCHECKED = ("ELF_SYSTEM_SOURCE",)


def test_the_file_is_that_of_the_check_values() -> None:
    assert FILE.read_text(encoding="utf-8") == checked.text()


def test_every_category_belongs_to_one_capability() -> None:
    listed = Counter(word for capability in capabilities.CAPABILITIES for word in capability.categories)
    assert listed == dict.fromkeys({entry.category for entry in CATALOGUE.values()}, 1)


def test_every_function_is_listed_once_with_its_checks() -> None:
    lines, _ = coverage.coverage()
    listed = [line.split()[0] for line in lines if line.startswith("  ")]
    assert Counter(listed) == dict.fromkeys(CATALOGUE, 1)
    assert any(line.split() == ["ELF_T0", "3", "published;", "in", "story"] for line in lines)


def test_only_what_quotes_its_own_source_has_no_check_value() -> None:
    _, gaps = coverage.coverage()
    assert [gap for gap in gaps if gap.endswith(": no check value")] == [
        f"{name}: no check value" for name in UNCHECKED
    ]


@pytest.mark.parametrize(
    ("categories", "called", "gap"),
    [
        ((), {}, "A: no function"),
        (("Systems",), {}, "A: no place in the workbook"),
        (("Systems",), {"ELF_SYSTEM_R": ["systems"]}, None),
    ],
)
def test_a_capability_that_lacks_something_is_named(
    monkeypatch: pytest.MonkeyPatch,
    categories: tuple[str, ...],
    called: dict[str, list[str]],
    gap: str | None,
) -> None:
    lacking = (capabilities.Capability("A", "1", categories),)
    monkeypatch.setattr(coverage, "CAPABILITIES", lacking)
    monkeypatch.setattr(coverage, "_called", lambda: called)
    _, gaps = coverage.coverage()
    assert [found for found in gaps if found.startswith("A:")] == ([gap] if gap else [])


def test_a_capability_without_check_values_is_named(monkeypatch: pytest.MonkeyPatch) -> None:
    monkeypatch.setattr(coverage, "outside_checks", dict)
    _, gaps = coverage.coverage()
    assert "redundancy: no check value" in gaps
    assert "ELF_RHO: no check value" in gaps


def test_the_page_of_a_function_names_its_sources() -> None:
    page = run("functions", "ELF_CU").out
    sources = {row["source"] for _, row in rows() if row["function"].endswith("upper_limit_coefficient")}
    assert sources
    assert [source for source in sources if f"checked against {source} (" not in page] == []
    assert sum(check.values for check in outside_checks()["ELF_CU"]) >= 5


def test_the_lists_take_no_name() -> None:
    done = run("functions", "ELF_CU", "--coverage")
    assert (done.code, done.out) == (3, "")
    assert "take no name" in done.err
