"""Site coefficients, triggers, and the multi-period spectrum: every branch, and what is refused."""

from __future__ import annotations

import numpy as np
import pytest

from engine import hazard
from engine.errors import ImpossibleValue, NotApplicable, WrongType
from engine.hazard import (
    LONG_EXCEPTIONS,
    SHORT_EXCEPTIONS,
    analysis_triggers,
    coefficient_increase,
    method_1_acceleration,
    multi_period_acceleration,
    one_second_from_spectrum,
    short_period_from_spectrum,
    site_coefficient_long,
    site_coefficient_short,
)

NONE, CLASS_C = SHORT_EXCEPTIONS
_, INCREASED, RAISED, SHORT_T = LONG_EXCEPTIONS
E_SHORT, DE_LONG, ISOLATED = hazard.TRIGGERS[1:]
PAIRS = {"T_i": [0.0, 0.1, 0.3, 1.0, 2.0, 5.0, 10.0], "S_ai": [0.4, 1.1, 0.9, 0.5, 0.28, 0.1, 0.03]}
EPS = 1e-9


class TestSiteCoefficients:
    @pytest.mark.parametrize("S_S", [0.7501, 0.9, 0.9999, 1.0, 1.2, 2.0])
    def test_class_e_has_no_printed_value_from_there_on(self, S_S):
        with pytest.raises(NotApplicable, match=r"no F_a is printed for site class E there.*11\.4\.8"):
            site_coefficient_short(S_S, "E", NONE)
        if S_S < 1.0:
            with pytest.raises(NotApplicable, match=f"S_S = {S_S}"):
                site_coefficient_short(S_S, "E", CLASS_C)
        else:
            assert site_coefficient_short(S_S, "E", CLASS_C) == site_coefficient_short(S_S, "C", NONE) == 1.2

    def test_exception_1_leaves_what_is_printed(self):
        assert site_coefficient_short([0.25, 0.5, 0.75], "E", CLASS_C).tolist() == [2.4, 1.7, 1.3]
        for name in ("A", "B", "C", "D"):
            assert site_coefficient_short(1.2, name, CLASS_C) == site_coefficient_short(1.2, name, NONE)

    def test_class_e_at_long_periods(self):
        assert site_coefficient_long(0.1, "E") == 4.2
        for S_1 in (0.1001, 0.15, 0.2, 0.6):
            with pytest.raises(NotApplicable, match=r"no F_v is printed.*enter F_v yourself"):
                site_coefficient_long(S_1, "E")

    def test_one_bad_value_of_several_is_named(self):
        with pytest.raises(NotApplicable, match=r"S_S = 0\.8: no F_a"):
            site_coefficient_short([0.3, 0.8, 0.5], "E", NONE)

    def test_class_f_is_refused_with_its_reason(self):
        for coefficient in (
            lambda: site_coefficient_short(0.3, "F", NONE),
            lambda: site_coefficient_long(0.3, "F"),
        ):
            with pytest.raises(NotApplicable, match="site class F needs a site response analysis"):
                coefficient()

    def test_the_default_class_is_d_but_not_below_1_2(self):
        S_S = np.linspace(0, 2, 81)
        usual, default = (site_coefficient_short(S_S, name, NONE) for name in ("D", "D default"))
        assert (default == np.maximum(usual, 1.2)).all()
        assert (site_coefficient_long(S_S, "D default") == site_coefficient_long(S_S, "D")).all()


def triggers(S_S=0.5, S_1=0.1, site_class="D", isolated="no", short=NONE, long=NONE, T=0.5, T_S=0.6):
    return analysis_triggers(S_S, S_1, site_class, isolated, short, long, T, T_S)


class TestTriggers:
    @pytest.mark.parametrize(
        ("given", "found"),
        [
            ({"site_class": "C", "S_S": 3.0, "S_1": 1.5}, "none"),
            ({"site_class": "F"}, "class F: site response analysis"),
            ({"S_1": 0.2 - EPS}, "none"),
            ({"S_1": 0.2}, DE_LONG),
            ({"S_1": 0.2, "site_class": "D default"}, DE_LONG),
            ({"S_S": 3.0}, "none"),
            ({"site_class": "E", "S_S": 1.0 - EPS}, "none"),
            ({"site_class": "E", "S_S": 1.0}, E_SHORT),
            ({"site_class": "E", "S_S": 1.0, "S_1": 0.2}, f"{E_SHORT}; {DE_LONG}"),
            ({"site_class": "B", "isolated": "yes", "S_1": 0.6 - EPS}, "none"),
            ({"site_class": "B", "isolated": "yes", "S_1": 0.6}, ISOLATED),
            ({"site_class": "B", "isolated": "no", "S_1": 0.6}, "none"),
        ],
    )
    def test_without_exceptions(self, given, found):
        assert triggers(**given) == found

    @pytest.mark.parametrize(
        ("given", "found"),
        [
            ({"short": CLASS_C}, DE_LONG),
            ({"long": SHORT_T}, E_SHORT),
            ({"short": CLASS_C, "long": SHORT_T}, "none"),
            ({"short": CLASS_C, "long": SHORT_T, "T": 0.6}, "none"),
            ({"short": CLASS_C, "long": SHORT_T, "T": 0.6 + EPS}, DE_LONG),
            ({"short": CLASS_C, "long": INCREASED}, DE_LONG),
            ({"short": CLASS_C, "long": RAISED}, DE_LONG),
            ({"short": CLASS_C, "long": SHORT_T, "isolated": "yes"}, f"{E_SHORT}; {DE_LONG}"),
        ],
    )
    def test_exceptions_on_class_e(self, given, found):
        assert triggers(site_class="E", S_S=1.2, S_1=0.4, **given) == found

    @pytest.mark.parametrize(
        ("long", "found"), [(NONE, DE_LONG), (INCREASED, "none"), (RAISED, "none"), (SHORT_T, DE_LONG)]
    )
    def test_exceptions_on_class_d(self, long, found):
        assert triggers(S_1=0.4, long=long, T=2.0) == found
        assert triggers(S_1=0.4, long=long, isolated="yes") == DE_LONG

    def test_columns(self):
        found = triggers(
            site_class="E", S_S=[0.5, 1.2], S_1=0.4, short=CLASS_C, long=SHORT_T, T=[[0.5], [0.7]]
        )
        assert found.tolist() == [["none", "none"], [DE_LONG, DE_LONG]]


class TestIncrease:
    def test_the_coefficient_is_the_plateau_to_1_5_T_S_and_1_5_times_the_cap_beyond(self):
        S_DS, S_D1, T_L = 1.0, 0.6, 8.0
        for T in (0.1, 0.6, 0.7, 0.9 - EPS, 0.9, 0.9 + EPS, 0.93, 2.0, 8.0, 8.1, 20.0):
            cap = S_D1 / T * min(T_L / T, 1)
            ordinary = min(S_DS, cap)
            expected = S_DS if T <= 0.9 else 1.5 * cap
            found = ordinary * coefficient_increase(T, S_D1 / S_DS, INCREASED)
            assert found == pytest.approx(expected, rel=1e-8)
            for other in (NONE, RAISED, SHORT_T):
                assert coefficient_increase(T, S_D1 / S_DS, other) == 1.0


class TestMultiPeriod:
    def test_both_tails_are_one_from_T_L_10_on(self):
        T = np.array([10.0, 11.0, 14.0, 30.0])
        for T_L in (10.0, 12.0, 16.0):
            printed, smooth = (multi_period_acceleration(T, **PAIRS, T_L=T_L, tail=t) for t in hazard.TAILS)
            assert (printed == smooth).all()

    def test_the_printed_tail_drops_at_10_s_for_an_early_T_L_and_the_other_does_not(self):
        printed, smooth = (
            multi_period_acceleration([10.0, 10.0 + EPS], **PAIRS, T_L=6.0, tail=t) for t in hazard.TAILS
        )
        assert printed[1] == pytest.approx(0.6 * printed[0])
        assert smooth[1] == pytest.approx(smooth[0])

    def test_both_sides_of_T_L(self):
        found = multi_period_acceleration([12 - EPS, 12.0, 12 + EPS], **PAIRS, T_L=12.0, tail="as printed")
        assert found == pytest.approx([0.025] * 3)

    @pytest.mark.parametrize("function", [multi_period_acceleration, method_1_acceleration])
    def test_a_period_outside_the_pairs_is_refused(self, function):
        short = {"T_i": [0.05, 0.2, 1.0, 5.0], "S_ai": [0.5, 1.0, 0.5, 0.1], "T_L": 8.0, "tail": "as printed"}
        assert function([0.05, 5.0], **short).shape == (2,)
        for T in (0.0, 0.0499, 5.0001, 11.0):
            with pytest.raises(NotApplicable, match=f"T = {T:g}: must be within the periods.*0.05 s to 5 s"):
                function([0.2, T], **short)

    def test_the_peak_is_kept_to_its_left_alone(self):
        T = np.array([0.0, 0.05, 0.1 - EPS, 0.1, 0.1 + EPS, 0.2, 3.0])
        plain = multi_period_acceleration(T, **PAIRS, T_L=8.0, tail="as printed")
        kept = method_1_acceleration(T, **PAIRS, T_L=8.0, tail="as printed")
        assert (kept[:3] == 1.1).all()
        assert (kept[3:] == plain[3:]).all()

    def test_of_equal_peaks_the_last_counts(self):
        twin = {"T_i": [0.0, 0.1, 0.2, 0.4, 1.0], "S_ai": [0.4, 1.0, 0.8, 1.0, 0.5]}
        kept = method_1_acceleration([0.05, 0.2, 0.4, 0.7], **twin, T_L=8.0, tail="as printed")
        assert kept == pytest.approx([1.0, 1.0, 1.0, 0.75])

    def test_order_of_the_pairs_does_not_matter(self):
        order = [3, 0, 6, 2, 5, 1, 4]
        mixed = {key: [values[i] for i in order] for key, values in PAIRS.items()}
        T = [0.0, 0.05, 0.6, 4.0, 12.0]
        for function in (multi_period_acceleration, method_1_acceleration):
            straight = function(T, **PAIRS, T_L=8.0, tail="as printed")
            assert (function(T, **mixed, T_L=8.0, tail="as printed") == straight).all()
        assert short_period_from_spectrum(**mixed) == short_period_from_spectrum(**PAIRS)

    def test_pairs_that_do_not_fit_are_refused(self):
        given = {"T": 0.5, "T_L": 8.0, "tail": "as printed"}
        with pytest.raises(ImpossibleValue, match="T_i = 1: must hold each period once"):
            multi_period_acceleration(**given, T_i=[0.0, 1.0, 1.0], S_ai=[0.5, 1.0, 0.9])
        with pytest.raises(WrongType, match="S_ai = '2 values': must be one for each of 3 periods"):
            multi_period_acceleration(**given, T_i=[0.0, 1.0, 2.0], S_ai=[0.5, 1.0])
        with pytest.raises(WrongType, match="T_i = '2 axes'"):
            multi_period_acceleration(**given, T_i=[[0.0, 1.0]], S_ai=[[0.5, 1.0]])


class TestFromASpectrum:
    @pytest.mark.parametrize("T_i", [[0.21, 1.0, 5.0], [0.2, 1.0, 4.99], [6.0, 7.0, 8.0]])
    def test_the_band_of_the_plateau_must_be_covered(self, T_i):
        with pytest.raises(NotApplicable, match=r"must reach from 0\.2 s to 5 s"):
            short_period_from_spectrum(T_i, [1.0, 0.5, 0.1])

    @pytest.mark.parametrize("T_i", [[1.01, 2.0, 5.0], [0.2, 1.0, 4.99]])
    def test_the_band_of_one_second_must_be_covered(self, T_i):
        with pytest.raises(NotApplicable, match="must reach from 1 s to"):
            one_second_from_spectrum(T_i, [1.0, 0.5, 0.1], 900.0, "us", "7-22", "listed periods")

    def test_a_peak_outside_the_band_does_not_count(self):
        given = {"T_i": [0.1, 0.2, 1.0, 5.0, 8.0], "S_ai": [2.0, 0.8, 0.5, 0.1, 0.09]}
        assert short_period_from_spectrum(**given) == pytest.approx(0.72)
        given = {"T_i": [0.2, 1.0, 2.0, 5.0, 8.0], "S_ai": [1.0, 0.5, 0.25, 0.1, 0.5]}
        found = one_second_from_spectrum(
            **given, v_s=500.0, units="us", edition="7-16", reading="listed periods"
        )
        assert found == 0.5

    def test_between_the_periods_the_product_may_be_larger_by_4_percent(self):
        """On a spectrum that falls with 1/T, read at the 22 periods of the standard."""
        T_i = [0.1, 0.2, 0.5, 1.0, 1.5, 2.0, 3.0, 4.0, 5.0, 7.5, 10.0]
        given = {"T_i": T_i, "S_ai": [0.6 / max(T, 0.6) for T in T_i], "v_s": 900.0, "units": "us"}
        listed, every = (
            one_second_from_spectrum(**given, edition="7-16", reading=reading) for reading in hazard.READINGS
        )
        assert listed == pytest.approx(0.6)
        assert every / listed == pytest.approx(1.25 * (1 + 1 / 1.5) / 2)

    def test_a_rising_or_level_spectrum_peaks_at_its_ends(self):
        for S_ai in ([0.2, 0.3, 0.4, 0.5], [0.3, 0.3, 0.3, 0.3]):
            given = {"T_i": [0.2, 1.0, 2.0, 5.0], "S_ai": S_ai, "v_s": 900.0, "units": "us"}
            for reading in hazard.READINGS:
                found = one_second_from_spectrum(**given, edition="7-16", reading=reading)
                assert found == pytest.approx(5.0 * S_ai[-1])
