"""Seismic story forces of ASCE/SEI 7: one tested function for each rule, vectorised.

Units are consistent (kip and ft, or kN and m); where a coefficient carries units the system is an argument.
Arguments are checked at the door: a refusal is an :class:`EngineError` that names the argument, the value
and what is allowed. Results are an aid to a licensed engineer's judgement: confirm every value against the
standard adopted by the authority having jurisdiction.
"""
