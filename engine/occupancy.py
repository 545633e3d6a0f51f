"""Importance by Risk Category (chapters 1 and 11). The choice of the category itself is the engineer's."""

from __future__ import annotations

from typing import Final

import numpy as np

from engine.tables import table

RISK_CATEGORIES: Final = table("importance_factor").keys
#: the Seismic Design Categories, mildest first
DESIGN_CATEGORIES: Final = ("A", "B", "C", "D", "E", "F")


def importance_factor(risk_category: str) -> np.float64:
    """Seismic importance factor I_e of a Risk Category.

    I_e = the row of Table 1.5-2

    Parameters
        risk_category: "I", "II", "III" or "IV"; one text
    Returns
        I_e [-]: 1.0, 1.25 or 1.5
    Raises
        NotApplicable: another category. MissingValue: blank. WrongType: not a text
    Example
        >>> print(importance_factor("III"))
        1.25

    Reference
        rule I_e: 7-16 11.5.1, Table 1.5-2; 7-22 11.5.1, Table 1.5-2
    """
    return np.float64(table("importance_factor").entry("risk_category", risk_category, "I_e"))
