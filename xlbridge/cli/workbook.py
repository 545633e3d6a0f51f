"""Compute a workbook: see :mod:`xlbridge.headless.compute`."""

from xlbridge.headless.compute import FUNCTIONS, Computed, compute, compute_into, open_workbook

__all__ = ["FUNCTIONS", "Computed", "compute", "compute_into", "open_workbook"]
