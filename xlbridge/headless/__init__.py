"""Open a workbook, evaluate its formulas with no spreadsheet program, store the values back."""
