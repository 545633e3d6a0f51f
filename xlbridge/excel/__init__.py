"""The worksheet functions in Excel on Windows, through xlwings: generated modules over one shared call."""
