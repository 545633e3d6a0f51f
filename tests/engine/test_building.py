"""One building from its inputs to the whole package: against print, against plain arithmetic, and refused."""

from __future__ import annotations

import copy
import json
import tomllib
from dataclasses import fields

import numpy as np
import pytest

from engine.building import Building, DirectionResult, from_mapping, solve, to_mapping
from engine.building.results import RULES
from engine.editions import clause
from engine.errors import EngineError, ImpossibleValue, MissingValue, NotApplicable, WrongType

FOOT, KIP = 0.3048, 4.4482216152605

PLAIN = """
title = "Invented four-level block"
edition = "7-22"
units = "us"
[job]
number = "A-1"
revision = 2
[site]
S_DS = 0.9
S_D1 = 0.5
S_1 = 0.65
T_L = 6
risk_category = "III"
base_elevation = 100
[direction.X]
system = "Steel special moment frames"
R = 8
Omega_0 = 3
C_d = 5.5
period_system = "steel moment frame"
T_computed = 1.3
rho = 1.3
moment_frames_only = true
drift_structure = "all other"
beta = 0.9
[direction.Y]
system = "Special reinforced concrete shear walls"
R = 5
Omega_0 = 2.5
C_d = 5
period_system = "all other"
rho = 1.3
drift_structure = "all other"
[[level]]
name = "Roof"
elevation = 152.5
weight = 310
P_x = 350
delta_xe_X = 1.34
delta_xe_Y = 0.40
[[level]]
name = "4F"
elevation = 139.5
weight = 480
P_x = 900
delta_xe_X = 1.05
delta_xe_Y = 0.29
[[level]]
name = "3F"
elevation = 126.5
weight = 500
P_x = 1450
delta_xe_X = 0.68
delta_xe_Y = 0.17
[[level]]
name = "2F"
elevation = 113.5
weight = 520
P_x = 2050
delta_xe_X = 0.30
delta_xe_Y = 0.07
[sources]
"site.S_DS" = "geotechnical report, p. 4"
"""


@pytest.fixture
def data():
    return tomllib.loads(PLAIN)


@pytest.fixture
def package(data):
    return solve(from_mapping(data))


def test_every_step_by_plain_arithmetic(package):
    """Direction X worked with nothing but loops over the levels."""
    found = package.direction["X"]
    w, h = [310, 480, 500, 520], [52.5, 39.5, 26.5, 13.5]
    I_e, R, C_d, W = 1.25, 8, 5.5, 1810
    T_a = 0.028 * 52.5**0.8
    T = min(1.3, 1.4 * T_a)
    C_s = max(min(0.9 / (R / I_e), 0.5 / (T * R / I_e)), 0.044 * 0.9 * I_e, 0.5 * 0.65 / (R / I_e))
    assert (found.T_a, found.T_max, found.T) == pytest.approx((T_a, 1.4 * T_a, T))
    assert (package.I_e, package.W, found.C_s, found.V) == pytest.approx((I_e, W, C_s, C_s * W))
    k = 0.75 + 0.5 * T
    F = [C_s * W * w[i] * h[i] ** k / sum(w[j] * h[j] ** k for j in range(4)) for i in range(4)]
    V = [sum(F[: i + 1]) for i in range(4)]
    assert found.k == pytest.approx(k)
    assert found.F_x == pytest.approx(F)
    assert found.V_x == pytest.approx(V)
    assert found.V_base == pytest.approx(found.V)
    assert found.M_x == pytest.approx([sum(F[j] * (h[j] - h[i]) for j in range(i)) for i in range(4)])
    assert found.M_base == pytest.approx(sum(F[i] * h[i] for i in range(4)))
    raw = [V[i] / sum(w[: i + 1]) * w[i] for i in range(4)]
    low = [0.2 * 0.9 * I_e * weight for weight in w]
    assert found.more["F_px_unlimited"] == pytest.approx(raw)
    assert found.more["F_px"] == pytest.approx([min(max(raw[i], low[i]), 2 * low[i]) for i in range(4)])
    delta = [1.34, 1.05, 0.68, 0.30, 0.0]
    Delta = [C_d * (delta[i] - delta[i + 1]) / I_e for i in range(4)]
    h_sx = [13.0, 13.0, 13.0, 13.5]
    assert package.h_sx == pytest.approx(h_sx)
    assert found.delta_x == pytest.approx([C_d * value / I_e for value in delta[:4]])
    assert found.Delta == pytest.approx(Delta)
    assert found.drift_ratio == pytest.approx([Delta[i] / (12 * h_sx[i]) for i in range(4)])
    assert found.Delta_a == pytest.approx([0.015 * 12 * value / 1.3 for value in h_sx])
    P = [350, 900, 1450, 2050]
    theta = [P[i] * Delta[i] * I_e / (V[i] * 12 * h_sx[i] * C_d) for i in range(4)]
    assert found.theta == pytest.approx(theta)
    assert found.theta_max == pytest.approx(0.5 / (0.9 * 5.5))
    factor = [1 / (1 - value) if value > 0.1 else 1 for value in theta]
    assert found.theta_factor == pytest.approx(factor)
    assert found.drift_over_limit == pytest.approx(
        [Delta[i] * factor[i] / found.Delta_a[i] for i in range(4)]
    )


def test_direction_without_computed_period_uses_the_approximate_one(package):
    found = package.direction["Y"]
    assert found.T == found.T_a == pytest.approx(0.02 * 52.5**0.75)
    assert found.governing_bound == "plateau S_DS/(R/I_e), Eq. 12.8-3"


def test_rho_divides_only_where_moment_frames_stand_alone(package):
    assert package.direction["Y"].Delta_a == pytest.approx([0.015 * 12 * value for value in package.h_sx])


def test_published_ten_story_frame():
    """H. Karagah, open notebook "Seismic Forces on Floor Diaphragms", 2025: ASCE/SEI 7-22, printed digits."""
    weights = [33168, 33138, 32751, 32319, 32319, 32292, 32247, 32247, 32220, 31815]
    frame = {
        **{"system": "Steel special moment frames", "R": 8, "Omega_0": 3, "C_d": 5.5, "T_computed": 2.462},
        **{"period_system": "steel moment frame", "drift_structure": "all other"},
    }
    building = from_mapping(
        {
            **{"title": "Ten stories", "edition": "7-22", "units": "us", "direction": {"X": frame}},
            "site": {"S_DS": 1.64 * 2 / 3, "S_D1": 1.19 * 2 / 3, "S_1": 0.5, "T_L": 8, "risk_category": "II"},
            "level": [
                {"name": f"L{i + 1}", "elevation": 12 + 9 * i, "weight": w / 1000}
                for i, w in enumerate(weights)
            ],
        }
    )
    found = solve(building).direction["X"]
    printed = [0.011, 0.024, 0.041, 0.059, 0.081, 0.104, 0.129, 0.156, 0.184, 0.212]
    assert [round(found.T_a, 3), round(found.T, 3), round(found.C_s, 3)] == [1.052, 1.473, 0.067]
    assert [round(float(value), 3) for value in found.C_vx] == printed
    assert found.governing_bound == "cap S_D1/(T R/I_e), Eq. 12.8-4"
    assert found.Delta is None
    assert "theta" not in solve(building).to_json()["direction"]["X"]


def everything(result):
    """Return every result of a direction by its symbol, those of further parts among them."""
    own = {entry.name: getattr(result, entry.name) for entry in fields(DirectionResult)}
    more = own.pop("more")
    return {**own, **more}


def test_order_of_levels_is_free(data, package):
    mixed = copy.deepcopy(data)
    order = [2, 0, 3, 1]
    mixed["level"] = [data["level"][i] for i in order]
    found = solve(from_mapping(mixed))
    for name, result in package.direction.items():
        for key, value in everything(result).items():
            other = everything(found.direction[name])[key]
            if isinstance(value, np.ndarray):
                assert other == pytest.approx(value[order], rel=1e-12)
            elif isinstance(value, tuple):
                assert other == tuple(value[i] for i in order)
            else:
                assert other == (pytest.approx(value, rel=1e-12) if isinstance(value, float) else value)


def test_si_gives_the_same_building(data, package):
    """The SI period coefficient is rounded on its own, so the period is given here."""
    metric = copy.deepcopy(data)
    metric["units"] = "si"
    metric["site"]["base_elevation"] *= FOOT
    for level in metric["level"]:
        level["elevation"] *= FOOT
        level["weight"] *= KIP
        level["P_x"] *= KIP
        level["delta_xe_X"] *= 25.4
        level["delta_xe_Y"] *= 25.4
    for table in (data, metric):
        for direction in table["direction"].values():
            direction["T_computed"] = 0.7
    us, si = solve(from_mapping(data)).direction["X"], solve(from_mapping(metric)).direction["X"]
    assert us.T == si.T == 0.7
    assert si.F_x == pytest.approx(us.F_x * KIP, rel=1e-12)
    assert si.M_base == pytest.approx(us.M_base * KIP * FOOT, rel=1e-12)
    assert si.Delta == pytest.approx(us.Delta * 25.4, rel=1e-12)
    assert si.Delta_a == pytest.approx(us.Delta_a * 25.4, rel=1e-12)
    assert si.theta == pytest.approx(us.theta, rel=1e-12)
    assert si.drift_over_limit == pytest.approx(us.drift_over_limit, rel=1e-12)


def test_editions_differ_in_numbers_of_equations_and_in_beta(data):
    data["direction"]["X"]["beta"] = 0.2
    newer = solve(from_mapping(data))
    older = solve(from_mapping({**data, "edition": "7-16"}))
    assert newer.direction["X"].V == older.direction["X"].V
    assert older.direction["X"].beta_used == 0.2
    assert newer.direction["X"].beta_used == pytest.approx(1.25 / 3)
    assert newer.warnings == ("direction X: beta = 0.2 raised to 1.25/Omega_0 = 0.4167",)
    assert older.to_json()["clauses"]["C_vx"] == "12.8.3, Eq. 12.8-12"
    assert newer.to_json()["clauses"]["C_vx"] == "12.8.3, Eq. 12.8-13"


def test_json_is_plain_and_complete(package):
    text = json.dumps(package.to_json(), allow_nan=False)
    back = json.loads(text)
    assert back["levels"] == ["Roof", "4F", "3F", "2F"]
    assert set(back["direction"]) == {"X", "Y"}
    given = set(everything(package.direction["X"])) - {"delta_xe"}  # a result of story stiffness alone
    assert set(back["direction"]["X"]) == given
    assert back["direction"]["X"]["F_x"] == package.direction["X"].F_x.tolist()
    assert set(RULES) < set(back["clauses"]) == set(package.rules)


def test_every_doubt_reaches_the_reader(package):
    notes = package.to_json()["notes"]
    for key in package.rules:
        if clause("7-22", key).confidence != "H":
            assert notes[key] == clause("7-22", key).note


def test_mapping_there_and_back(data):
    building = from_mapping(data)
    assert from_mapping(to_mapping(building)) == building
    assert to_mapping(building)["job"] == {"number": "A-1", "revision": 2}
    assert to_mapping(building)["sources"] == {"site.S_DS": "geotechnical report, p. 4"}
    assert "k_rule" not in to_mapping(building)["direction"]["X"]


def test_source_of_a_level_is_kept(data):
    data["level"][1]["source"] = "take-off sheet 3"
    assert to_mapping(from_mapping(data))["level"][1]["source"] == "take-off sheet 3"
    assert "source" not in to_mapping(from_mapping(data))["level"][0]


def test_two_roofs_at_one_elevation_are_legal_and_told(data):
    data["level"].insert(0, {**data["level"][0], "name": "Roof B", "weight": 200})
    package = solve(from_mapping(data))
    assert package.warnings == ("two levels at one elevation: Roof B and Roof",)
    assert package.h_sx[:2].tolist() == [13.0, 13.0]
    assert package.direction["X"].F_x.sum() == pytest.approx(package.direction["X"].V)


def test_collision_of_the_two_limits_is_told(data):
    """C_d = 5.5 and beta = 1: theta_max = 0.091, and a story between it and 0.10."""
    data["direction"]["X"]["beta"] = 1.0
    data["level"][3]["P_x"] = 4000
    base = solve(from_mapping(data)).direction["X"].theta[3]
    data["level"][3]["P_x"] = 4000 * 0.095 / float(base)
    found = solve(from_mapping(data)).direction["X"]
    assert found.theta[3] == pytest.approx(0.095)
    assert found.theta_verdict[3].startswith("limits collide")
    assert found.theta_factor[3] == 1.0


def test_amplified_drift_is_compared(data):
    data["direction"]["X"]["C_d"] = 3.0
    data["level"][3]["P_x"] = 14000
    found = solve(from_mapping(data)).direction["X"]
    assert 0.10 < found.theta[3] <= found.theta_max
    assert found.theta_verdict[3] == "amplify by 1/(1 - theta)"
    assert found.Delta_amplified[3] == pytest.approx(found.Delta[3] / (1 - found.theta[3]))
    assert found.drift_over_limit[3] == pytest.approx(found.Delta_amplified[3] / found.Delta_a[3])


def test_displacements_without_vertical_loads_still_give_drifts(data):
    for level in data["level"]:
        del level["P_x"]
    found = solve(from_mapping(data)).direction["X"]
    assert found.theta is None
    assert found.drift_over_limit == pytest.approx(found.Delta / found.Delta_a)


def at(data, path, value):
    *way, last = path
    table = data
    for step in way:
        table = table[step]
    if value is ...:
        del table[last]
    else:
        table[last] = value


REFUSALS = [
    (("title",), ..., MissingValue, "title = blank: must be given"),
    (("title",), " ", MissingValue, "title = blank: must be a text"),
    (("edition",), "7-10", NotApplicable, "edition = '7-10': must be one of 7-16, 7-22"),
    (("units",), "metric", NotApplicable, "units = 'metric': must be one of us, si"),
    (("site",), ..., MissingValue, "site = blank: must be given"),
    (("site",), 3, WrongType, "site = 3: must be a table"),
    (("site", "S_DS"), ..., MissingValue, "site.S_DS = blank: must be given"),
    (("site", "S_DS"), "0.9", WrongType, "site.S_DS = '0.9': must be a number"),
    (("site", "S_DS"), [0.9], WrongType, r"site.S_DS = \[0.9\]: must be a single number"),
    (("site", "S_DS"), 0, ImpossibleValue, "site.S_DS = 0: must be above 0"),
    (("site", "T_L"), float("nan"), ImpossibleValue, "site.T_L = nan: must be a finite number"),
    (("site", "risk_category"), "V", NotApplicable, "site.risk_category = 'V'"),
    (("site", "SDS"), 0.9, NotApplicable, "site.SDS = 0.9: unknown key, did you mean S_DS"),
    (("site", "wind"), 0.9, NotApplicable, "site.wind = 0.9: unknown key; `storyledger entries`"),
    (("direction",), {}, MissingValue, "direction = blank: must have a table X or Y"),
    (("direction", "Z"), {}, MissingValue, "direction.Z.system = blank"),
    (("direction", "X", "R"), 0, ImpossibleValue, "direction.X.R = 0: must be at least 1"),
    (("direction", "X", "R"), True, WrongType, "direction.X.R = True: must be a number"),
    (("direction", "X", "C_d"), ..., MissingValue, "direction.X.C_d = blank: must be given"),
    (("direction", "X", "beta"), 1.2, ImpossibleValue, "direction.X.beta = 1.2: must be at most 1"),
    (("direction", "X", "beta"), 0, ImpossibleValue, "direction.X.beta = 0: must be above 0"),
    (("direction", "X", "rho"), 0.5, ImpossibleValue, "direction.X.rho = 0.5: must be at least 1"),
    (("direction", "X", "T_computed"), 0, ImpossibleValue, "direction.X.T_computed = 0: must be above 0"),
    (("direction", "X", "k_rule"), "2", NotApplicable, "direction.X.k_rule = '2'"),
    (("direction", "X", "moment_frames_only"), 1, WrongType, "must be true or false"),
    (("direction", "X", "period_system"), "steel", NotApplicable, "direction.X.period_system = 'steel'"),
    (("direction", "X", "drift_structure"), "tall", NotApplicable, "direction.X.drift_structure = 'tall'"),
    (("direction", "X", "omega_0"), 3, NotApplicable, "did you mean Omega_0"),
    (("level",), [], ImpossibleValue, "level = '0 levels': must be 1 to 1000 levels"),
    (("level",), {}, WrongType, "level = {}: must be an array of tables"),
    (("level", 1), 5, WrongType, "level 2 = 5: must be a table"),
    (("level", 0, "weight"), ..., MissingValue, r'level 1 \("Roof"\): weight = blank: must be given'),
    (("level", 0, "weight"), -1, ImpossibleValue, r'level 1 \("Roof"\): weight = -1: must be at least 0'),
    (
        ("level", 2, "elevation"),
        100,
        ImpossibleValue,
        r'level 3 \("3F"\): elevation = 100: must be above the base',
    ),
    (("level", 2, "name"), ..., MissingValue, r'level 3 \(""\): name = blank: must be given'),
    (("level", 2, "P_x"), ..., MissingValue, r'level 3 \("3F"\): P_x = blank: must be given at all levels'),
    (("level", 0, "P_x"), ..., MissingValue, r'level 1 \("Roof"\): P_x = blank: must be given at all levels'),
    (("level", 3, "delta_xe_X"), ..., MissingValue, r'level 4 \("2F"\): delta_xe_X = blank'),
    (("level", 3, "delta_xe_X"), "0.3", WrongType, r'level 4 \("2F"\): delta_xe_X = .0.3.: must be a number'),
    (("level", 3, "mass"), 5, NotApplicable, r'level 4 \("2F"\): mass = 5: unknown key'),
    (("levels",), [], NotApplicable, r"levels = \[\]: unknown key, did you mean level"),
    (("sources",), 4, WrongType, "sources = 4: must be a table"),
]


@pytest.mark.parametrize(
    ("path", "value", "error", "match"), REFUSALS, ids=[f"{match}" for _, _, _, match in REFUSALS]
)
def test_refusal_names_the_field(data, path, value, error, match):
    at(data, path, value)
    with pytest.raises(error, match=match) as caught:
        from_mapping(data)
    assert type(caught.value) is error


def test_other_direction_name_is_refused(data):
    data["direction"]["Z"] = dict(data["direction"]["X"])
    with pytest.raises(NotApplicable, match="direction = 'Z': must be one of X, Y"):
        from_mapping(data)


def test_weights_all_0_are_refused(data):
    for level in data["level"]:
        level["weight"] = 0
    with pytest.raises(ImpossibleValue, match="at least one level must have a weight"):
        from_mapping(data)


def test_more_than_a_thousand_levels_are_refused(data):
    data["level"] = [{"name": f"L{i}", "elevation": 101 + i, "weight": 1} for i in range(1001)]
    with pytest.raises(ImpossibleValue, match="'1001 levels'"):
        from_mapping(data)


def test_a_thousand_levels_close(data):
    data["level"] = [{"name": f"L{i}", "elevation": 110 + 10 * i, "weight": 1 + i % 7} for i in range(1000)]
    found = solve(from_mapping(data)).direction["X"]
    assert found.F_x.sum() == pytest.approx(found.V, rel=1e-12)


def test_a_record_made_by_hand_is_checked_too(data):
    building = from_mapping(data)
    with pytest.raises(ImpossibleValue, match=r"direction.X.R = 0.5"):
        Building(
            **{
                **{entry.name: getattr(building, entry.name) for entry in fields(building)},
                "direction": {"X": type(building.direction["X"])(**{**data["direction"]["X"], "R": 0.5})},
            }
        )


def test_one_level_is_a_building(data):
    data["level"] = data["level"][:1]
    found = solve(from_mapping(data)).direction["X"]
    assert found.V_x == pytest.approx([found.V])
    assert found.theta.shape == (1,)


def test_levels_a_hair_apart_are_told(data):
    for level in data["level"]:
        for key in ("delta_xe_X", "delta_xe_Y"):
            del level[key]
    near, apart = ({**data["level"][0], "name": "B", "elevation": 152.5 + gap} for gap in (4e-8, 7e-8))
    assert solve(from_mapping({**data, "level": [*data["level"], near]})).warnings
    assert not solve(from_mapping({**data, "level": [*data["level"], apart]})).warnings


def test_a_light_roof_has_a_stability_coefficient(data):
    data["level"][0] |= {"weight": 0.5, "P_x": 0.5}
    found = solve(from_mapping(data)).direction["X"]
    assert 0 < found.V_x[0] < 1
    assert 0 < found.theta[0] < 0.10


@pytest.mark.parametrize("P_x", [1e5, 4e6])
def test_instability_names_the_level(data, P_x):
    data["level"][3]["P_x"] = P_x
    with pytest.raises(ImpossibleValue, match=r'level 4 \("2F"\): theta = .*unstable'):
        solve(from_mapping(data))


def test_story_without_shear_names_the_level(data):
    data["level"][0]["weight"] = 0
    with pytest.raises(ImpossibleValue, match=r'level 1 \("Roof"\): V_x = 0: must be above 0'):
        solve(from_mapping(data))


def test_torn_level_below_is_refused(data):
    data["level"].append({**data["level"][3], "name": "2F B", "delta_xe_X": 0.35})
    with pytest.raises(EngineError, match="levels at one height hold different values"):
        solve(from_mapping(data))
