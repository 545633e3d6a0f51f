"""What the parts that look for irregularities share: the category, answers, signs, consequences."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Final

from engine import irregularity
from engine.building.records import Building
from engine.building.results import Package, texts
from engine.require import Words

#: stands where no irregularity of a kind is found
NO_TYPE: Final = "none"


def design_category(building: Building, package: Package) -> str | None:
    """Return the Seismic Design Category: as computed, or as entered; ``None`` without either."""
    found: str | None = package.more.get("SDC", building.site.SDC)
    return found


def answer(flag: bool) -> str:
    """Return a flag as the word that the rules take."""
    return "yes" if flag else "no"


def excepted(building: Building, package: Package) -> str:
    """Tell whether the exception by story drift ratios holds: as computed, or as entered."""
    found: str = package.more.get("drift_exception", answer(building.site.drift_exception))
    return found


def signed(verdicts: Words) -> tuple[str, ...]:
    """Return verdicts behind their sign: ! for a type of irregularity, ✓ for none.

    >>> signed("Type 2, weight"), signed("no irregularity")
    (('! Type 2, weight',), ('✓ no irregularity',))
    """
    return tuple(f"✓ {text}".replace("✓ Type", "! Type") for text in texts(verdicts))


def worst(verdicts: Words, *types: str) -> str:
    """Return the first of the types that some verdict ends with, or "none"; an exempt one does not count.

    >>> worst(["Type 1b, extreme soft story, exempt by …", "Type 1a, soft story"], "soft story")
    'soft story'
    """
    found = (kind for kind in types if any(text.endswith(f", {kind}") for text in texts(verdicts)))
    return next(found, NO_TYPE)


def entailed(key: str, kind: str, building: Building, package: Package) -> Mapping[str, str]:
    """Return what a kind of irregularity entails, where the Seismic Design Category is known."""
    SDC = design_category(building, package)
    if SDC is None:
        return {}
    words = "-" if kind == NO_TYPE else str(irregularity.consequence(kind, SDC, building.edition))
    return {f"{key}_entails": words}
