"""Ground motion: design parameters from mapped values, by the procedure of each edition."""

from __future__ import annotations

from workbook_templates.declare import Block, Check, Part, Quantity, Role, always, entry

CALC = Role.CALCULATION

DESIGN = (
    Quantity(
        "S_DS", "Design spectral acceleration at short periods", "acceleration", CALC, "=ELF_SDS({S_MS})"
    ),
    Quantity("S_D1", "Design spectral acceleration at 1 s", "acceleration", CALC, "=ELF_SD1({S_M1})"),
)

_EXCEPTIONS = "{short_exception},{long_exception}"
SITE = Block(
    "Ground motion from mapped values and site class",
    (
        entry("S_S", "ELF_FA.S_S", rule="hazard_analysis", starter=always(1.0)),
        entry("site_class", "ELF_FA.site_class", rule="F_a", symbol="-", starter=always("D default")),
        entry("isolated", "ELF_SITE_TRIGGER.isolated", rule="hazard_analysis", symbol="-", default=False),
        entry(
            "short_exception",
            "ELF_SITE_TRIGGER.short_exception",
            "Exception of 11.4.8 used at short periods",
            rule="F_a",
            symbol="-",
            default="none",
        ),
        entry(
            "long_exception",
            "ELF_SITE_TRIGGER.long_exception",
            "Exception of 11.4.8 used at long periods",
            rule="C_s_increase",
            symbol="-",
            default="none",
        ),
        Quantity(
            "F_a",
            "Site coefficient at short periods",
            "none",
            CALC,
            "=ELF_FA({S_S},{site_class},{short_exception})",
        ),
        Quantity("F_v", "Site coefficient at long periods", "none", CALC, "=ELF_FV({S_1},{site_class})"),
        Quantity(
            "S_MS", "MCE_R acceleration at short periods", "acceleration", CALC, "=ELF_SMS({S_S},{F_a})"
        ),
        Quantity(
            "S_M1",
            "MCE_R acceleration at 1 s",
            "acceleration",
            CALC,
            "=ELF_SM1({S_1},{F_v},{long_exception})",
        ),
        Quantity(
            "hazard_status",
            "What still demands a site-specific analysis",
            "text",
            Role.VERDICT,
            '=SUBSTITUTE("✗ "&ELF_SITE_TRIGGER({S_S},{S_1},{site_class},{isolated},'
            f'{_EXCEPTIONS},MAX(T_X,T_Y),{{T_S}}),"✗ none","✓ none")',
            symbol="-",
            lines=2,
        ),
        Quantity(
            "SDC_A_permitted",
            "Low values: Seismic Design Category A is permitted",
            "text",
            CALC,
            "=ELF_SDC_A_PERMITTED({S_S},{S_1})",
            symbol="-",
        ),
    ),
)

INCREASE = Block(
    "Increase of C_s by exception 2 of 11.4.8",
    (
        Quantity(
            "C_s_increase",
            "Factor on the upper bounds of C_s",
            "none",
            CALC,
            "=ELF_CS_INCREASE({T},{T_S},{long_exception})",
            symbol="-",
            decimals=4,
        ),
    ),
    per_direction=True,
)

_UPPER = "{C_s_increase}*MIN({C_s_plateau},{C_s_cap})"
_BOUNDS = "({S_DS},{S_D1},{S_1},{T},{T_L},{R},{I_e},{edition})"
RESPONSE = (
    Quantity(
        "C_s",
        "Seismic response coefficient",
        "none",
        Role.RESULT,
        f"=MAX({_UPPER},{{C_s_min}},{{C_s_min_S1}})",
        rule="C_s",
        decimals=4,
    ),
    Quantity(
        "governing_bound",
        "Which bound governs",
        "text",
        CALC,
        f"=IF(AND({{C_s_increase}}>1,{_UPPER}>=MAX({{C_s_min}},{{C_s_min_S1}})),"
        f'"upper bound increased, exception 2 of 11.4.8",ELF_CS_GOVERNS{_BOUNDS})',
        symbol="-",
    ),
)
_INCREASE_DRIFT = "ELF_CS_INCREASE({T_drift},{T_S},{long_exception})"
_UPPER_DRIFT = f"{_INCREASE_DRIFT}*MIN({{C_s_plateau}},{{C_s_cap_drift}})"
_BOUNDS_DRIFT = "({S_DS},{S_D1},{S_1},{T_drift},{T_L},{R},{I_e},{edition})"
FOR_DRIFT = (
    Quantity(
        "C_s_drift",
        "Seismic response coefficient, without the minimum 0.044 S_DS I_e",
        "none",
        Role.RESULT,
        f"=MAX({_UPPER_DRIFT},{{C_s_min_S1}})",
        rule="drift_forces",
        symbol="C_s, drift",
        decimals=4,
    ),
    Quantity(
        "drift_bound",
        "Which bound governs it",
        "text",
        CALC,
        f"=IF(AND({_INCREASE_DRIFT}>1,{_UPPER_DRIFT}>={{C_s_min_S1}}),"
        f'"upper bound increased, exception 2 of 11.4.8",ELF_CS_DRIFT_GOVERNS{_BOUNDS_DRIFT})',
        symbol="-",
    ),
)

CHECKS = (
    Check(
        "A site-specific analysis is demanded: take S_DS and S_D1 from it, or use an exception",
        '=IF(LEFT({hazard_status},1)="✗",1,0)',
        "=0",
    ),
)

COEFFICIENTS = Part(
    "site_class",
    "Ground motion, 7-16",
    criteria=(SITE, INCREASE),
    replaces=(*DESIGN, *RESPONSE, *FOR_DRIFT),
    checks=CHECKS,
    editions=("7-16",),
    brought_by=("S_S", "site_class"),
    excludes=("mapped_motion",),
)

MAPPED = Part(
    "mapped_motion",
    "Ground motion, 7-22",
    criteria=(
        Block(
            "Ground motion for the site class",
            (
                entry("S_MS", "ELF_SDS.S_MS", rule="S_DS", starter=always(1.5)),
                entry("S_M1", "ELF_SD1.S_M1", rule="S_D1", starter=always(0.75)),
            ),
        ),
    ),
    replaces=DESIGN,
    editions=("7-22",),
    brought_by=("S_MS", "S_M1"),
)
