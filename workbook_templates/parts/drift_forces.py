"""Forces for drift: the relieved base shear at a period without its cap, and which forces the drifts go by.

The displacements of the story table come from one set of forces, those for strength or those for drift; the
stability coefficients take the story shears of the same set.
"""

from __future__ import annotations

from workbook_templates.declare import Block, Check, Headline, Part, Quantity, Role, entry

INPUT, CALC, RESULT = Role.INPUT, Role.CALCULATION, Role.RESULT

BASES = FOR_STRENGTH, FOR_DRIFT = "strength forces", "drift forces"
_CS = "({S_DS},{S_D1},{S_1},{T_drift},{T_L},{R},{I_e},{edition})"
_SHEAR = "=ELF_VX({h_x},{F_x_drift:all},{h_x:all})"


def _by_basis(strength: str, drift: str) -> str:
    """Return the formula that takes a quantity of the forces under which the displacements were computed."""
    return f'=IF({{drift_basis}}="{FOR_STRENGTH}",{strength},IF({{drift_basis}}="{FOR_DRIFT}",{drift},NA()))'


RESPONSE = Block(
    "Forces for drift",
    (
        Quantity(
            "drift_basis",
            "Forces under which the elastic displacements are computed",
            "text",
            INPUT,
            choices=BASES,
            rule="drift_forces",
            symbol="-",
            default=FOR_STRENGTH,
        ),
        entry(
            "drift_cap",
            "ELF_PERIOD_DRIFT.cap",
            "Period for drift: without the upper limit C_u T_a, or with it",
            rule="drift_period",
            symbol="-",
            default="without the cap",
        ),
        Quantity(
            "T_drift",
            "Period for drift",
            "time",
            CALC,
            "=ELF_PERIOD_DRIFT({T_a},{C_u},{T_calculated},{drift_cap})",
            symbol="T, drift",
        ),
        Quantity(
            "S_a_drift",
            "Design spectral acceleration at this period",
            "acceleration",
            CALC,
            "=ELF_SA({T_drift},{S_DS},{S_D1},{T_L})",
            symbol="S_a, drift",
        ),
        Quantity(
            "C_s_cap_drift",
            "Upper bound at this period",
            "none",
            CALC,
            "=ELF_CS_CAP({S_D1},{T_drift},{T_L},{R},{I_e})",
            symbol="C_s_cap, drift",
            decimals=4,
        ),
        Quantity(
            "C_s_drift",
            "Seismic response coefficient, without the minimum 0.044 S_DS I_e",
            "none",
            RESULT,
            f"=ELF_CS_DRIFT{_CS}",
            symbol="C_s, drift",
            decimals=4,
        ),
        Quantity(
            "drift_bound",
            "Which bound governs it",
            "text",
            CALC,
            f"=ELF_CS_DRIFT_GOVERNS{_CS}",
            symbol="-",
        ),
        Quantity(
            "V_drift", "Base shear for drift", "force", RESULT, "=ELF_V({C_s_drift},{W})", symbol="V, drift"
        ),
        Quantity(
            "k_drift",
            "Exponent of the vertical distribution",
            "none",
            CALC,
            "=ELF_EXPONENT({T_drift},{k_rule})",
            symbol="k, drift",
        ),
    ),
    per_direction=True,
)

FORCES = Block(
    "Forces for drift",
    (
        Quantity(
            "C_vx_drift",
            "Distribution factor, for drift",
            "none",
            CALC,
            "=ELF_CVX({w_x},{h_x},{w_x:all},{h_x:all},{k_drift})",
            symbol="C_vx, drift",
            decimals=4,
            total="sum",
            width=12,
        ),
        Quantity(
            "F_x_drift",
            "Story force, for drift",
            "force",
            RESULT,
            "=ELF_FX({V_drift},{C_vx_drift})",
            symbol="F_x, drift",
            total="sum",
            width=12,
        ),
        Quantity(
            "V_x_drift",
            "Story shear, for drift",
            "force",
            RESULT,
            _SHEAR,
            symbol="V_x, drift",
            base=_SHEAR,
            width=12,
        ),
        Quantity(
            "F_x_used",
            "Story force of the displacements",
            "force",
            Role.LINK,
            _by_basis("{F_x}", "{F_x_drift}"),
            rule="drift_forces",
            symbol="F_x, used",
            width=12,
        ),
        Quantity(
            "V_x_used",
            "Story shear of the displacements, for theta",
            "force",
            Role.LINK,
            _by_basis("{V_x}", "{V_x_drift}"),
            rule="drift_forces",
            symbol="V_x, used",
            width=12,
        ),
    ),
    per_direction=True,
)

PART = Part(
    "drift_forces",
    "Forces for drift",
    criteria=(RESPONSE,),
    bands=(FORCES,),
    takes={"theta": {"V_x": "V_x_used"}, "delta_xe": {"F_x": "F_x_used"}, "T_drift_short": {"T": "T_drift"}},
    checks=(
        Check(
            "Sum of F_x for drift is V for drift",
            "={F_x_drift:total}",
            "={V_drift}",
            tolerance=1e-9,
            unit="force",
            per_direction=True,
        ),
        Check(
            "Story shear for drift at the base is V for drift",
            "={V_x_drift:base}",
            "={V_drift}",
            tolerance=1e-9,
            unit="force",
            per_direction=True,
        ),
        Check(
            "Base shear for drift is not above that for strength",
            "={V_drift}",
            "={V}",
            "at most",
            tolerance=1e-9,
            unit="force",
            per_direction=True,
        ),
    ),
    headlines=(Headline("Base shear for drift", "force", "={V_drift}"),),
    brought_by=("drift_basis", "drift_cap"),
    requires=("drift", "periods"),
)
