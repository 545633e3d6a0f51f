"""Effective seismic weight (12.7.2): what counts of each load, and the weight of one level.

Dead load, permanent equipment and landscaping count in full. Storage, partitions and snow count in part;
those parts are unit loads, which ``level_weight`` then turns into weight.
"""

from __future__ import annotations

from typing import Final

import numpy as np
from numpy.typing import ArrayLike

from engine import levels
from engine.editions import value
from engine.errors import WrongType
from engine.require import Result, above, at_least, choice, formula
from engine.units import SYSTEMS, UNIT_LOAD_AREA_PER_FORCE

STORAGE_SHARE: Final = 0.25
STORAGE_LIMIT: Final = 0.05
#: how a storage load is taken up: in part, or by one of the two exceptions not at all
STORAGE_USES: Final = ("counted", "at most 5 % of the level", "public garage or open parking")
#: least partition load [psf or kN/m2], as printed in each unit system
PARTITION_MINIMUM: Final = {"us": 10.0, "si": 0.48}


@formula
def area_weight(area: ArrayLike, unit_load: ArrayLike, units: str) -> Result:
    """Weight of a surface under a uniform load.

    w = area unit_load, in "us" over 1,000 lb to the kip

    Parameters
        area: area on plan, or of a wall [ft2 or m2], at least 0; any shape
        unit_load: load that counts, on each unit of area [psf or kN/m2], at least 0; broadcast with area
        units: "us" (ft2, psf, kip) or "si" (m2, kN/m2, kN)
    Returns
        w [kip or kN], the broadcast shape
    Raises
        ImpossibleValue: a value below 0. NotApplicable: unknown units
    Example
        >>> print(area_weight(area=9600.0, unit_load=80.0, units="us"))
        768.0

    Reference
        rule W: 7-16 12.7.2; 7-22 12.7.2
    """
    scale = UNIT_LOAD_AREA_PER_FORCE[choice("units", units, SYSTEMS)]
    return at_least(0, "area", area) * at_least(0, "unit_load", unit_load) / scale


@formula
def storage_unit_load(live_load: ArrayLike, storage: str) -> Result:
    """Part of a storage floor's live load that counts as seismic weight.

    q = 0.25 live_load; 0 by either exception

    Parameters
        live_load: floor live load of the storage area [psf or kN/m2], at least 0; any shape
        storage: one of STORAGE_USES
    Returns
        q [psf or kN/m2, the unit of live_load], the shape of live_load
    Raises
        ImpossibleValue: a load below 0. NotApplicable: another use
    Notes
        The exceptions are from memory. That the storage adds at most 5 % is shown by ``storage_ratio``.
    Example
        >>> print(storage_unit_load(live_load=125.0, storage="counted"))
        31.25

    Reference
        rule W_storage: 7-16 12.7.2, item 1; 7-22 12.7.2, item 1
    """
    share = STORAGE_SHARE if choice("storage", storage, STORAGE_USES) == STORAGE_USES[0] else 0.0
    return share * at_least(0, "live_load", live_load)


@formula
def storage_ratio(w_storage: ArrayLike, w_other: ArrayLike) -> Result:
    """What a level's storage would add, in parts of the rest of its weight.

    ratio = w_storage/w_other, to be compared with 0.05

    Parameters
        w_storage: weight of the storage at the level, 25 % of its load [kip or kN], at least 0; any shape
        w_other: effective seismic weight of the level without storage [kip or kN], above 0
    Returns
        ratio [-], the broadcast shape
    Raises
        ImpossibleValue: a value outside its range
    Notes
        From memory. Whether the 5 % are of the weight without or with the storage is not recalled; without
        it is the stricter reading.
    Example
        >>> print(storage_ratio(w_storage=30.0, w_other=600.0))
        0.05

    Reference
        rule W_storage: 7-16 12.7.2, item 1; 7-22 12.7.2, item 1
    """
    return at_least(0, "w_storage", w_storage) / above(0, "w_other", w_other)


@formula
def partition_unit_load(partitions: ArrayLike, units: str) -> Result:
    """Partition load that counts as seismic weight, where the floor design provides for partitions.

    q = max(partitions, 10 psf or 0.48 kN/m2)

    Parameters
        partitions: actual weight of the partitions over the floor area [psf or kN/m2], at least 0; any shape
        units: "us" (psf) or "si" (kN/m2)
    Returns
        q [psf or kN/m2], the shape of partitions
    Raises
        ImpossibleValue: a load below 0. NotApplicable: unknown units
    Notes
        Both limits are printed; they differ by 0.3 %.
    Example
        >>> print(partition_unit_load(partitions=8.0, units="us"))
        10.0

    Reference
        rule W_partitions: 7-16 12.7.2, item 2; 7-22 12.7.2, item 2
    """
    return np.maximum(
        at_least(0, "partitions", partitions), PARTITION_MINIMUM[choice("units", units, SYSTEMS)]
    )


@formula
def snow_unit_load(p_f: ArrayLike, edition: str, units: str) -> Result:
    """Part of the flat roof snow load that counts as seismic weight, whatever the roof slope.

    q = 0.20 p_f above 30 psf or 1.44 kN/m2 (7-16); 0.15 p_f above 45 psf or 2.16 kN/m2 (7-22); else 0

    Parameters
        p_f: flat roof snow load [psf or kN/m2], at least 0; any shape
        edition: "7-16" or "7-22"
        units: "us" (psf) or "si" (kN/m2)
    Returns
        q [psf or kN/m2], the shape of p_f
    Raises
        ImpossibleValue: a load below 0. NotApplicable: unknown edition or units
    Notes
        The uniform design snow load is taken as p_f. The limit itself is not above the limit. That the roof
        slope is ignored is from memory.
    Example
        >>> print(snow_unit_load(p_f=50.0, edition="7-22", units="us"))
        7.5

    Reference
        rule W_snow: 7-16 12.7.2, item 4; 7-22 12.7.2, item 4
    """
    share = value(edition, "snow_share")
    limit = value(edition, f"snow_limit_{choice('units', units, SYSTEMS)}")
    p_f = at_least(0, "p_f", p_f)
    return np.where(p_f > limit, share * p_f, 0.0)


@formula
def level_weight(areas: ArrayLike, unit_loads: ArrayLike, units: str, equipment: ArrayLike = 0.0) -> Result:
    """Effective seismic weight of one level from its list of loads.

    w_x = sum(area_i unit_load_i) + equipment

    Parameters
        areas: areas of the items of the level [ft2 or m2], at least 0; shape (n,), n 1 to 1,000
        unit_loads: load that counts, item by item [psf or kN/m2], at least 0; shape (n,)
        units: "us" (ft2, psf, kip) or "si" (m2, kN/m2, kN)
        equipment: operating weight of permanent equipment, landscaping and whatever else counts in full
            [kip or kN], at least 0; any shape
    Returns
        w_x [kip or kN], the shape of equipment
    Raises
        ImpossibleValue: a value below 0, or more than 1,000 items. WrongType: lists of unequal length.
        NotApplicable: unknown units
    Example
        >>> print(level_weight(areas=[9600.0, 3300.0], unit_loads=[80.0, 15.0], units="us", equipment=22.5))
        840.0

    Reference
        rule W: 7-16 12.7.2; 7-22 12.7.2
    """
    items = levels.counted("areas", at_least(0, "areas", areas), "items")
    loads = levels.counted("unit_loads", at_least(0, "unit_loads", unit_loads), "items")
    if items.shape != loads.shape:
        raise WrongType("unit_loads", f"{loads.size} items", f"must be one for each of {items.size} areas")
    return np.asarray(area_weight(items, loads, units).sum() + at_least(0, "equipment", equipment))
