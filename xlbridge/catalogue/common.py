"""Arguments that several worksheet functions share, so that one symbol reads the same everywhere."""

from __future__ import annotations

from engine.editions import EDITIONS
from engine.occupancy import DESIGN_CATEGORIES, RISK_CATEGORIES
from engine.require import YES_NO
from engine.units import SYSTEMS
from xlbridge.catalogue.entry import NOT_NEGATIVE, POSITIVE, Argument, Kind, Span

T = Argument("T", "time", "Fundamental period", POSITIVE)
T_L = Argument("T_L", "time", "Long-period transition period", POSITIVE)
S_DS = Argument("S_DS", "acceleration", "Design spectral acceleration at short periods", POSITIVE)
S_D1 = Argument("S_D1", "acceleration", "Design spectral acceleration at 1 s", POSITIVE)
S_1 = Argument("S_1", "acceleration", "Mapped MCE_R spectral acceleration at 1 s", NOT_NEGATIVE)
R = Argument("R", "none", "Response modification coefficient", Span(1))
C_d = Argument("C_d", "none", "Deflection amplification factor", Span(1))
Omega_0 = Argument("Omega_0", "none", "Overstrength factor", Span(1))
rho = Argument("rho", "none", "Redundancy factor", Span(1, 1.3))
TIR = Argument("TIR", "none", "Torsional irregularity ratio", Span(1))
I_e = Argument("I_e", "none", "Importance factor", Span(1))
k = Argument("k", "none", "Distribution exponent", Span(1, 2))
h_x = Argument("h_x", "length", "Height of level x above the base", POSITIVE)
h_at = Argument("h_x", "length", "Height of level x above the base, or 0 for the base", NOT_NEGATIVE)
h_sx = Argument("h_sx", "displacement", "Story height below level x, in the unit of the drift", POSITIVE)
weights = Argument(
    "weights", "force", "Effective seismic weights of all levels", NOT_NEGATIVE, Kind.LEVELS, symbol="w_i"
)
heights = Argument(
    "heights", "length", "Heights of all levels above the base", POSITIVE, Kind.LEVELS, symbol="h_i"
)
forces = Argument("forces", "force", "Story forces of all levels", kind=Kind.LEVELS, symbol="F_i")
edition = Argument(
    "edition",
    "text",
    "Edition of ASCE/SEI 7, as text (in a cell: format the cell as Text, or it turns into a date)",
    kind=Kind.CHOICE,
    choices=EDITIONS,
)
units = Argument(
    "units", "text", "Unit system: us (kip, ft, in) or si (kN, m, mm)", kind=Kind.CHOICE, choices=SYSTEMS
)
risk_category = Argument("risk_category", "text", "Risk category", kind=Kind.CHOICE, choices=RISK_CATEGORIES)
SDC = Argument("SDC", "text", "Seismic Design Category", kind=Kind.CHOICE, choices=DESIGN_CATEGORIES)


def question(name: str, text: str) -> Argument:
    """Return an argument that the engineer answers with yes or no."""
    return Argument(name, "text", text, kind=Kind.CHOICE, choices=YES_NO)
