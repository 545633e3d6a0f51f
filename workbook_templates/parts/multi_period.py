"""Multi-period spectrum: pasted ordinates, S_DS and S_D1 by 21.4, and Method 1 of the response coefficient.

Both editions take S_DS and S_D1 from a spectrum; the spectrum itself is one of 7-22, and a site-specific one
in 7-16, with a floor of the mapped procedure.
"""

from __future__ import annotations

from workbook_templates.declare import (
    Block,
    Check,
    Curve,
    Part,
    Quantity,
    Role,
    Start,
    Table,
    always,
    by_units,
    entry,
)
from xlbridge.catalogue.entry import NOT_NEGATIVE, POSITIVE

INPUT, CALC, RESULT = Role.INPUT, Role.CALCULATION, Role.RESULT
#: the periods of 11.4.5.1
PERIODS = (
    *(0.0, 0.01, 0.02, 0.03, 0.05, 0.075, 0.1, 0.15, 0.2, 0.25, 0.3),
    *(0.4, 0.5, 0.75, 1.0, 1.5, 2.0, 3.0, 4.0, 5.0, 7.5, 10.0),
)
#: what the pasted ordinates are
GIVEN = ("MCE_R", "design")
METHODS = ("method 2", "method 1")


def _period(start: Start) -> float:
    return PERIODS[(start.count - start.level) % len(PERIODS)]


def _ordinate(start: Start) -> float:
    """An invented MCE_R spectrum: up to a plateau of 1.5 g, then falling as 0.9 g/T."""
    T = _period(start)
    return round(min(0.6 + 9.0 * T, 1.5, 0.9 / max(T, 0.01)), 4)


ORDINATES = Block(
    "Multi-period spectrum",
    (
        Quantity(
            "T_i",
            "Period",
            "time",
            INPUT,
            span=NOT_NEGATIVE,
            stored="T",
            width=15,
            decimals=3,
            starter=_period,
        ),
        Quantity(
            "S_a_given",
            "Ordinate as given",
            "acceleration",
            INPUT,
            span=POSITIVE,
            symbol="S_a, given",
            stored="S_a",
            width=15,
            starter=_ordinate,
        ),
        Quantity(
            "S_ai",
            "Design ordinate",
            "acceleration",
            RESULT,
            '=IF({ordinates_given}="design",{S_a_given},ELF_SA_DESIGN({S_a_given}))',
            width=15,
        ),
        Quantity(
            "S_aMi", "Ordinate of MCE_R", "acceleration", CALC, "=ELF_SAM({S_ai})", symbol="S_aM", width=15
        ),
    ),
)
_TEXT = "the spectrum that S_DS and S_D1 are taken from, period by period"
TABLE = Table("Motion", "Spectrum as given", _TEXT, "multi_period", bands=(ORDINATES,), start=len(PERIODS))

_COMMON = (
    Quantity(
        "ordinates_given",
        "What the ordinates given are",
        "text",
        INPUT,
        choices=GIVEN,
        symbol="-",
        default=GIVEN[0],
    ),
    entry("v_s", "ELF_SD1_MULTI.v_s", rule="S_D1_spectrum", decimals=0, starter=by_units(900.0, 275.0)),
    entry("reading", "ELF_SD1_MULTI.reading", rule="S_D1_spectrum", symbol="-", default="listed periods"),
)
_PAIRS = "{T_i:all},{S_ai:all}"
_SHORT = f"ELF_SDS_MULTI({_PAIRS})"
_SECOND = f"ELF_SD1_MULTI({_PAIRS},{{v_s}},{{units}},{{edition}},{{reading}})"
_MCE = (
    Quantity("S_MS", "MCE_R acceleration at short periods", "acceleration", CALC, "=ELF_SAM({S_DS})"),
    Quantity("S_M1", "MCE_R acceleration at 1 s", "acceleration", CALC, "=ELF_SAM({S_D1})"),
)


def _design(short: str, second: str) -> tuple[Quantity, Quantity]:
    """Return what takes the place of the entries of S_DS and S_D1."""
    return (
        Quantity("S_DS", "Design spectral acceleration at short periods", "acceleration", CALC, short),
        Quantity("S_D1", "Design spectral acceleration at 1 s", "acceleration", CALC, second),
    )


_AT_T = f"({{T}},{_PAIRS},{{T_L}},{{tail}})"
_MULTI = "({S_a_method1},{S_DS},{S_1},{R},{I_e},{edition})"
_TWO = "({S_DS},{S_D1},{S_1},{T},{T_L},{R},{I_e},{edition})"
METHOD = Block(
    "Method of the response coefficient",
    (
        Quantity(
            "C_s_method",
            "Method of 12.8.1.1: 2, two-period, or 1, multi-period spectrum",
            "text",
            INPUT,
            choices=METHODS,
            rule="C_s_method1",
            symbol="-",
            default=METHODS[0],
        ),
        Quantity(
            "S_a_multi", "Design spectral acceleration at T", "acceleration", CALC, f"=ELF_SA_MULTI{_AT_T}"
        ),
        Quantity(
            "S_a_method1",
            "Ordinate for Method 1: left of the peak, the peak",
            "acceleration",
            CALC,
            f"=ELF_SA_METHOD1{_AT_T}",
        ),
        Quantity(
            "C_s_spectrum",
            "Method 1: S_a over R/I_e",
            "none",
            CALC,
            "=ELF_CS_MULTI_BOUND({S_a_method1},{R},{I_e})",
            decimals=4,
        ),
    ),
    per_direction=True,
)
RESPONSE = (
    Quantity(
        "C_s",
        "Seismic response coefficient",
        "none",
        RESULT,
        f'=IF({{C_s_method}}="{METHODS[1]}",ELF_CS_MULTI{_MULTI},ELF_CS{_TWO})',
        rule="C_s",
        decimals=4,
    ),
    Quantity(
        "governing_bound",
        "Which bound governs",
        "text",
        CALC,
        f'=IF({{C_s_method}}="{METHODS[1]}",ELF_CS_MULTI_GOVERNS{_MULTI},ELF_CS_GOVERNS{_TWO})',
        rule="C_s",
        symbol="-",
    ),
)
_MULTI_DRIFT = "({S_a_drift},{S_1},{R},{I_e},{edition})"
_TWO_DRIFT = "({S_DS},{S_D1},{S_1},{T_drift},{T_L},{R},{I_e},{edition})"
FOR_DRIFT = (
    Quantity(
        "S_a_drift",
        "Ordinate for Method 1 at this period",
        "acceleration",
        CALC,
        f"=ELF_SA_METHOD1({{T_drift}},{_PAIRS},{{T_L}},{{tail}})",
        symbol="S_a, drift",
    ),
    Quantity(
        "C_s_drift",
        "Seismic response coefficient, without the minimum 0.044 S_DS I_e",
        "none",
        RESULT,
        f'=IF({{C_s_method}}="{METHODS[1]}",ELF_CS_DRIFT_MULTI{_MULTI_DRIFT},ELF_CS_DRIFT{_TWO_DRIFT})',
        rule="drift_forces",
        symbol="C_s, drift",
        decimals=4,
    ),
    Quantity(
        "drift_bound",
        "Which bound governs it",
        "text",
        CALC,
        f'=IF({{C_s_method}}="{METHODS[1]}",ELF_CS_DRIFT_MULTI_GOVERNS{_MULTI_DRIFT},'
        f"ELF_CS_DRIFT_GOVERNS{_TWO_DRIFT})",
        rule="drift_forces",
        symbol="-",
    ),
)

#: the modal comparison reads the same spectrum
MODAL = Quantity(
    "S_am",
    "Design spectral acceleration",
    "acceleration",
    CALC,
    f"=ELF_SA_MULTI({{T_m}},{_PAIRS},{{T_L}},{{tail}})",
    width=12,
)

CHECKS = (
    Check("Every period has an ordinate", "=COUNT({S_a_given:all})", "=COUNT({T_i:all})"),
    Check(
        "Periods that stand twice",
        '=SUMPRODUCT(({T_i:all}<>"")*(COUNTIF({T_i:all},{T_i:all})>1))',
        "=0",
    ),
)

PART = Part(
    "multi_period",
    "Multi-period spectrum, 7-22",
    criteria=(
        Block(
            "Multi-period spectrum",
            (
                *_COMMON,
                entry("tail", "ELF_SA_MULTI.tail", rule="S_a_multi", symbol="-", default="as printed"),
                *_MCE,
            ),
        ),
        METHOD,
    ),
    tables=(TABLE,),
    replaces=(*_design(f"={_SHORT}", f"={_SECOND}"), *RESPONSE, *FOR_DRIFT, MODAL),
    checks=CHECKS,
    curves=(Curve("Multi-period spectrum", "T_i", ("S_ai", "S_aMi"), ("T", "S_a_multi")),),
    editions=("7-22",),
    excludes=("mapped_motion",),
)

SITE_SPECIFIC = Part(
    "site_specific",
    "Site-specific spectrum, 7-16",
    criteria=(
        Block(
            "Site-specific spectrum",
            (
                *_COMMON,
                entry(
                    "S_DS_mapped",
                    "ELF_SITE_FLOOR.S_mapped",
                    "S_DS by the mapped procedure; 80 % of it is the floor",
                    rule="S_floor",
                    starter=always(1.0),
                ),
                entry(
                    "S_D1_mapped",
                    "ELF_SITE_FLOOR.S_mapped",
                    "S_D1 by the mapped procedure; 80 % of it is the floor",
                    rule="S_floor",
                    starter=always(0.5),
                ),
                *_MCE,
            ),
        ),
    ),
    tables=(TABLE,),
    replaces=_design(
        f"=ELF_SITE_FLOOR({_SHORT},{{S_DS_mapped}})", f"=ELF_SITE_FLOOR({_SECOND},{{S_D1_mapped}})"
    ),
    checks=CHECKS,
    editions=("7-16",),
    excludes=("site_class",),
)
