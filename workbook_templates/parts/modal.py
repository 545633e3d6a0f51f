"""Modal response of the shear-building story model, beside the equivalent lateral forces."""

from __future__ import annotations

from workbook_templates.declare import (
    Block,
    Check,
    Figure,
    Headline,
    Part,
    Quantity,
    Role,
    Table,
    entry,
)
from xlbridge.catalogue.entry import Span

INPUT, CALC, RESULT = Role.INPUT, Role.CALCULATION, Role.RESULT
MODEL = "{w_x:all},{K_x:all},{h_x:all}"
_OF_MODE = f"{{mode_number}},{MODEL}"

MODE = Block(
    "Mode",
    (
        Quantity(
            "mode_number",
            "Mode",
            "none",
            INPUT,
            span=Span(1),
            symbol="m",
            stored="number",
            decimals=0,
            width=15,
            starter=lambda start: float(start.count - start.level + 1),
        ),
    ),
)

MODES = Block(
    "Modes",
    (
        Quantity("T_m", "Period", "time", RESULT, f"=ELF_MODE_PERIOD({_OF_MODE},{{units}})"),
        Quantity(
            "Gamma_m",
            "Participation factor",
            "none",
            CALC,
            f"=ELF_MODE_PARTICIPATION({_OF_MODE})",
        ),
        Quantity(
            "mass_m",
            "Share of the weight",
            "none",
            CALC,
            f"=ELF_MODE_MASS({_OF_MODE})",
            symbol="W_m/W",
            decimals=4,
        ),
        Quantity(
            "mass_sum",
            "Sum of the shares so far",
            "none",
            CALC,
            f"=ELF_MODE_MASS_SUM({_OF_MODE})",
            symbol="sum W_m/W",
            decimals=4,
        ),
        Quantity(
            "S_am",
            "Design spectral acceleration",
            "acceleration",
            CALC,
            "=ELF_SA({T_m},{S_DS},{S_D1},{T_L})",
            width=12,
        ),
        Quantity("C_sm", "Response coefficient", "none", CALC, "=ELF_MODE_CS({S_am},{R},{I_e})", decimals=4),
        Quantity(
            "V_m",
            "Base shear of the mode",
            "force",
            RESULT,
            f"=ELF_MODE_SHEAR({{mode_number}},0,{{C_sm}},{MODEL})",
        ),
    ),
    per_direction=True,
)

RULE = Block(
    "Modal comparison, on the shear-building story model",
    (
        entry(
            "combination", "ELF_MODAL_SHEAR.combination", rule="modal_combination", symbol="-", default="CQC"
        ),
        entry("damping", "ELF_CQC.damping", rule="modal_correlation", decimals=3, default=0.05),
        Quantity(
            "modes_used",
            "Modes in the comparison",
            "none",
            CALC,
            "=COUNT({mode_number:all})",
            rule="modes",
            symbol="-",
            decimals=0,
        ),
    ),
)

COMPARISON = Block(
    "Modal base shear and its scaling",
    (
        Quantity(
            "modes_needed",
            "Modes that hold 90 % of the weight",
            "none",
            CALC,
            f"=ELF_MODES_NEEDED(0.9,{MODEL})",
            symbol="-",
            decimals=0,
        ),
        Quantity(
            "modes_status",
            "Whether the modes are enough",
            "text",
            CALC,
            f"=ELF_MODES_STATUS({{modes_used}},{MODEL},{{units}})",
            symbol="-",
            lines=2,
        ),
        Quantity("V_t_srss", "Base shear, SRSS", "force", CALC, "=ELF_SRSS({V_m:all})", symbol="V_t, SRSS"),
        Quantity(
            "V_t_cqc",
            "Base shear, CQC",
            "force",
            CALC,
            "=ELF_CQC({V_m:all},{T_m:all},{damping})",
            symbol="V_t, CQC",
        ),
        Quantity(
            "V_t",
            "Base shear by the rule chosen",
            "force",
            RESULT,
            '=IF({combination}="SRSS",{V_t_srss},{V_t_cqc})',
            rule="modal_combination",
        ),
        Quantity(
            "modal_scale",
            "Factor on forces",
            "none",
            CALC,
            "=ELF_MODAL_SCALE({V},{V_t})",
            symbol="-",
            decimals=4,
        ),
        Quantity(
            "modal_drift_scale",
            "Factor on drifts",
            "none",
            CALC,
            "=ELF_MODAL_DRIFT_SCALE({V_t},{W},{S_1},{R},{I_e})",
            symbol="-",
            decimals=4,
        ),
    ),
    per_direction=True,
)

_MODES = "{mode_number:all},{C_sm:all}," + MODEL


def _shear(rule: str, height: str = "{h_x}") -> str:
    return f'=ELF_MODAL_SHEAR({height},{_MODES},"{rule}",{{damping}})'


STORIES = Block(
    "Modal response",
    (
        Quantity(
            "V_srss",
            "Story shear, SRSS",
            "force",
            CALC,
            _shear("SRSS"),
            symbol="V_x, SRSS",
            base=_shear("SRSS"),
        ),
        Quantity(
            "V_cqc", "Story shear, CQC", "force", CALC, _shear("CQC"), symbol="V_x, CQC", base=_shear("CQC")
        ),
        Quantity(
            "V_modal",
            "Story shear by the rule chosen, scaled",
            "force",
            RESULT,
            '={modal_scale}*IF({combination}="SRSS",{V_srss},{V_cqc})',
            rule="modal_scaling",
            symbol="V_x, modal",
            base='={modal_scale}*IF({combination}="SRSS",{V_srss},{V_cqc})',
            width=12,
        ),
        Quantity(
            "V_modal_ratio",
            "Modal over equivalent lateral force",
            "none",
            CALC,
            "={V_modal}/{V_x}",
            rule="modal_scaling",
            symbol="modal/ELF",
        ),
        Quantity(
            "Delta_modal",
            "Design story drift, modal, scaled",
            "displacement",
            RESULT,
            f"={{modal_drift_scale}}*{{C_d}}*ELF_MODAL_DRIFT({{h_x}},{_MODES},{{combination}},{{damping}})/{{I_e}}",
            symbol="Delta, modal",
            width=12,
        ),
    ),
    per_direction=True,
)

CHECKS = (
    Check("Modes are the first ones, each once", "=MAX({mode_number:all})", "=COUNT({mode_number:all})"),
    Check(
        "Modes that stand twice",
        '=SUMPRODUCT(({mode_number:all}<>"")*(COUNTIF({mode_number:all},{mode_number:all})>1))',
        "=0",
    ),
    Check(
        "Modal story shear at the base is the combination of the modes' base shears, SRSS",
        "={V_srss:base}",
        "={V_t_srss}",
        tolerance=1e-9,
        unit="force",
        per_direction=True,
    ),
    Check(
        "Modal story shear at the base is the combination of the modes' base shears, CQC",
        "={V_cqc:base}",
        "={V_t_cqc}",
        tolerance=1e-9,
        unit="force",
        per_direction=True,
    ),
    Check(
        "The modes hold at least 90 % of the weight",
        "=0.9",
        "=MAX({mass_sum:all})",
        "at most",
        tolerance=1e-9,
        per_direction=True,
        warning=True,
        decimals=3,
    ),
)

_TEXT = "modes of the story model: period, share of the weight, base shear"
PART = Part(
    "modal",
    "Modal comparison",
    criteria=(RULE, COMPARISON),
    bands=(STORIES,),
    tables=(
        Table(
            "Modes",
            "Modes of the story model",
            _TEXT,
            "mode",
            bands=(MODE, MODES),
            start=6,
            at_most_levels=True,
        ),
    ),
    checks=CHECKS,
    headlines=(Headline("Modal base shear V_t, before scaling", "force", "={V_t}"),),
    figures=(Figure("V_x", "Story shears: equivalent lateral force and modal", beside=("V_srss", "V_cqc")),),
    requires=("stiffness",),
)
