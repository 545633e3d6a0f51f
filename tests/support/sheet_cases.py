"""Arguments for every worksheet function, made from the catalogue: examples, edges of spans, random calls.

A call is a mapping from argument name to a number, a word, or the list of a level range. What arguments
say together (a level's height and weight, a diaphragm not heavier than its level) is settled here once.
"""

from __future__ import annotations

from collections.abc import Iterator, Mapping, Sequence
from random import Random
from typing import Any

from engine.errors import listed
from xlbridge.catalogue import CATALOGUE
from xlbridge.catalogue.entry import Argument, Kind, SheetFunction
from xlbridge.values import OMITTED, Grid

ENTRIES = tuple(CATALOGUE.values())
PLACES = tuple((entry, argument) for entry in ENTRIES for argument in entry.arguments)
#: a step across the end of a span, far below any value and far above round-off
STEP = 1e-6
#: the last columns in which the site coefficient tables print a value for class E
E_PRINTED = {"S_S": 0.75, "S_1": 0.1}
FAR = 1e6
#: numbers of modes: whole, and at most as many as there are levels with weight
ORDINALS = ("mode", "modes")
NUMBERS_OF_MODES = (*ORDINALS, "mode_numbers")
#: what a random number of a unit lies between, inside its span
USUAL = {
    "none": (0.0, 10.0),
    "any": (-100.0, 100.0),
    "time": (0.02, 12.0),
    "acceleration": (0.02, 3.0),
    "length": (3.0, 900.0),
    "area": (10.0, 90_000.0),
    "velocity": (200.0, 5000.0),
    "unit load": (0.0, 250.0),
    "displacement": (0.01, 200.0),
    "force": (0.5, 50_000.0),
    "stiffness": (5.0, 5000.0),
    "moment": (1.0, 90_000.0),
}
#: values at which a rule changes its branch, and printed rows of tables
BRANCHES = {
    "T": (0.5, 0.5001, 2.5, 2.501, 8.0, 0.6),
    "T_L": (8.0, 0.6),
    "S_1": (0.0, 0.6, 0.59999, 0.04, 0.1, 0.2, 0.25, 0.75, 0.74999),
    "S_S": (0.0, 0.15, 0.25, 0.3, 0.5, 0.6, 0.75, 0.8, 1.0, 1.1, 1.25, 1.4, 1.5),
    "S_D1": (0.067, 0.133, 0.06699, 0.1, 0.10005, 0.15, 0.15007, 0.2, 0.2001, 0.3, 0.29985, 0.4, 0.6),
    "S_DS": (0.167, 0.33, 0.5, 0.32999, 1.0, 0.05, 0.01 / 0.044),
    "p_f": (1.44, 2.16, 30.0, 45.0, 30.0001, 45.0001, 2.16001),
    "partitions": (0.48, 10.0, 0.0),
    "theta": (0.0, 0.1, 0.1 + 1e-9),
    "Omega_0": (1.0, 1.25, 2.5, 2.4999),
    "N": (5.0, 6.0),
    "TIR": (1.2, 1.4, 1.2 + 1e-9, 1.4 + 1e-9),
    "TIR_X": (1.4, 1.4 + 1e-9),
    "TIR_Y": (1.4, 1.4 + 1e-9),
}


def ident(value: object) -> str:
    """A test id for an entry or an argument."""
    return str(getattr(value, "name", value))


def named(argument: Argument) -> tuple[str, ...]:
    """The words that a refusal names: all of a short list, the ends of a long one."""
    short = listed(argument.choices) == ", ".join(argument.choices)
    return argument.choices if short else (argument.choices[0], argument.choices[-1])


def column(cells: Sequence[Any]) -> Grid:
    """A range of one column."""
    return tuple((cell,) for cell in cells)


def example(entry: SheetFunction) -> dict[str, Any]:
    """The example's call, numbers as floats."""
    return {name: _floats(value) for name, value in entry.example.arguments.items()}


def as_cells(entry: SheetFunction, call: Mapping[str, Any]) -> list[Any]:
    """A call as the adapter takes it: level ranges as columns, what is not in it left out."""
    given = [call.get(argument.name, OMITTED) for argument in entry.arguments]
    return [column(value) if isinstance(value, list) else value for value in given]


def with_cell(entry: SheetFunction, argument: Argument, cell: Any) -> list[Any]:
    """The example with another cell in one argument; of a level range, in its last row."""
    call = full(entry)
    value = call[argument.name]
    call[argument.name] = [*value[:-1], cell] if isinstance(value, list) else cell
    return as_cells(entry, call)


def full(entry: SheetFunction) -> dict[str, Any]:
    """The example with every optional argument given at its default."""
    return {**entry.defaults, **example(entry)}


def inside(argument: Argument) -> list[float]:
    """Numbers at and just within the ends of a span, and far out where it has no end."""
    span, step = argument.span, _step(argument)
    if argument.name in NUMBERS_OF_MODES:
        return [1.0, 2.0]
    low = [-FAR, 0.0] if span.low is None else [span.low, span.low + step]
    high = [FAR] if span.high is None else [span.high - step, span.high]
    return [float(number) for number in (*low, *high) if number in span]


def outside(argument: Argument) -> list[float]:
    """Numbers at an open end and just beyond each end of a span."""
    span, step = argument.span, _step(argument)
    low = [] if span.low is None else [span.low, span.low - step, -FAR]
    high = [] if span.high is None else [span.high, span.high + step, FAR]
    return [float(number) for number in (*low, *high) if number not in span]


def placed(entry: SheetFunction, name: str, number: float) -> dict[str, Any]:
    """The example with one number changed, and with it what has to follow for the call to make sense."""
    call = full(entry)
    at = call["heights"].index(call["h_x"]) if {"heights", "h_x"} <= call.keys() else 0
    if name == "T_i" and isinstance(call[name], list):
        call[name][0 if number < 0.1 else -1] = number  # the spectrum keeps its reach
        return call
    if isinstance(call[name], list):
        call[name][at - 1] = number  # never the level that is asked for
        return call
    call[name] = number
    if number > 0 and name == "h_x" and "heights" in call:
        call["heights"][at] = number
    if number > 0 and {"h_x", "h_n"} <= call.keys():
        call["h_n"], call["h_x"] = max(call["h_x"], call["h_n"]), min(call["h_x"], call["h_n"])
    if number >= 0 and name in ("w_x", "w_px") and "weights" in call:
        call["weights"][at] = number
    if name in ("z_x", "z_0"):  # a level stands above the base
        call |= {"z_0": number - 12.5} if name == "z_x" else {"z_x": number + 12.5}
    if number > 0 and name in ("d_max", "d_avg"):
        other = "d_avg" if name == "d_max" else "d_max"
        call[other] = (min if name == "d_max" else max)(call[other], number)
    return call


def random_calls(entry: SheetFunction, count: int, seed: int) -> Iterator[dict[str, Any]]:
    """Valid calls: the example, each number at the ends of its span, then random ones."""
    calls = [full(entry)]
    for argument in entry.arguments:
        if argument.kind is Kind.NUMBER:
            calls += [placed(entry, argument.name, number) for number in inside(argument)]
    yield from calls
    random = Random(seed)
    for _ in range(count - len(calls)):
        yield random_call(entry, random)


def random_call(entry: SheetFunction, random: Random) -> dict[str, Any]:
    """One valid call."""
    levels = random_levels(random)
    at = random.randrange(len(levels["heights"]))
    call: dict[str, Any] = {}
    for argument in entry.arguments:
        if argument.kind is Kind.LEVELS:
            call[argument.name] = levels[argument.name]
        elif argument.kind is Kind.CHOICE:
            call[argument.name] = random.choice(argument.choices)
        else:
            call[argument.name] = random_number(argument, random)
    _settle(call, levels, at, random)
    return call


def random_levels(random: Random, most: int = 8) -> dict[str, list[float]]:
    """Levels in any order, at times two at one height or one without weight; forces of the upper kind."""
    count = random.randint(1, most)
    heights = [random.uniform(2.0, 20.0)]
    while len(heights) < count:
        heights.append(heights[-1] + random.choice((0.0, *[random.uniform(2.0, 20.0)] * 9)))
    weights = [random.choice((0.0, *[random.uniform(1.0, 5000.0)] * 9)) for _ in heights]
    weights[random.randrange(count)] = random.uniform(1.0, 5000.0)
    rows = list(zip(heights, weights, [random.uniform(-5.0, 500.0) for _ in heights], strict=True))
    random.shuffle(rows)
    values = {height: random.uniform(-9.0, 9.0) for height in heights}
    stiffnesses = {height: random.uniform(5.0, 5000.0) for height in heights}
    power = random.uniform(0.5, 2.0)
    modes = [n + 1.0 for n in range(len({height for height, weight, _ in rows if weight > 0}))]
    by_story = {height: random.uniform(0.2, 1.0) for height in heights}
    return {
        "heights": [height for height, _, _ in rows],
        "weights": [weight for _, weight, _ in rows],
        "forces": [force for _, _, force in rows],
        "values": [values[height] for height, _, _ in rows],
        "stiffnesses": [stiffnesses[height] for height, _, _ in rows],
        "displacements": [height**power / 100 for height, _, _ in rows],
        "periods": [random.uniform(0.02, 12.0) for _ in rows],
        "wall_areas": [random.uniform(2.0, 90.0) for _ in rows],
        "wall_lengths": [random.uniform(3.0, 90.0) for _ in rows],
        "coefficients": [random.uniform(1.0, 6.0) for _ in rows],
        "R_systems": [random.choice((3.0, 5.0, 6.5, random.uniform(1.0, 8.0))) for _ in rows],
        "strengths": [500 * by_story[height] for height, _, _ in rows],
        "dimensions": [90 * by_story[height] for height, _, _ in rows],
        "drift_ratios": [0.02 * by_story[height] for height, _, _ in rows],
        "amplifications": [random.choice((1.0, 3.0, random.uniform(1.0, 3.0))) for _ in rows],
        "centers": [random.uniform(1000.0, 2000.0) for _ in rows],
        "rigidities": [random.uniform(0.5, 9.0) for _ in rows],
        "positions": [random.uniform(0.0, 200.0) for _ in rows],
        "distances": [random.uniform(-90.0, 90.0) for _ in rows],
        "mode_numbers": modes,
        "mode_coefficients": [random.uniform(0.01, 0.5) for _ in modes],
        "areas": [random.uniform(0.0, 9000.0) for _ in rows],
        "unit_loads": [random.uniform(0.0, 250.0) for _ in rows],
        **random_spectrum(random),
    }


def random_spectrum(random: Random) -> dict[str, list[float]]:
    """Pairs of a spectrum in any order, from 0 s to 10 s."""
    periods = [0.0, 10.0, *random.sample((0.05, 0.1, 0.2, 0.3, 0.5, 1.0, 1.5, 2.0, 3.0, 5.0, 7.5), 6)]
    random.shuffle(periods)
    return {"T_i": periods, "S_ai": [random.uniform(0.02, 3.0) for _ in periods]}


def random_number(argument: Argument, random: Random) -> float:
    """A number of the argument's span: usual ones, and at times one at which a branch changes."""
    span = argument.span
    usual = USUAL[argument.unit]
    low = usual[0] if span.low is None else max(span.low, usual[0])
    high = usual[1] if span.high is None else span.high
    if argument.name == "N":
        return float(random.randint(int(low), 14 if span.high is None else int(span.high)))
    edges = [number for number in BRANCHES.get(argument.name, ()) if number in span]
    if edges and random.random() < 0.3:
        return random.choice(edges)
    number = random.uniform(low, high)
    return number if number in span else low + STEP


def _settle(call: dict[str, Any], levels: Mapping[str, list[float]], at: int, random: Random) -> None:
    """Make the arguments that speak of one level speak of the same one."""
    if "h_x" in call:
        call["h_x"] = levels["heights"][at]
    if "w_x" in call:
        call["w_x"] = levels["weights"][at]
    if "w_px" in call:
        call["w_px"] = levels["weights"][at] * random.choice((1.0, 1.0, 0.5, 0.0))
    if "displacements" in call:  # the drift of each story goes with its shear
        call["forces"] = [abs(force) + 1.0 for force in call["forces"]]
    for name in ORDINALS:
        if name in call:
            count = len({h for h, w in zip(call["heights"], call["weights"], strict=True) if w > 0})
            call[name] = float(random.randint(1, count))
    if call.get("site_class") == "E" and "isolated" not in call:
        printed = call.get("exception", "none") != "none" and call.get("S_S", 0.0) >= 1.0
        call |= {} if printed else {s: min(call[s], most) for s, most in E_PRINTED.items() if s in call}
    if {"h_x", "h_n"} <= call.keys():
        call["h_x"] = call["h_n"] * random.choice((0.0, 0.8, 1.0, random.random()))
    if {"h_n", "C_w", "units"} <= call.keys() and call["units"] == "si":
        call["h_n"] *= 0.3048
    if "z_0" in call:
        call["z_x"] = call["z_0"] + random.uniform(2.0, 90.0)
    if {"d_max", "d_avg"} <= call.keys():
        call["d_max"] = call["d_avg"] * random.uniform(1.0, 2.5)


def _step(argument: Argument) -> float:
    return 1.0 if argument.name in ("N", *NUMBERS_OF_MODES) else STEP


def _floats(value: Any) -> Any:
    if isinstance(value, list):
        return [float(number) for number in value]
    return float(value) if isinstance(value, int) else value
