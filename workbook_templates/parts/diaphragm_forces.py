"""Further forces of diaphragms: transfer forces, collectors, and how flexible the diaphragm is."""

from __future__ import annotations

from workbook_templates.declare import DIRECTIONS, YES_NO, Block, Check, Part, Quantity, Role, by_units, entry

INPUT, CALC, RESULT = Role.INPUT, Role.CALCULATION, Role.RESULT

TRANSFER_FORCES = Block(
    "Transfer forces",
    (
        entry(
            "F_transfer", "ELF_FPX_TRANSFER.F_transfer", "Transfer force", rule="F_px_transfer", default=0.0
        ),
        Quantity(
            "offset",
            "Out-of-plane offset here",
            "text",
            INPUT,
            choices=YES_NO,
            rule="F_px_transfer",
            default="no",
        ),
        Quantity(
            "F_px_transfer",
            "Diaphragm force with transfer",
            "force",
            RESULT,
            "=ELF_FPX_TRANSFER({F_px},{F_transfer},{rho},{Omega_0},{offset})",
            symbol="F_px + transfer",
            width=13,
        ),
    ),
    per_direction=True,
)
TRANSFER = Part(
    "transfer",
    "Transfer forces",
    bands=(TRANSFER_FORCES,),
    brought_by=tuple(f"{key}_{d}" for key in ("F_transfer", "offset") for d in DIRECTIONS),
    requires=("diaphragm",),
)

_EFFECTS = "({E_story},{E_sum},{E_low},{Omega_0},{light_frame})"
COLLECTOR_FORCES = Block(
    "Collectors",
    (
        entry(
            "E_story",
            "ELF_COLLECTOR.E_story",
            "Effect of the story forces",
            rule="collector",
            starter=by_units(20.0, 90.0),
            width=12,
        ),
        entry(
            "E_sum",
            "ELF_COLLECTOR.E_sum",
            "Effect of F_px without limits",
            rule="collector",
            starter=by_units(22.0, 100.0),
            width=12,
        ),
        entry(
            "E_low",
            "ELF_COLLECTOR.E_low",
            "Effect of the lower limit of F_px",
            rule="collector",
            starter=by_units(25.0, 110.0),
            width=12,
        ),
        Quantity("F_collector", "Collector force", "force", RESULT, f"=ELF_COLLECTOR{_EFFECTS}", width=12),
        Quantity(
            "collector_governs",
            "Which effect governs",
            "text",
            CALC,
            f"=ELF_COLLECTOR_GOVERNS{_EFFECTS}",
            symbol="collector governs",
            width=34,
        ),
    ),
    per_direction=True,
)
COLLECTORS = Part(
    "collectors",
    "Collectors",
    criteria=(
        Block(
            "Collectors",
            (entry("light_frame", "ELF_COLLECTOR.light_frame", rule="collector", symbol="-", default=False),),
            per_direction=True,
        ),
    ),
    bands=(COLLECTOR_FORCES,),
    needs=tuple(f"{key}_{d}" for key in ("E_story", "E_sum", "E_low") for d in DIRECTIONS),
)

_DEFLECTIONS = "({delta_MDD},{Delta_ADVE})"
FLEXIBILITY = Part(
    "diaphragm_flexibility",
    "Flexibility of diaphragms",
    bands=(
        Block(
            "Flexibility of diaphragms",
            (
                entry(
                    "delta_MDD",
                    "ELF_FLEX_RATIO.delta_MDD",
                    starter=by_units(0.2, 5.0),
                    rule="flexible_diaphragm",
                ),
                entry(
                    "Delta_ADVE",
                    "ELF_FLEX_RATIO.Delta_ADVE",
                    starter=by_units(0.25, 6.0),
                    rule="flexible_diaphragm",
                ),
                Quantity(
                    "flex_ratio",
                    "Deflection over drift",
                    "none",
                    CALC,
                    f"=ELF_FLEX_RATIO{_DEFLECTIONS}",
                    symbol="delta_MDD/Delta_ADVE",
                    width=14,
                ),
                Quantity(
                    "flex_status",
                    "Flexible or not",
                    "text",
                    CALC,
                    f"=ELF_FLEX_STATUS{_DEFLECTIONS}",
                    symbol="diaphragm",
                    width=25,
                ),
            ),
            per_direction=True,
        ),
    ),
    checks=(
        Check(
            "Levels with a flexible diaphragm",
            '=COUNTIF({flex_status:all},"flexible")',
            "=0",
            per_direction=True,
            warning=True,
        ),
    ),
    needs=tuple(f"{key}_{d}" for key in ("delta_MDD", "Delta_ADVE") for d in DIRECTIONS),
)
