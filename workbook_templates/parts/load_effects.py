"""Load effects: factors of the combinations with seismic effects, and the effects on members."""

from __future__ import annotations

from engine.editions import EDITIONS
from workbook_templates.declare import DIRECTIONS, Block, Part, Quantity, Role, Table, always, entry
from xlbridge.catalogue import CATALOGUE
from xlbridge.catalogue.entry import NOT_NEGATIVE, POSITIVE

INPUT, LINK, CALC, RESULT = Role.INPUT, Role.LINK, Role.CALCULATION, Role.RESULT
COMBINATIONS = CATALOGUE["ELF_COMBINATION_FACTOR"].arguments[0].choices
ADDITIVE, COUNTERACTING = COMBINATIONS[:2]
_VERTICAL = "IF(ISBLANK({{S_av}}),ELF_EV({{S_DS}},{D},{{vertical_case}}),ELF_EV_SPECTRUM({{S_av}},{D}))"

VERTICAL = Block(
    "Vertical seismic effect",
    (
        entry(
            "vertical_case",
            "ELF_EV.taken",
            "How E_v is taken: in full, or zero by one of the cases of 12.4.2.2",
            rule="E_v",
            symbol="-",
            default="counted",
        ),
        Quantity(
            "S_av",
            "Vertical spectral acceleration by 11.9 (blank: 0.2 S_DS D)",
            "acceleration",
            INPUT,
            span=POSITIVE,
            rule="E_v_spectrum",
        ),
        Quantity(
            "E_v_unit",
            "E_v for a unit of dead load",
            "none",
            CALC,
            f"={_VERTICAL.format(D=1)}",
            symbol="E_v/D",
            decimals=4,
        ),
    ),
)


def _factor(term: str) -> Quantity:
    return Quantity(
        f"c_{term}",
        f"Factor on {term}" + (", or E_mh" if term == "E_h" else ""),
        "none",
        CALC,
        f'=ELF_COMBINATION_FACTOR({{combination_name}},"{term}",{{edition}})',
        symbol=f"c({term})",
    )


FACTORS = Block(
    "Combinations with seismic effects",
    (
        Quantity(
            "combination_name",
            "Combination",
            "text",
            Role.FIXED,
            rule="combination",
            symbol="combination",
            width=15,
        ),
        *(_factor(term) for term in ("D", "E_v", "E_h", "L", "S")),
        Quantity(
            "c_dead",
            "Factor on D with E_v taken in",
            "none",
            RESULT,
            "={c_D}+{c_E_v}*{E_v_unit}",
            rule="combination",
            symbol="c(D + E_v)",
            decimals=4,
        ),
    ),
)

MEMBERS = Block(
    "Member",
    (
        Quantity(
            "member_name",
            "Member and effect",
            "text",
            INPUT,
            symbol="member",
            stored="name",
            width=22,
            starter=lambda start: f"Effect {start.count - start.level + 1}",
        ),
        Quantity(
            "member_direction",
            "Direction of the forces",
            "text",
            INPUT,
            choices=DIRECTIONS,
            symbol="direction",
            stored="direction",
            starter=lambda start: DIRECTIONS[start.level % 2],
        ),
        entry("D", "ELF_COMBINE.D", "Effect of dead load", rule="combination", starter=always(100.0)),
        entry("L", "ELF_COMBINE.L", "Effect of live load", rule="combination", default=0.0),
        entry("S", "ELF_COMBINE.S", "Effect of snow load", rule="combination", default=0.0),
        entry("Q_E", "ELF_EH.Q_E", "Effect of the horizontal forces", rule="E_h", starter=always(50.0)),
        Quantity(
            "E_cl",
            "Capacity-limited effect (blank: none)",
            "force",
            INPUT,
            span=NOT_NEGATIVE,
            rule="E_cl",
            width=12,
        ),
        Quantity(
            "member_source",
            "Source of the inputs in this row",
            "text",
            INPUT,
            symbol="source",
            stored="source",
            width=22,
        ),
    ),
)


def _combined(key: str, text: str, combination: str, effect: str, choose: str) -> Quantity:
    """Return the larger or the smaller sum of a combination with the effect acting either way."""
    terms = "{D},{E_v},%s" + f"{{{effect}}}" + ",{L},{S},{edition}"
    sums = ",".join(f'ELF_COMBINE("{combination}",{terms % sign})' for sign in ("", "-"))
    return Quantity(key, text, "force", RESULT, f"={choose}({sums})", width=13)


EFFECTS = Block(
    "Seismic effects and strength combinations",
    (
        Quantity(
            "E_h",
            "Horizontal effect",
            "force",
            CALC,
            '=ELF_EH(IF({member_direction}="X",rho_X,rho_Y),{Q_E})',
        ),
        Quantity("E_v", "Vertical effect", "force", CALC, f"={_VERTICAL.format(D='{D}')}"),
        Quantity(
            "E_mh",
            "With overstrength",
            "force",
            CALC,
            '=IF(ISBLANK({E_cl}),ELF_EMH(IF({member_direction}="X",Omega_0_X,Omega_0_Y),{Q_E}),'
            'ELF_EMH_LIMITED(IF({member_direction}="X",Omega_0_X,Omega_0_Y),{Q_E},{E_cl}))',
        ),
        _combined("U_most", f"Largest of {ADDITIVE}, E_h either way", ADDITIVE, "E_h", "MAX"),
        _combined("U_least", f"Smallest of {COUNTERACTING}, E_h either way", COUNTERACTING, "E_h", "MIN"),
        _combined("U_m_most", f"Largest of {ADDITIVE}, E_mh either way", ADDITIVE, "E_mh", "MAX"),
        _combined("U_m_least", f"Smallest of {COUNTERACTING}, E_mh either way", COUNTERACTING, "E_mh", "MIN"),
    ),
)

_FACTORS_TEXT = "factors of the load combinations with seismic effects"
_MEMBERS_TEXT = "effects on members, combined: strength combinations"
PART = Part(
    "load_effects",
    "Load effects",
    criteria=(VERTICAL,),
    tables=(
        Table(
            "Combinations",
            "Load combinations",
            _FACTORS_TEXT,
            "combination",
            bands=(FACTORS,),
            fixed=dict.fromkeys(EDITIONS, COMBINATIONS),
        ),
        Table("Members", "Member effects", _MEMBERS_TEXT, "member", bands=(MEMBERS, EFFECTS), start=4),
    ),
    brought_by=("vertical_case", "S_av"),
)
