"""Draw the declared blocks: one module a sheet, one for what all sheets share, one for the looks."""
