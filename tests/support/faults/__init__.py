"""Seeded faults: what goes wrong in a workbook, as a catalogue of operators, and what the audit says of it.

An operator changes one workbook at a place drawn by a seeded generator. Its docstring says what it does, in
the words of the catalogue; with it stand its group and the kinds of findings by which it may rightly be
found. ``python -m tests.support.faults`` prints the catalogue.
"""
