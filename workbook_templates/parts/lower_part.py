"""The lower part of the two-stage procedure: its levels, base shear, and forces with the reactions."""

from __future__ import annotations

from workbook_templates.declare import STARTER, Block, Quantity, Role, Start, always, by_units, entry
from xlbridge.catalogue.entry import ANY, NOT_NEGATIVE, Span

INPUT, LINK, CALC, RESULT = Role.INPUT, Role.LINK, Role.CALCULATION, Role.RESULT
STORY = {"us": 14.0, "si": 4.3}
LEVELS = 1  # of the lower part in a blank workbook


def _elevation(start: Start) -> float:
    """A level of a lower part whose top is the base of the story table, at 0."""
    return -STORY[start.units] * (start.count - start.level)


LEVEL = Block(
    "Levels of the lower part",
    (
        Quantity(
            "lower_name",
            "Level",
            "text",
            INPUT,
            symbol="x",
            stored="name",
            width=15,
            starter=lambda start: f"Podium {start.level}" if start.count > 1 else "Podium",
        ),
        Quantity(
            "lower_elevation",
            "Elevation",
            "length",
            INPUT,
            span=ANY,
            symbol="z_x",
            stored="elevation",
            total="max",
            starter=_elevation,
        ),
        Quantity(
            "lower_w",
            "Seismic weight",
            "force",
            INPUT,
            span=NOT_NEGATIVE,
            rule="W",
            symbol="w_x",
            stored="weight",
            total="sum",
            starter=by_units(2500.0, 11000.0),
        ),
        Quantity(
            "lower_source",
            "Source of the inputs in this row",
            "text",
            INPUT,
            symbol="source",
            stored="source",
            width=24,
            starter=always(STARTER),
        ),
        Quantity(
            "lower_h",
            "Height above the lower base",
            "length",
            CALC,
            "=ELF_HX({lower_elevation},{lower_base})",
            symbol="h_x",
            total="max",
        ),
    ),
)

_SHEAR = "=ELF_VX({lower_h},{lower_F:all},{lower_h:all})+{V_reaction}"
_MOMENT = (
    "=ELF_MX({lower_h},{lower_F:all},{lower_h:all})+{M_reaction}+{V_reaction}*({lower_h:total}-{lower_h})"
)
FORCES = Block(
    "Forces of the lower part",
    (
        Quantity(
            "lower_C_vx",
            "Distribution factor",
            "none",
            CALC,
            "=ELF_CVX({lower_w},{lower_h},{lower_w:all},{lower_h:all},{k_lower})",
            symbol="C_vx",
            decimals=4,
            total="sum",
        ),
        Quantity(
            "lower_F",
            "Story force of its own",
            "force",
            RESULT,
            "=ELF_FX({V_lower},{lower_C_vx})",
            symbol="F_x",
            total="sum",
        ),
        Quantity(
            "lower_V",
            "Story shear with the upper reaction",
            "force",
            RESULT,
            _SHEAR,
            rule="two_stage_reactions",
            symbol="V_x",
            base=_SHEAR,
            width=12,
        ),
        Quantity(
            "lower_M",
            "Overturning with the upper reaction",
            "moment",
            RESULT,
            _MOMENT,
            rule="two_stage_reactions",
            symbol="M_x",
            base=_MOMENT,
            width=13,
        ),
    ),
    per_direction=True,
)

BASE = Block(
    "Lower part",
    (
        Quantity(
            "lower_base",
            "Elevation of its base",
            "length",
            INPUT,
            span=ANY,
            symbol="z_0, lower",
            starter=by_units(-STORY["us"] * LEVELS, -STORY["si"] * LEVELS),
        ),
        Quantity(
            "h_n_lower", "Height of the lower part", "length", LINK, "={lower_h:total}", symbol="h_n, lower"
        ),
        Quantity(
            "W_lower",
            "Effective seismic weight of the lower part",
            "force",
            LINK,
            "={lower_w:total}",
            rule="W",
            symbol="W, lower",
        ),
    ),
)

_CS = "({S_DS},{S_D1},{S_1},{T_lower},{T_L},{R_lower},{I_e},{edition})"
LOWER = Block(
    "Base shear of the lower part",
    (
        entry("R_lower", "ELF_REACTION_FACTOR.R_lower", rule="R", decimals=2, starter=always(5.0)),
        entry("rho_lower", "ELF_REACTION_FACTOR.rho_lower", rule="rho", decimals=2, starter=always(1.0)),
        entry(
            "period_system_lower",
            "ELF_TA.system",
            "Row of the period table, lower part",
            rule="T_a",
            symbol="-",
            starter=always("all other"),
        ),
        Quantity(
            "T_a_lower",
            "Approximate period",
            "time",
            CALC,
            "=ELF_TA({h_n_lower},{period_system_lower},{units})",
            symbol="T_a, lower",
        ),
        Quantity(
            "T_lower_computed",
            "Period of the lower part from an analysis (blank: approximate)",
            "time",
            INPUT,
            span=Span(0, low_open=True),
            rule="T_max",
            symbol="T, lower",
        ),
        Quantity(
            "T_lower",
            "Period used",
            "time",
            RESULT,
            "=IF(ISBLANK({T_lower_computed}),{T_a_lower},ELF_PERIOD({T_a_lower},{C_u},{T_lower_computed}))",
            symbol="T used, lower",
        ),
        Quantity(
            "C_s_lower",
            "Seismic response coefficient",
            "none",
            RESULT,
            f"=ELF_CS{_CS}",
            symbol="C_s, lower",
            decimals=4,
        ),
        Quantity("C_s_lower_bound", "Which bound governs", "text", CALC, f"=ELF_CS_GOVERNS{_CS}", symbol="-"),
        Quantity(
            "V_lower",
            "Base shear of its own",
            "force",
            RESULT,
            "=ELF_V({C_s_lower},{W_lower})",
            symbol="V, lower",
        ),
        Quantity("k_lower", "Exponent", "none", CALC, "=ELF_EXPONENT({T_lower},{k_rule})", symbol="k, lower"),
        Quantity(
            "reaction_factor",
            "Factor on the reactions of the upper part",
            "none",
            RESULT,
            "=ELF_REACTION_FACTOR({R},{rho},{R_lower},{rho_lower})",
            symbol="-",
            decimals=4,
        ),
        Quantity(
            "V_reaction",
            "Shear that the upper part hands down",
            "force",
            RESULT,
            "={reaction_factor}*{V_x:base}",
            rule="two_stage_reactions",
            symbol="V, reaction",
        ),
        Quantity(
            "M_reaction",
            "Overturning that it hands down",
            "moment",
            RESULT,
            "={reaction_factor}*{M_x:base}",
            rule="two_stage_reactions",
            symbol="M, reaction",
        ),
    ),
    per_direction=True,
)
