"""Other procedures for diaphragms: the alternative one (12.10.3), and that of one-story buildings (7-22)."""

from __future__ import annotations

from workbook_templates.declare import Block, Check, Part, Quantity, Role, always, entry
from workbook_templates.parts.shared import STORIES
from xlbridge.catalogue.entry import Span

INPUT, CALC, RESULT = Role.INPUT, Role.CALCULATION, Role.RESULT


def _coefficient(key: str, text: str, formula: str) -> Quantity:
    return Quantity(key, text, "none", CALC, formula, decimals=4)


FACTORS = Block(
    "Alternative diaphragm procedure",
    (
        entry(
            "mode_shape",
            "ELF_ZS.system",
            "System, for z_s",
            rule="z_s",
            symbol="-",
            starter=always("all other"),
        ),
        entry(
            "diaphragm_type",
            "ELF_RS.diaphragm",
            "Diaphragm, for R_s",
            rule="R_s",
            symbol="-",
            starter=always("cast-in-place concrete shear"),
        ),
        Quantity(
            "R_s_entered",
            "R_s of your own, such as for steel deck (blank: that of the table)",
            "none",
            INPUT,
            span=Span(0, low_open=True),
            rule="R_s",
            symbol="R_s, entered",
            decimals=2,
        ),
        entry("c_m1", "ELF_GM1.c_m1", rule="G_m1", decimals=2, default=0.5),
        Quantity("z_s", "Mode shape factor", "none", CALC, "=ELF_ZS({mode_shape})", decimals=2),
        Quantity(
            "R_s",
            "Design force reduction factor",
            "none",
            CALC,
            "=IF(ISBLANK({R_s_entered}),ELF_RS({diaphragm_type}),{R_s_entered})",
            decimals=2,
        ),
        _coefficient("G_m1", "First mode contribution factor", "=ELF_GM1({z_s},{N},{c_m1})"),
        _coefficient("G_m2", "Higher mode contribution factor", "=ELF_GM2({z_s},{N})"),
        _coefficient("C_s2", "Higher mode response coefficient", "=ELF_CS_HIGHER({N},{S_DS},{S_D1},{I_e})"),
        _coefficient("C_p0", "Acceleration coefficient at the base", "=ELF_CP0({S_DS},{I_e})"),
        _coefficient("C_pi", "The same at 0.8 h_n", "=ELF_CPI({C_p0},{G_m1},{Omega_0},{C_s})"),
        _coefficient("C_pn", "The same at the top", "=ELF_CPN({C_pi},{G_m1},{Omega_0},{C_s},{G_m2},{C_s2})"),
    ),
    per_direction=True,
)

FORCES = Block(
    "Alternative diaphragm forces",
    (
        _coefficient("C_px", "Acceleration coefficient", "=ELF_CPX({h_x},{h_n},{N},{C_p0},{C_pi},{C_pn})"),
        Quantity(
            "F_px_alt",
            "Diaphragm force, alternative",
            "force",
            RESULT,
            "=ELF_FPX_ALT({C_px},{w_px},{R_s},{S_DS},{I_e})",
            symbol="F_px, alternative",
            width=12,
        ),
        Quantity(
            "F_px_alt_bound",
            "Which governs it",
            "text",
            CALC,
            '=IF({F_px_alt}>{C_px}*{w_px}/{R_s}*(1+1E-12),"the minimum","C_px w_px/R_s")',
            rule="F_px_alternative",
            symbol="alternative governs",
            width=16,
        ),
    ),
    per_direction=True,
)

ALTERNATIVE = Part(
    "alternative_diaphragm",
    "Alternative diaphragm procedure",
    criteria=(STORIES, FACTORS),
    bands=(FORCES,),
    brought_by=("mode_shape", "diaphragm_type", "R_s_entered"),
    requires=("diaphragm",),
)

ONE_STORY = Part(
    "one_story_diaphragm",
    "One-story buildings with flexible diaphragms, 7-22",
    criteria=(
        Block(
            "Flexible diaphragm of a one-story building",
            (
                entry("R_diaph", "ELF_CS_DIAPH.R_diaph", rule="C_s_diaph", decimals=2, starter=always(1.5)),
                entry("T_diaph", "ELF_CS_DIAPH.T_diaph", rule="C_s_diaph", starter=always(0.3)),
                _coefficient(
                    "C_s_diaph",
                    "Response coefficient of the diaphragm",
                    "=ELF_CS_DIAPH({S_DS},{S_D1},{I_e},{R_diaph},{T_diaph})",
                ),
                Quantity(
                    "V_diaph",
                    "Shear of the diaphragm",
                    "force",
                    RESULT,
                    "=ELF_V({C_s_diaph},{W})",
                    rule="C_s_diaph",
                ),
            ),
            per_direction=True,
        ),
    ),
    checks=(
        Check(
            "Levels, where the procedure for one-story buildings is used",
            "=COUNT({h_x:all})",
            "=1",
            warning=True,
        ),
    ),
    editions=("7-22",),
    brought_by=("R_diaph", "T_diaph"),
)
