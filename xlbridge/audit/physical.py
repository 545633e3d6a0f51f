"""(f) What a building can hardly be: usual ranges, ratios, steps from level to level, and orders.

The bounds are data in ``physical.toml``. They are common practice, not rules; what is right all the same is
accepted with its reason, and stays listed.
"""

from __future__ import annotations

import re
import tomllib
from collections import defaultdict
from collections.abc import Iterator, Mapping
from dataclasses import dataclass
from functools import cached_property
from importlib.resources import files
from itertools import pairwise
from typing import Any, Final

from xlbridge.audit.arguments import Given, given
from xlbridge.audit.finding import Checked, NotChecked, Observation, Place
from xlbridge.audit.paths import leaves
from xlbridge.audit.subject import NO_INPUTS, Subject
from xlbridge.audit.template import OwnTemplate

METHOD: Final = "physical"
SOURCE: Final = "common practice"
#: slips of units, and what each does to a number
UNITS: Final = {
    1000.0: "1000 (lb for kip, N for kN, mm for m)",
    12.0: "12 (in for ft)",
    3.281: "3.28 (ft for m)",
    4.448: "4.45 (kN for kip)",
    25.4: "25.4 (mm for in)",
    9.807: "9.81 (mass for weight)",
    100.0: "100 (per cent for parts of g)",
}
_ROW: Final = re.compile(r"\[(\d+)\]")
_DIRECTION: Final = re.compile(r"(direction\.|_)([XY])(?=\.|$)")


@dataclass(frozen=True)
class _Numbers:
    """The numbers of a workbook by path, entries and results alike, and the levels by height."""

    own: OwnTemplate
    values: Mapping[str, float]

    @classmethod
    def of(cls, own: OwnTemplate) -> _Numbers:
        found = leaves({**own.inputs, **own.results, "direction": _directions(own)})
        return cls(
            own, {p: float(v) for p, v in found if isinstance(v, float | int) and not isinstance(v, bool)}
        )

    @cached_property
    def _by_pattern(self) -> Mapping[str, list[str]]:
        found: dict[str, list[str]] = defaultdict(list)
        for path in self.values:
            column = _ROW.sub("[*]", path)
            found[column].append(path)
            if (both := _DIRECTION.sub(r"\1?", column)) != column:
                found[both].append(path)
        return found

    def matching(self, pattern: str) -> Iterator[tuple[str, float]]:
        """Yield the numbers whose paths match, in their order."""
        return ((path, self.values[path]) for path in self._by_pattern.get(pattern, ()))

    def partner(self, path: str, pattern: str) -> float | None:
        """The number of a pattern in the row and in the direction of a path."""
        row = _ROW.search(path)
        direction = _DIRECTION.search(path)
        found = pattern.replace("[*]", row[0] if row else "")
        return self.values.get(found.replace("?", direction[2]) if direction else found)

    def by_height(self, pattern: str) -> Iterator[list[tuple[str, float]]]:
        """Yield the rows of a column from the top down, once a direction; levels at one height stay out."""
        for shown in (pattern.replace("?", d) for d in ("XY" if "?" in pattern else "X")):
            rows = [(path, value) for path, value in self.matching(shown)]
            heights = [self.partner(path, "h_x[*]") for path, _ in rows]
            known = [(h, row) for h, row in zip(heights, rows, strict=True) if h is not None]
            once = [(h, row) for h, row in known if [k for k, _ in known].count(h) == 1]
            yield [row for _, row in sorted(once, reverse=True)]

    def place(self, path: str) -> Place:
        cell = self.own.places.get(path)
        return Place.of(cell) if cell else Place()


def check(subject: Subject) -> Checked:
    """Compare the numbers of a workbook with what buildings are."""
    own = subject.own
    if own is None:
        return _of_another_make(subject)
    if own.unread:
        return Checked(METHOD, 0, not_checked=(NotChecked("physical plausibility", own.unread),))
    numbers = _Numbers.of(own)
    units = "us" if own.inputs["units"] == "us" else "si"
    rules = [(_CHECKS[kind], rule) for kind, of_kind in RULES.items() for rule in of_kind]
    looked_at = sum(1 for _, rule in rules for _ in numbers.matching(rule["path"]))
    return Checked(METHOD, looked_at, tuple(o for look, rule in rules for o in look(numbers, rule, units)))


def _of_another_make(subject: Subject) -> Checked:
    """Judge what worksheet functions are given; nothing else says what the numbers of such a workbook are."""
    found = list(given(subject))
    ranges = {rule["argument"]: rule for rule in RULES["range"] if "argument" in rule}
    steps = {rule["argument"]: rule for rule in RULES["step"] if "argument" in rule}
    seen = [o for one in found if (rule := ranges.get(one.argument)) for o in _given_range(one, rule)]
    seen += [o for one in found if (rule := steps.get(one.argument)) for o in _given_steps(one, rule)]
    looked_at = sum(one.argument in ranges or one.argument in steps for one in found)
    why = "only what worksheet functions are given is known; of the other numbers nobody says what they are"
    missing = NotChecked("physical plausibility", why if looked_at else NO_INPUTS)
    return Checked(METHOD, looked_at, tuple(seen), (missing,))


def _given_range(one: Given, rule: Mapping[str, Any]) -> Iterator[Observation]:
    low, high = rule["any"]
    if isinstance(one.value, float) and not low <= one.value <= high:
        words = f"{rule['what']} {one.value:.4g} ({one.written}), usually {low:g} to {high:g} ({SOURCE})"
        words += _slip(rule, one.value, low, high)
        yield Observation("implausible_value", one.place, words, stored=one.value, cause=one.written)


def _given_steps(one: Given, rule: Mapping[str, Any]) -> Iterator[Observation]:
    """The levels of a call from the top down, those at one height left out."""
    low, high = rule["any"]
    levels = sorted(zip(_column(one.heights), _column(one.value), strict=False), reverse=True)
    if len({height for height, _ in levels}) < len(levels):
        return
    for n, ((height, value), (_, below)) in enumerate(pairwise(levels)):
        ratio = value / below if below else 1.0
        if ratio > high or (ratio < low and n > 0):
            words = (
                f"{rule['what']} at height {height:g} ({one.written}) is {ratio:.3g} times that of the level "
            )
            words += f"below, usually {low:g} to {high:g} ({SOURCE}){_slip(rule, ratio, low, high)}"
            yield Observation("implausible_step", one.place, words, stored=value, cause=one.written)


def _column(value: object) -> list[float]:
    return (
        [cell for row in value for cell in row if isinstance(cell, float)] if isinstance(value, tuple) else []
    )


def _range(numbers: _Numbers, rule: Mapping[str, Any], units: str) -> Iterator[Observation]:
    low, high = rule.get("any") or rule[units]
    for path, value in numbers.matching(rule["path"]):
        if not low <= value <= high:
            words = f"{rule['what']} {value:.4g}, usually {low:g} to {high:g} ({SOURCE})"
            words += _slip(rule, value, low, high)
            yield _seen("implausible_value", numbers, path, rule, value, words)


def _ratio(numbers: _Numbers, rule: Mapping[str, Any], units: str) -> Iterator[Observation]:
    low, high = rule["any"]
    for path, value in numbers.matching(rule["path"]):
        over = numbers.partner(path, rule["over"])
        if over and value and not low <= abs(value / over) <= high:
            ratio = abs(value / over)
            words = f"{rule['what']} is {ratio:.4g}, usually {low:g} to {high:g} ({SOURCE})"
            words += _slip(rule, ratio, low, high)
            yield _seen("implausible_value", numbers, path, rule, value, words)


def _step(numbers: _Numbers, rule: Mapping[str, Any], units: str) -> Iterator[Observation]:
    """A level against the one below it; the roof may well be lighter, and is compared by the upper bound."""
    low, high = rule["any"]
    for rows in numbers.by_height(rule["path"]):
        for n, ((path, value), (_, below)) in enumerate(pairwise(rows)):
            ratio = value / below if below else 1.0
            if ratio > high or (ratio < low and n > 0):
                words = f"{rule['what']} is {ratio:.3g} times that of the level below"
                words += f", usually {low:g} to {high:g} ({SOURCE}){_slip(rule, ratio, low, high)}"
                yield _seen("implausible_step", numbers, path, rule, value, words)


def _order(numbers: _Numbers, rule: Mapping[str, Any], units: str) -> Iterator[Observation]:
    """A column that grows with the height, or against it; both signs of displacements are in use."""
    sign = 1 if rule["grows"] == "upwards" else -1
    for rows in numbers.by_height(rule["path"]):
        for (path, value), (_, below) in pairwise(rows):
            if sign * (abs(value) - abs(below)) < 0:
                words = f"{rule['what']} {value:.4g} against {below:.4g} one level below: "
                words += f"it grows {rule['grows']} in a building ({SOURCE})"
                yield _seen("implausible_order", numbers, path, rule, value, words)


def _seen(
    kind: str, numbers: _Numbers, path: str, rule: Mapping[str, Any], value: float, words: str
) -> Observation:
    column = f"{rule['what']} {_ROW.sub('', path)}"
    return Observation(kind, numbers.place(path), words, stored=value, cause=column)


def _slip(rule: Mapping[str, Any], value: float, low: float, high: float) -> str:
    """Name the slips of units that would explain a number outside its range."""
    found = [
        UNITS[factor]
        for factor in rule.get("slips", ())
        if low <= value / factor <= high or low <= value * factor <= high
    ]
    return f"; a factor of {' or '.join(found)} would explain it" if found else ""


def _directions(own: OwnTemplate) -> dict[str, Any]:
    entries, results = own.inputs.get("direction", {}), own.results.get("direction", {})
    return {d: {**entries.get(d, {}), **results.get(d, {})} for d in {*entries, *results}}


_CHECKS: Final = {"range": _range, "ratio": _ratio, "step": _step, "order": _order}
RULES: Final[Mapping[str, list[dict[str, Any]]]] = tomllib.loads(
    files("xlbridge.audit").joinpath("physical.toml").read_text(encoding="utf-8")
)
