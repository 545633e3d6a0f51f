"""Systems of Table 12.2-1 as a sheet, the suggestion beside the entries, height limits."""

from __future__ import annotations

from types import MappingProxyType
from typing import Final

from engine.editions import EDITIONS
from engine.errors import EngineError
from workbook_templates.declare import YES_NO, Block, Check, Part, Quantity, Role, Table, entry
from workbook_templates.parts.shared import CATEGORY
from xlbridge.catalogue import CATALOGUE

INPUT, CALC, VERDICT = Role.INPUT, Role.CALCULATION, Role.VERDICT
#: the defined name of the list that a system is chosen from
LIST: Final = "system_list"


def _listed(edition: str) -> tuple[str, ...]:
    """The rows of the table of an edition for which numbers are given."""
    entry_R = CATALOGUE["ELF_SYSTEM_R"]
    found = []
    for word in entry_R.arguments[0].choices:
        try:
            entry_R.function(word, edition)
        except EngineError:
            continue
        found.append(word)
    return tuple(found)


SYSTEMS = MappingProxyType({edition: _listed(edition) for edition in EDITIONS})


def _of_row(key: str, text: str, function: str, symbol: str) -> Quantity:
    return Quantity(
        key,
        text,
        "none",
        CALC,
        f"=ELF_{function}({{system_name}},{{edition}})",
        symbol=symbol,
        decimals=2,
    )


ROWS = Block(
    "Systems of Table 12.2-1",
    (
        Quantity(
            "system_name",
            "System, after the letter of its group",
            "text",
            Role.FIXED,
            rule="system",
            symbol="system",
            width=62,
        ),
        _of_row("row_R", "Response modification coefficient", "SYSTEM_R", "R"),
        _of_row("row_Omega", "Overstrength factor", "SYSTEM_OMEGA", "Omega_0"),
        _of_row("row_C_d", "Deflection amplification factor", "SYSTEM_CD", "C_d"),
        Quantity(
            "row_source",
            "Where the numbers come from",
            "text",
            CALC,
            "=ELF_SYSTEM_SOURCE({system_name},{edition})",
            symbol="source",
            width=70,
        ),
    ),
)


def _unless_blank(call: str) -> str:
    return f'=IF(ISBLANK({{table_system}}),"-",{call})'


def _suggested(key: str, text: str, function: str, symbol: str) -> Quantity:
    call = f"ELF_{function}({{table_system}},{{edition}})"
    return Quantity(key, text, "none", CALC, _unless_blank(call), symbol=symbol, decimals=2)


_SYSTEM = "{table_system},{edition}"
_HEIGHT = "{table_system},{SDC},{height_increase},{edition},{units}"
SUGGESTION = Block(
    "System by the table",
    (
        Quantity(
            "table_system",
            "Row of Table 12.2-1, chosen from the sheet Systems (blank: not in the table)",
            "text",
            INPUT,
            listed_in=LIST,
            rule="system",
            symbol="-",
        ),
        _suggested("table_R", "R by the table", "SYSTEM_R", "R, table"),
        _suggested("table_Omega", "Omega_0 by the table", "SYSTEM_OMEGA", "Omega_0, table"),
        _suggested("table_C_d", "C_d by the table", "SYSTEM_CD", "C_d, table"),
        Quantity(
            "system_status",
            "Entries against the table; the entries rule",
            "text",
            VERDICT,
            _unless_blank(
                'SUBSTITUTE("✓ "&ELF_SYSTEM_STATUS({table_system},{R},{Omega_0},{C_d},{edition}),'
                '"✓ differs","! differs")'
            ),
            symbol="-",
            lines=2,
        ),
        Quantity(
            "system_source",
            "Where the table's numbers come from",
            "text",
            CALC,
            _unless_blank(f"ELF_SYSTEM_SOURCE({_SYSTEM})"),
            symbol="-",
            lines=4,
        ),
        entry(
            "omega_reduction",
            "ELF_OMEGA.reduction",
            "Reduction of Omega_0 for flexible diaphragms",
            rule="Omega_0_reduced",
            symbol="-",
            default="as tabulated",
        ),
        Quantity(
            "Omega_permitted",
            "Omega_0 by the table with the reduction",
            "none",
            CALC,
            '=IF(ISBLANK({table_system}),"-",ELF_OMEGA({table_Omega},{omega_reduction}))',
            symbol="Omega_0, permitted",
            decimals=2,
        ),
        Quantity(
            "height_increase",
            "The height limit is increased by 12.2.5.4, whose conditions hold",
            "text",
            INPUT,
            choices=YES_NO,
            rule="height_increase",
            symbol="-",
            default=False,
        ),
        Quantity(
            "height_status",
            "Structural height against the limit",
            "text",
            VERDICT,
            '=SUBSTITUTE(SUBSTITUTE("✓ "&IF(ISBLANK({table_system}),"-",'
            f'ELF_HEIGHT_STATUS({{h_n}},{_HEIGHT})),"✓ above","✗ above"),"✓ -","-")',
            symbol="-",
            lines=2,
        ),
    ),
    per_direction=True,
)

_TEXT = "systems of Table 12.2-1 with coefficients and the sources of the numbers"
PART = Part(
    "systems",
    "Systems",
    criteria=(CATEGORY, SUGGESTION),
    tables=(
        Table(
            "Systems",
            "Systems of Table 12.2-1",
            _TEXT,
            "systems_listed",
            bands=(ROWS,),
            fixed=SYSTEMS,
            list_name=LIST,
            row_lines=3,
        ),
    ),
    checks=(
        Check(
            "Structural height above the limit of the system",
            '=IF(LEFT({height_status},1)="✗",1,0)',
            "=0",
            per_direction=True,
        ),
        Check(
            "R, Omega_0 or C_d differ from the table",
            '=IF(LEFT({system_status},1)="!",1,0)',
            "=0",
            per_direction=True,
            warning=True,
        ),
    ),
    brought_by=("table_system",),
)
