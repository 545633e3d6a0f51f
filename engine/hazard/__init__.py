"""Ground motion (chapters 11 and 21): site coefficients, spectral parameters, and both design spectra."""

from engine.hazard.analysis import TRIGGERS, analysis_triggers, coefficient_increase
from engine.hazard.multi_period import (
    TAILS,
    method_1_acceleration,
    multi_period_acceleration,
)
from engine.hazard.parameters import (
    design_ordinate,
    design_parameter_one_second,
    design_parameter_short,
    mce_ordinate,
    mce_parameter_one_second,
    mce_parameter_short,
)
from engine.hazard.site import site_coefficient_long, site_coefficient_short
from engine.hazard.site_specific import (
    READINGS,
    one_second_from_spectrum,
    short_period_from_spectrum,
    site_specific_minimum,
)
from engine.hazard.two_period import corner_period_T0, corner_period_TS, spectral_acceleration
from engine.hazard.words import LONG_EXCEPTIONS, SHORT_EXCEPTIONS, SITE_CLASSES, TABLE_SITE_CLASSES

__all__ = [
    "LONG_EXCEPTIONS",
    "READINGS",
    "SHORT_EXCEPTIONS",
    "SITE_CLASSES",
    "TABLE_SITE_CLASSES",
    "TAILS",
    "TRIGGERS",
    "analysis_triggers",
    "coefficient_increase",
    "corner_period_T0",
    "corner_period_TS",
    "design_ordinate",
    "design_parameter_one_second",
    "design_parameter_short",
    "mce_ordinate",
    "mce_parameter_one_second",
    "mce_parameter_short",
    "method_1_acceleration",
    "multi_period_acceleration",
    "one_second_from_spectrum",
    "short_period_from_spectrum",
    "site_coefficient_long",
    "site_coefficient_short",
    "site_specific_minimum",
    "spectral_acceleration",
]
