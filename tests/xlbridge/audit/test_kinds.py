"""The catalogue of kinds is closed: each is used, each is explained, each is seen by a test."""

from __future__ import annotations

import re
from pathlib import Path

import pytest

from tests.support.command import run
from xlbridge.audit.finding import Observation, Place
from xlbridge.audit.kinds import KINDS, Kind

ROOT = Path(__file__).parents[3]
CODE = "\n".join(path.read_text("utf-8") for path in (ROOT / "xlbridge" / "audit").rglob("*.py"))
TESTS = "\n".join(
    path.read_text("utf-8") for path in (ROOT / "tests").rglob("*.py") if path.name != "test_kinds.py"
)


@pytest.mark.parametrize("kind", KINDS.values(), ids=list(KINDS))
def test_every_kind_is_used_and_seen_by_a_test(kind: Kind) -> None:
    assert f'"{kind.key}"' in CODE
    assert f'"{kind.key}"' in TESTS


@pytest.mark.parametrize("kind", KINDS.values(), ids=list(KINDS))
def test_every_kind_says_what_it_means_and_what_to_do(kind: Kind) -> None:
    for text in (kind.meaning, kind.remedy):
        assert re.fullmatch(r"[A-Z].+\.", text)
    assert not kind.title.endswith(".")


def test_an_unknown_kind_is_refused() -> None:
    with pytest.raises(ValueError, match="no kind"):
        Observation("anything", Place(), "words")


def test_the_command_lists_them_all() -> None:
    outcome = run("audit", "--kinds")
    assert (outcome.code, outcome.err) == (0, "")
    for kind in KINDS.values():
        assert f"{kind.key} ({kind.severity}, {kind.method}): {kind.title}" in outcome.out
        assert kind.remedy in outcome.out
