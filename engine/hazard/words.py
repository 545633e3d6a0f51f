"""The words of choices that several rules of 7-16 share: site classes and the exceptions of 11.4.8."""

from __future__ import annotations

from typing import Final

#: the classes with a row of numbers; "B not measured" is rock whose shear wave velocity was not measured,
#: "D default" is soil whose class is not known
TABLE_SITE_CLASSES: Final = ("A", "B", "B not measured", "C", "D", "D default", "E")
SITE_CLASSES: Final = (*TABLE_SITE_CLASSES, "F")
#: the exception used for the trigger at short periods, and for the one at long periods
SHORT_EXCEPTIONS: Final = ("none", "exception 1: F_a of class C")
LONG_EXCEPTIONS: Final = (
    "none",
    "exception 2: C_s increased",
    "exception 2 of Supplement 3: S_M1 up 50 %",
    "exception 3: T at most T_S",
)
F_A_OF_CLASS_C: Final = SHORT_EXCEPTIONS[1]
C_S_INCREASED, S_M1_RAISED, SHORT_T = LONG_EXCEPTIONS[1:]
