"""What is not collected here: it imports what only LibreOffice's Python has."""

collect_ignore = ["basic_driver.py"]
