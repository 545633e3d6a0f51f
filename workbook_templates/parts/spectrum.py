"""Spectrum: the two-period design spectrum and that of MCE_R, period by period, with T of both directions."""

from __future__ import annotations

from workbook_templates.declare import Block, Check, Curve, Part, Quantity, Role, Start, Table
from xlbridge.catalogue.entry import NOT_NEGATIVE

PERIODS = (0.0, 0.05, 0.1, 0.15, 0.2, 0.3, 0.4, 0.5, 0.6, 0.8, 1.0, 1.5, 2.0, 3.0, 4.0, 6.0, 8.0, 10.0)


def _period(start: Start) -> float:
    return PERIODS[(start.count - start.level) % len(PERIODS)]


PERIOD = Block(
    "Spectrum at the periods used",
    (
        Quantity(
            "S_a_T",
            "Design spectral acceleration at T",
            "acceleration",
            Role.CALCULATION,
            "=ELF_SA({T},{S_DS},{S_D1},{T_L})",
        ),
    ),
    per_direction=True,
)

ORDINATES = Block(
    "Two-period spectrum",
    (
        Quantity(
            "spectrum_T",
            "Period",
            "time",
            Role.INPUT,
            span=NOT_NEGATIVE,
            symbol="T",
            stored="T",
            width=15,
            starter=_period,
        ),
        Quantity(
            "S_a",
            "Design spectral acceleration",
            "acceleration",
            Role.RESULT,
            "=ELF_SA({spectrum_T},{S_DS},{S_D1},{T_L})",
            width=15,
        ),
        Quantity("S_aM", "The same of MCE_R", "acceleration", Role.CALCULATION, "=ELF_SAM({S_a})", width=15),
    ),
)

CHECKS = (
    Check(
        "No ordinate of the design spectrum is above S_DS",
        "=MAX({S_a:all})",
        "={S_DS}",
        "at most",
        tolerance=1e-9,
        unit="acceleration",
    ),
)

PART = Part(
    "spectrum",
    "Spectrum",
    criteria=(PERIOD,),
    tables=(
        Table(
            "Spectrum",
            "Spectrum",
            "the two-period design spectrum and that of MCE_R",
            "spectrum",
            bands=(ORDINATES,),
            start=len(PERIODS),
        ),
    ),
    checks=CHECKS,
    curves=(Curve("Two-period spectrum", "spectrum_T", ("S_a", "S_aM"), ("T", "S_a_T")),),
)
