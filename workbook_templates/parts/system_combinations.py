"""Combinations of systems: together in one direction (12.2.3.3), and one above another (12.2.3.1)."""

from __future__ import annotations

from workbook_templates.declare import Block, Check, Part, Quantity, Role, Table
from xlbridge.catalogue.entry import Span

INPUT, CALC = Role.INPUT, Role.CALCULATION
_AT_LEAST_1 = Span(1)
_STARTERS = {"system_R": (6.0, 5.0), "system_Omega_0": (2.5, 2.5), "system_C_d": (5.0, 4.5)}


def _coefficient(key: str, symbol: str) -> Quantity:
    return Quantity(
        key,
        f"{symbol} of the system",
        "none",
        INPUT,
        span=_AT_LEAST_1,
        rule="combination_horizontal",
        symbol=f"{symbol}, system",
        decimals=2,
        starter=lambda start: _STARTERS[key][start.level % 2],
    )


def _if_any(call: str) -> str:
    return f'=IF(COUNT({{system_R:all}})=0,"-",{call})'


def _of_part(which: str, symbol: str, value: float) -> Quantity:
    return Quantity(
        f"{which}_{symbol}",
        f"{symbol} of the {which} system",
        "none",
        INPUT,
        span=_AT_LEAST_1,
        rule="combination_vertical",
        symbol=f"{symbol}, {which}",
        decimals=2,
        default=value,
    )


def _lower_part(symbol: str) -> Quantity:
    return Quantity(
        f"lower_part_{symbol}",
        f"{symbol} for the lower part",
        "none",
        CALC,
        f"=ELF_LOWER_PART({{above_{symbol}}},{{below_{symbol}}},{{above_R}},{{below_R}})",
        symbol=f"{symbol}, lower part",
        decimals=2,
    )


_SYMBOLS = ("R", "Omega_0", "C_d")
HORIZONTAL = Block(
    "Systems that act together in one direction",
    (
        Quantity(
            "R_least",
            "Least R",
            "none",
            CALC,
            _if_any("ELF_R_LEAST({system_R:all})"),
            symbol="R, least",
            decimals=2,
        ),
        *(
            Quantity(
                f"{symbol}_of_least",
                f"{symbol} of the system with it",
                "none",
                CALC,
                _if_any(f"ELF_LEAST_R_VALUE({{system_{symbol}:all}},{{system_R:all}})"),
                symbol=f"{symbol}, of least R",
                decimals=2,
            )
            for symbol in _SYMBOLS[1:]
        ),
    ),
    per_direction=True,
)
VERTICAL = Block(
    "One system above another (1: none)",
    (
        *(_of_part("above", symbol, 1.0) for symbol in _SYMBOLS),
        *(_of_part("below", symbol, 1.0) for symbol in _SYMBOLS),
        *(_lower_part(symbol) for symbol in _SYMBOLS),
        Quantity(
            "transfer_factor",
            "Factor on the forces handed down",
            "none",
            CALC,
            "=ELF_TRANSFER_FACTOR({above_R},{below_R})",
            symbol="-",
        ),
    ),
    per_direction=True,
)
_ACTING = "systems that act together in one direction"
PART = Part(
    "combinations",
    "Combinations of systems",
    criteria=(HORIZONTAL, VERTICAL),
    tables=(
        Table(
            "Together",
            "Systems that act together",
            _ACTING,
            "system",
            bands=(
                Block(
                    "System",
                    (
                        Quantity(
                            "acting_name",
                            "System",
                            "text",
                            INPUT,
                            symbol="system",
                            stored="name",
                            width=40,
                            starter=lambda start: f"System {start.count - start.level + 1}",
                        ),
                    ),
                ),
                Block(
                    "Coefficients",
                    tuple(_coefficient(f"system_{s}", s) for s in _SYMBOLS),
                    per_direction=True,
                ),
            ),
            start=2,
        ),
    ),
    checks=(
        Check(
            "R entered is above the least R of the systems that act together",
            "=IF(ISNUMBER({R_least}),IF({R}>{R_least}*(1+1E-12),1,0),0)",
            "=0",
            per_direction=True,
        ),
        *(
            Check(
                f"{symbol} entered is below that of the system with the least R",
                f"=IF(ISNUMBER({{{symbol}_of_least}}),IF({{{symbol}}}<{{{symbol}_of_least}}*(1-1E-12),1,0),0)",
                "=0",
                per_direction=True,
            )
            for symbol in _SYMBOLS[1:]
        ),
    ),
    brought_by=tuple(f"{which}_{symbol}" for which in ("above", "below") for symbol in _SYMBOLS),
)
