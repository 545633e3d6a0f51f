"""The functions in LibreOffice Calc: an extension generated from the catalogue."""
