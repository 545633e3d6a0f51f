"""Short regular buildings: the S_DS that C_s may use, with its conditions as entries."""

from __future__ import annotations

from workbook_templates.declare import Block, Part, Quantity, Role, always, entry
from workbook_templates.parts.shared import STORIES

_CONDITIONS = "{N},{T},{regular},{redundant},{soft_site},{risk_category}"
_QUESTIONS = tuple(
    entry(key, f"ELF_SDS_CAP.{key}", rule="S_DS_cap", symbol="-", starter=always(value))
    for key, value in (("regular", False), ("redundant", False), ("soft_site", False))
)

#: what C_s is made of, for strength and for drift
_CAPPED = ("C_s_plateau", "C_s_min", "C_s", "governing_bound", "C_s_drift", "drift_bound")

CAP = Block(
    "S_DS in C_s",
    (
        Quantity(
            "S_DS_status",
            "Whether S_DS may be capped",
            "text",
            Role.CALCULATION,
            f"=ELF_SDS_CAP_STATUS({_CONDITIONS})",
            symbol="-",
            lines=2,
        ),
        Quantity(
            "S_DS_C",
            "S_DS that C_s uses; the category keeps S_DS",
            "acceleration",
            Role.CALCULATION,
            f"=ELF_SDS_CAP({{S_DS}},{_CONDITIONS})",
            symbol="S_DS, in C_s",
        ),
    ),
    per_direction=True,
)

PART = Part(
    "short_building",
    "Short regular buildings",
    criteria=(Block("Conditions of 12.8.1.3", _QUESTIONS), STORIES, CAP),
    takes={key: {"S_DS": "S_DS_C"} for key in _CAPPED},
    brought_by=("regular", "redundant", "soft_site"),
)
