"""(b) The model route: the package solved from the inputs alone against the results of the cells."""

from __future__ import annotations

from xlbridge.audit.finding import Checked, NotChecked, Observation, Place
from xlbridge.audit.routes import Difference, compare
from xlbridge.audit.subject import NO_INPUTS, Subject, Unsolved
from xlbridge.audit.template import OwnTemplate
from xlbridge.headless.references import Cell


def check(subject: Subject) -> Checked:
    """Solve the building of the workbook's inputs, and compare every result that both routes have."""
    own = subject.own
    if own is None:
        return Checked("model", 0, not_checked=(NotChecked("model route", NO_INPUTS),))
    try:
        agreement = compare(own.results, subject.model)
    except Unsolved as error:
        return _unreadable(str(error), own.places.get(error.path))
    return Checked("model", agreement.compared, tuple(_observed(own, d) for d in agreement.differences))


def _unreadable(why: str, cell: Cell | None) -> Checked:
    return Checked(
        "model",
        0,
        (Observation("inputs_unreadable", Place.of(cell) if cell else Place(), why),),
        (NotChecked("model route", f"the inputs cannot be solved: {why}"),),
    )


def _observed(own: OwnTemplate, difference: Difference) -> Observation:
    cell = own.places.get(difference.path)
    return Observation(
        "differs_from_model",
        Place.of(cell) if cell else Place(),
        f"{difference.path}: the cell gives {difference.cell}, the inputs give {difference.model}",
        stored=difference.cell,
        recomputed=difference.model,
        cause="model",
    )
