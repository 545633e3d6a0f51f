"""The cap on S_DS: each condition on both sides of its limit, and every one named that fails."""

from __future__ import annotations

from itertools import product

import pytest

from engine.base_shear import S_DS_cap_status, capped_S_DS
from engine.base_shear.short_buildings import FAILURES

HOLDS = {
    **{"regular": "yes", "N": 5, "T": 0.5, "redundant": "yes", "soft_site": "no"},
    "risk_category": "II",
}
FAILS = {"regular": "no", "N": 6, "T": 0.501, "redundant": "no", "soft_site": "yes", "risk_category": "III"}


@pytest.mark.parametrize("failing", list(product((False, True), repeat=6)))
def test_every_combination_of_conditions(failing):
    answers = {key: (FAILS if fails else HOLDS)[key] for key, fails in zip(HOLDS, failing, strict=True)}
    named = "; ".join(text for text, fails in zip(FAILURES, failing, strict=True) if fails)
    assert S_DS_cap_status(**answers) == (f"not permitted: {named}" if named else "permitted")
    assert capped_S_DS(S_DS=1.6, **answers) == (1.6 if named else pytest.approx(1.12))


@pytest.mark.parametrize(
    ("S_DS", "used"), [(0.9, 0.9), (1.0, 1.0), (1.2, 1.0), (1 / 0.7, 1.0), (1.5, 1.05), (2.0, 1.4)]
)
def test_the_cap_is_one_and_never_below_seven_tenths(S_DS, used):
    assert capped_S_DS(S_DS=S_DS, **HOLDS) == pytest.approx(used)


@pytest.mark.parametrize(("category", "used"), [("I", 1.0), ("II", 1.0), ("III", 1.4), ("IV", 1.4)])
def test_each_risk_category(category, used):
    assert capped_S_DS(S_DS=1.4, **{**HOLDS, "risk_category": category}) == pytest.approx(used)


def test_several_buildings_at_once():
    answers = {**HOLDS, "N": [4, 6], "T": [[0.3], [0.7]]}
    assert capped_S_DS(S_DS=1.4, **answers).tolist() == [[1.0, 1.4], [1.4, 1.4]]
    assert S_DS_cap_status(**answers).tolist()[1] == [
        "not permitted: T above 0.5 s",
        "not permitted: more than 5 stories; T above 0.5 s",
    ]
