"""The workbook: blocks declared as data, builders that draw them, a reader that takes the inputs back out."""
