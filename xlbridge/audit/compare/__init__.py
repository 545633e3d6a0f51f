"""Two issues of a workbook compared: what is where now, what changed, and which change moved which result."""
